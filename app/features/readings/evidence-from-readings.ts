import type { ReadingDetail, ReadingQuality, ReadingValue, ReadingValueName } from "#app/domain/reading.ts";
import type { Evidence, RefractiveEvidence } from "#app/gemmology/ranking/evidence.ts";
import { immersionIndex } from "./derived-from-described.ts";
import { seenEvidence } from "./seen-evidence.ts";
import { characterOf } from "./optic-character.ts";

/** A reading as the ranking takes it: one that was saved, or the one that is being typed. */
export type RankedReading = Readonly<{ detail: ReadingDetail; quality: ReadingQuality; values: readonly ReadingValue[]; strike?: unknown }>;

/**
 * What the readings that stand say together, for the ranking. The browser runs it with the reading that is being typed
 * behind the saved ones, the server with what was saved: one and the same code.
 */
export function evidenceFromReadings(readings: readonly RankedReading[]): Evidence {
  const standing = readings.filter(({ quality, strike }) => quality !== "noResult" && !strike);
  const ri = standing.flatMap((reading) => {
    const found = riOf(reading);
    return found ? [{ ...found, ...gradeOf(reading.quality) }] : [];
  });
  const polariscope = bestPolariscope(standing);
  const character = polariscope && characterOf(polariscope);
  const sign = character === "uniaxial" || character === "biaxial" ? polariscope?.sign : null;
  const sg = meanDensity(standing);
  const heavyLiquids = standing.flatMap((reading) => heavyLiquidOf(reading) ?? []);
  return { ...seenEvidence(standing), ...(heavyLiquids.length > 0 && { heavyLiquids }), ...(ri.length > 0 && { ri }), ...(character && { opticCharacter: character }), ...(sign && { opticSign: sign }), ...(sg && { sg }) };
}

/** Poor readings say less: their uncertainty is widened, so that one of them cannot outweigh a good one. */
const widening: Readonly<Record<ReadingQuality, number>> = { good: 1, fair: 1.5, poor: 3, noResult: 1 };

/** Of a reading that could not be taken well more blunders are allowed for, and it contradicts nothing by itself. */
const gradeOf = (quality: ReadingQuality) => (quality === "fair" || quality === "poor" ? { quality } : {});

function riOf({ detail, quality, values }: RankedReading): RefractiveEvidence | undefined {
  const get = (name: ReadingValueName) => values.find((value) => value.name === name);
  const u = (value: ReadingValue | undefined) => (value?.standardUncertainty ?? 0.0015) * widening[quality];
  switch (detail.kind) {
    case "refractometer": {
      const [low, high, n] = [get("low"), get("high"), get("n")];
      if (low && high) return { kind: "edges", low: low.value, high: high.value, u: u(low), rotated: detail.isRotated };
      return n && { kind: "single", n: n.value, u: u(n) };
    }
    case "spot": {
      const n = get("n");
      return n && { kind: "spot", n: n.value, u: u(n) };
    }
    case "criticalAngle": {
      const [angle, prism] = [get("angleDeg"), get("prismN")];
      return angle && prism && { kind: "criticalAngle", angleDeg: angle.value, prismN: prism.value, u: (angle.standardUncertainty ?? 0.03) * widening[quality] };
    }
    case "overLimit": {
      const limit = get("limit");
      return limit && { kind: "overLimit", limit: limit.value };
    }
    case "rotation": {
      // Its crystals hold what it says of character and sign as well.
      if (detail.solutions.length > 0) return { kind: "rotation", solutions: detail.solutions.map((crystal) => ({ ...crystal, u: (crystal.u ?? 0.0015) * widening[quality] })) };
      const edge = get("alpha") ?? get("gamma");
      return edge && { kind: "single", n: edge.value, u: u(edge) };
    }
    case "reflectivity":
    case "brewster":
    case "realDepth":
    case "immersion": {
      const n = get("n");
      if (n) return { kind: "estimate", n: n.value, u: u(n), by: ({ reflectivity: "reflectance", brewster: "brewster", realDepth: "depth", immersion: "immersion" } as const)[detail.kind] };
      return detail.kind === "immersion" && detail.comparison === "higher" && detail.liquid ? { kind: "overLimit", limit: immersionIndex(detail.liquid) } : undefined;
    }
    default:
      return undefined;
  }
}

/** What the stone did in a liquid of known density; a suspended one has that density. */
function heavyLiquidOf({ detail, values }: RankedReading): NonNullable<Evidence["heavyLiquids"]>[number] | undefined {
  if (detail.kind !== "heavyLiquid" || !detail.behaviour) return undefined;
  const liquid = values.find(({ name }) => name === "liquidSg");
  const behaviour = ({ floats: "floats", suspended: "suspended", sinksSlowly: "sinks", sinks: "sinks" } as const)[detail.behaviour];
  return liquid && { behaviour, liquidSg: liquid.value, uLiquidSg: liquid.standardUncertainty ?? 0.01 };
}

const qualityOrder: readonly ReadingQuality[] = ["poor", "fair", "good"];

/** The best one; among equals the one that says more, then the later one. */
function bestPolariscope(readings: readonly RankedReading[]) {
  const says = (detail: Extract<ReadingDetail, { kind: "polariscope" }>) => ({ undefined: 0, anisotropic: 1 })[String(characterOf(detail)) as "undefined"] ?? 2;
  return readings
    .flatMap(({ detail, quality }, at) => (detail.kind === "polariscope" && characterOf(detail) ? [{ detail, quality: qualityOrder.indexOf(quality), says: says(detail), at }] : []))
    .sort((a, b) => b.quality - a.quality || b.says - a.says || b.at - a.at)[0]?.detail;
}

/** Several weighings as one: weighted by their uncertainties, and widened where they differ by more than those (Birge). */
function meanDensity(readings: readonly RankedReading[]): NonNullable<Evidence["sg"]> | undefined {
  const weighings = readings.flatMap(({ values, quality }) => {
    const sg = values.find(({ name }) => name === "sg");
    return sg?.standardUncertainty ? [{ value: sg.value, u: sg.standardUncertainty * widening[quality], quality }] : [];
  });
  if (weighings.length === 0) return undefined;
  const weight = weighings.reduce((sum, { u }) => sum + u ** -2, 0);
  const value = weighings.reduce((sum, one) => sum + one.value / one.u ** 2, 0) / weight;
  const chiSquared = weighings.reduce((sum, one) => sum + ((one.value - value) / one.u) ** 2, 0);
  const birge = weighings.length > 1 ? Math.max(1, Math.sqrt(chiSquared / (weighings.length - 1))) : 1;
  const best = weighings.reduce((a, b) => (qualityOrder.indexOf(b.quality) > qualityOrder.indexOf(a.quality) ? b : a)).quality;
  return { value, u: birge / Math.sqrt(weight), ...gradeOf(best) };
}
