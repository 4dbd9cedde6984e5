import type { ReadingValue } from "#app/domain/reading.ts";
import { applyCorrection } from "#app/features/instruments/apply-correction.ts";
import { plainText } from "#app/domain/plain-text.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import type { RotationRun } from "#app/gemmology/rotation/rotation-run.ts";
import { rotationEvidence } from "#app/gemmology/ranking/rotation-evidence.ts";
import type { RotationFit, RotationSolution } from "#app/gemmology/rotation/rotation-fit.ts";
import type { Composed } from "./compose-reading.ts";
import { derived } from "./derived-values.ts";
import type { ReadingDraft } from "./reading-draft.ts";
import type { ReadingInstrument } from "./reading-instrument.ts";
import { readRotationRows } from "./rotation-rows.ts";
import { edgeUncertainty } from "./usual-uncertainty.ts";

const mostText = 6000;
/** What the scale itself may be off by, the same at every position: its check's limit of ± 0.002, rectangular (JCGM 100:2008, 4.3.7). */
const scaleU = 0.002 / Math.sqrt(3);

/** A rotation run as it was typed, fitted: its indices, and of the middle one nothing while one facet leaves it open. */
export function composeRotation(draft: Extract<ReadingDraft, { kind: "rotation" }>, instrument: ReadingInstrument | null): Composed {
  const { kind, quality, light } = draft;
  const rows = plainText(draft.rows);
  if (rows.length > mostText) return { problems: { rows: [`At most ${mostText} characters; this is ${rows.length}.`] } };
  if (quality === "noResult") return { reading: { detail: { kind, light, rows: "", character: "undetermined", sign: null, solutions: [] }, quality, values: [] } };
  const { run: read, problem } = readRotationRows(rows, edgeUncertainty({ instrument, light, quality }));
  if (problem !== null) return { problems: { rows: [problem] } };
  const limit = instrument?.upperLimit;
  const beyond = limit ? read.facets.flatMap(({ readings }) => readings).find(({ upper, lower }) => Math.max(upper ?? 0, lower ?? 0) > limit + 0.002) : undefined;
  if (beyond) return { problems: { rows: [`${Math.max(beyond.upper ?? 0, beyond.lower ?? 0).toFixed(3)} at ${beyond.angleDeg}° lies above ${limit}, the limit of this refractometer's contact liquid: write a dash for an edge beyond it.`] } };
  const fit = fitRotation(correctedRun(read, instrument));
  const { character, sign } = rotationFinding(fit);
  return { reading: { detail: { kind, light, rows, character, sign, solutions: solutionsOf(fit) }, quality, values: valuesOf(fit) } };
}

function solutionsOf(fit: RotationFit) {
  const evidence = rotationEvidence(fit);
  return evidence?.kind === "rotation" ? evidence.solutions : [];
}

/** The run with its scale's correction; its lines stay as they were typed. */
export function correctedRun(run: RotationRun, instrument: ReadingInstrument | null): RotationRun {
  const corrected = (edge: number | null) => (edge === null ? null : (applyCorrection(instrument?.correction, { value: edge, unit: "n" })?.value ?? edge));
  return { facets: run.facets.map(({ label, readings }) => ({ label, readings: readings.map((reading) => ({ ...reading, upper: corrected(reading.upper), lower: corrected(reading.lower) })) })) };
}

/** What the run decides of the crystal; what several solutions within reach share, where none is alone. */
export function rotationFinding(fit: RotationFit): Pick<RotationSolution, "character" | "sign"> {
  const rivals = rivalsOf(fit);
  const [first] = rivals;
  const share = <Key extends "character" | "sign">(key: Key) => (rivals.every((rival) => rival[key] === first![key]) ? first![key] : null);
  return { character: share("character") ?? "undetermined", sign: share("sign") };
}

const rivalAt = 9;
const rivalsOf = ({ solutions }: RotationFit) => solutions.filter(({ deltaChiSquared }) => deltaChiSquared <= rivalAt);

function valuesOf(fit: RotationFit): ReadingValue[] {
  const rivals = rivalsOf(fit);
  const formula = `edges of a rotation, ${fit.modelVersion}`;
  const index = (name: ReadingValue["name"], value: number, u: number) => derived(name, { value, unit: "n", u: Math.hypot(u, scaleU), formula });
  const ends = rivals.map(endsOf).filter((end) => end !== null);
  const values: ReadingValue[] = [];
  if (ends.length > 0) {
    const middle = (of: (end: (typeof ends)[number]) => number) => ends.reduce((sum, end) => sum + of(end), 0) / ends.length;
    const [low, high] = [middle(({ low }) => low), middle(({ high }) => high)];
    const widest = (of: (end: (typeof ends)[number]) => number, at: number, uOf: (end: (typeof ends)[number]) => number) => Math.max(...ends.map((end) => Math.hypot(uOf(end), of(end) - at)));
    values.push(index("low", low, widest((end) => end.low, low, (end) => end.uLow)), index("high", high, widest((end) => end.high, high, (end) => end.uHigh)));
    // The scale's own error cancels in the gap.
    values.push(derived("birefringence", { value: high - low, unit: "1", u: Math.max(...rivals.map(({ birefringence }) => birefringence?.u ?? 0), 1e-4), formula }));
  }
  const [only] = rivals;
  if (rivals.length === 1 && only && only.character !== "undetermined") {
    for (const [name, value] of Object.entries(only.indices)) values.push(index(name as ReadingValue["name"], value, only.u[name] ?? 0));
  }
  return values;
}

function endsOf({ indices, u }: RotationSolution): Readonly<{ low: number; high: number; uLow: number; uHigh: number }> | null {
  if ("omega" in indices) {
    const isPositive = indices.epsilon > indices.omega;
    return isPositive ? { low: indices.omega, high: indices.epsilon, uLow: u.omega!, uHigh: u.epsilon! } : { low: indices.epsilon, high: indices.omega, uLow: u.epsilon!, uHigh: u.omega! };
  }
  if ("beta" in indices) return { low: indices.alpha, high: indices.gamma, uLow: u.alpha!, uHigh: u.gamma! };
  return null;
}
