import type { Facet, Light, ReadingQuality } from "#app/domain/reading.ts";
import type { Reading } from "./story.ts";

type Seen = { facet?: Facet; light?: Light; quality?: ReadingQuality; note?: string; instrument?: string };

export const edges = (low: string, high: string, { facet = "table", light = "sodium", quality = "good", note, instrument = "R2", isRotated = true }: Seen & { isRotated?: boolean } = {}): Reading => ({
  draft: { kind: "refractometer", edges: "two", low, high, isRotated, facet, light, quality },
  instrument,
  note,
});
export const edge = (low: string, { facet = "table", light = "sodium", quality = "good", note, instrument = "R2" }: Seen = {}): Reading => ({
  draft: { kind: "refractometer", edges: "one", low, high: "", isRotated: true, facet, light, quality },
  instrument,
  note,
});
export const spot = (n: string, { facet = "dome", light = "white", quality = "good", note, instrument = "R1" }: Seen = {}): Reading => ({
  draft: { kind: "spot", method: "50/50", n, facet, light, quality },
  instrument,
  note,
});
export const overLimit = ({ facet = "table", light = "sodium", quality = "good", note, instrument = "R2" }: Seen = {}): Reading => ({
  draft: { kind: "overLimit", limit: "1.81", facet, light, quality },
  instrument,
  note,
});
export const criticalAngle = (angleDeg: string, { facet = "table", light = "sodium", quality = "good", note }: Seen = {}): Reading => ({
  draft: { kind: "criticalAngle", angleDeg, prismN: "1.8800", facet, light, quality },
  instrument: "A1",
  note,
});
type Polars = { figure?: "notSought" | "none" | "uniaxial" | "uniaxialHollowCentre" | "biaxial"; sign?: "+" | "-" | null; note?: string };
export const polars = (behaviour: "dark" | "blinks" | "staysLight" | "anomalous" | "cannotTell", { figure = "notSought", sign = null, note }: Polars = {}): Reading => ({
  draft: { kind: "polariscope", behaviour, directionsTried: "3", figure, sign, quality: "good" },
  instrument: "P1",
  note,
});
export const density = (massAirCt: string, massLiquidCt: string, tempC = "21.4", note?: string): Reading => ({
  draft: { kind: "density", method: "suspended", massAirCt, massLiquidCt, tempC, quality: "good" },
  instrument: "B1",
  note,
});
export const weight = (weightCt: string): Reading => ({ draft: { kind: "weight", weightCt, quality: "good" }, instrument: "B1" });
export const size = (lengthMm: string, widthMm: string, depthMm: string, shape: "round" | "other" = "other"): Reading => ({
  draft: { kind: "dimensions", shape, lengthMm, widthMm, depthMm, quality: "good" },
  instrument: "G1",
});
export const seen = (text: string, instrument: string | null = "M1"): Reading => ({ draft: { kind: "free", text, quality: "good" }, instrument });
export const struck = (reading: Reading, struckBecause: string): Reading => ({ ...reading, struckBecause });
type Typed = Extract<Reading["draft"], { typed: unknown }>;
/** A reading of a described test; what is left out of its form is left empty. */
export const told = (kind: Typed["kind"], typed: Typed["typed"], instrument: string | null = null, note?: string): Reading => ({ draft: { kind, typed, quality: "good" }, instrument, note });
/** Over a half turn on the table, in steps of 15°. */
export const rotation = (rows: readonly string[], instrument = "R2"): Reading => ({ draft: { kind: "rotation", light: "sodium", rows: rows.join("\n"), quality: "good" }, instrument });
