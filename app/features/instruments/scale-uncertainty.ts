import type { InstrumentKind } from "#app/domain/instrument-kind.ts";
import { scaleUnitsOf, type ScaleUnit } from "#app/domain/instrument-scale.ts";
import { angleUncertaintyDeg, edgeUncertainty, gaugeUncertaintyMm, weighingUncertaintyCt } from "#app/features/readings/usual-uncertainty.ts";

type Scaled = Readonly<{ kind: InstrumentKind; scaleUnit: ScaleUnit | null; resolution: number | null; standardUncertainty: number | null }>;

/** The unit of an instrument's scale; null where the eye judges. */
export function scaleUnitOf({ kind, scaleUnit }: Pick<Scaled, "kind" | "scaleUnit">): ScaleUnit | null {
  return scaleUnitsOf[kind].length === 0 ? null : (scaleUnit ?? scaleUnitsOf[kind][0]!);
}

/**
 * Standard uncertainty of one good reading of a reference, in the scale's unit: the laboratory's own study, else what is
 * usual for the kind, else that of the smallest step (δ/√12); null where none of them is known.
 */
export function scaleUncertainty(instrument: Scaled): number | null {
  if (instrument.standardUncertainty) return instrument.standardUncertainty;
  const steps = { standardUncertainty: null, resolution: instrument.resolution };
  switch (instrument.kind) {
    case "refractometer":
      return edgeUncertainty({ instrument: steps, light: "sodium", quality: "good" });
    case "angleRefractometer":
      return angleUncertaintyDeg(steps);
    case "gauge":
      return gaugeUncertaintyMm(steps);
    case "balance":
      // A gram balance: by its own step, for the carat balance's usual figures are not its.
      return scaleUnitOf(instrument) === "ct" ? weighingUncertaintyCt(steps) : stepUncertainty(instrument.resolution);
    default:
      return stepUncertainty(instrument.resolution);
  }
}

const stepUncertainty = (step: number | null) => (step ? step / Math.sqrt(12) : null);
