import { blunderShare, defaultU, softness, span } from "./defaults.ts";
import type { Evidence, RefractiveEvidence } from "./evidence.ts";
import { numericScore } from "./numeric-score.ts";
import { softUniformSurvival } from "./soft-uniform.ts";
import type { Interval, SpeciesForm } from "../species/species-table.ts";
import type { Score, Term } from "./term.ts";

const opaque: Score = { logLikelihood: Math.log(blunderShare / span.index), tail: 0, distance: 0 };
const hiddenEdgeShare = 0.15;
const twoEdgesOnAggregateShare = 0.1;
/** Edges of one facet share most of their error: their difference is read better than either (instruments' notes). */
const differenceU = (u: number) => u * (defaultU.birefringence / defaultU.edge);

/** Terms of the refractive index readings; `hasBirefringence`: it is given by itself and must not count twice. */
export function indexTerms(readings: NonNullable<Evidence["ri"]>, { hasBirefringence }: { hasBirefringence: boolean }): Term[] {
  return readings.flatMap((reading): Term[] => {
    switch (reading.kind) {
      case "edges":
        return reading.rotated ? rotatedEdges(reading, hasBirefringence) : [unrotatedEdges(reading)];
      case "single":
        return [singleEdge(reading.n, reading.u ?? defaultU.edge, `${reading.n.toFixed(3)}`)];
      case "criticalAngle": {
        const theta = (reading.angleDeg * Math.PI) / 180;
        const n = reading.prismN * Math.sin(theta);
        const uAngle = ((reading.u ?? defaultU.criticalAngleDeg) * Math.PI) / 180;
        return [singleEdge(n, Math.hypot(reading.prismN * Math.cos(theta) * uAngle, Math.sin(theta) * defaultU.prismN), `${n.toFixed(4)} by critical angle`)];
      }
      case "spot":
        return [spot(reading)];
      case "overLimit":
        return [overLimit(reading.limit)];
    }
  });
}

function rotatedEdges(reading: Extract<RefractiveEvidence, { kind: "edges" }>, hasBirefringence: boolean): Term[] {
  const u = reading.u ?? defaultU.edge;
  const mean = (reading.low + reading.high) / 2;
  const low: Term = {
    ...indexTerm("ri", `${reading.low.toFixed(3)}–${reading.high.toFixed(3)}`),
    score: (form, offset) => {
      if (form.lowIndex) return numericScore({ value: reading.low - offset, u, range: form.lowIndex, usual: form.usual.lowIndex, softness: softness.index, span: span.index });
      if (!form.spotIndex) return opaque;
      const score = numericScore({ value: mean - offset, u, range: form.spotIndex, usual: form.usual.spotIndex, softness: softness.index, span: span.index });
      return { ...score, logLikelihood: score.logLikelihood + Math.log(twoEdgesOnAggregateShare) };
    },
  };
  if (hasBirefringence) return [low];
  return [low, birefringenceTerm({ value: reading.high - reading.low, u: differenceU(u) })];
}

/** One position only: the two edges lie somewhere within the stone's indices, and its birefringence is at least their gap. */
function unrotatedEdges(reading: Extract<RefractiveEvidence, { kind: "edges" }>): Term {
  const u = reading.u ?? defaultU.edge;
  const mean = (reading.low + reading.high) / 2;
  const gap = reading.high - reading.low;
  return {
    ...indexTerm("ri", `${reading.low.toFixed(3)}–${reading.high.toFixed(3)} at one position`),
    unlistedLogLikelihood: Math.log(1 / span.index) + Math.log(0.5),
    score: (form, offset) => {
      const range = hull(form);
      if (!range) return opaque;
      const score = numericScore({ value: mean - offset, u, range, softness: softness.index, span: span.index });
      const most: Interval = form.birefringence ?? [0, range[1] - range[0]];
      const sigma = Math.hypot(differenceU(u), softness.birefringence);
      // P(birefringence ≥ gap): survival of the form's range at the gap, softened by the reading.
      const enough = form.lowIndex ? softUniformSurvival({ low: most[0], high: most[1], sigma }, gap) : twoEdgesOnAggregateShare;
      return { logLikelihood: score.logLikelihood + Math.log((1 - blunderShare) * enough + blunderShare), tail: Math.min(score.tail, Math.max(enough, 1e-12) * 2), distance: score.distance };
    },
  };
}

function singleEdge(n: number, u: number, observed: string): Term {
  return {
    ...indexTerm("ri", observed),
    score: (form, offset) => {
      const range = hull(form);
      if (!range) return opaque;
      const score = numericScore({ value: n - offset, u, range, usual: usualOf(form), softness: softness.index, span: span.index });
      const doubled = form.birefringence ? (form.birefringence[0] + form.birefringence[1]) / 2 : 0;
      // A second edge that should have been seen was not: hidden, or the stone lay along its axis.
      return doubled > 2 * u && form.lowIndex ? { ...score, logLikelihood: score.logLikelihood + Math.log(hiddenEdgeShare) } : score;
    },
  };
}

function spot(reading: Extract<RefractiveEvidence, { kind: "spot" }>): Term {
  return {
    ...indexTerm("ri", `${reading.n.toFixed(2)} spot`),
    score: (form, offset) => {
      const range = form.spotIndex ? outer(form.spotIndex, hull(form)) : hull(form);
      return range ? numericScore({ value: reading.n - offset, u: reading.u ?? defaultU.spot, range, usual: usualOf(form), softness: softness.index, span: span.index }) : opaque;
    },
  };
}

function overLimit(limit: number): Term {
  return {
    ...indexTerm("ri", `over ${limit.toFixed(2)}`),
    unlistedLogLikelihood: Math.log(0.2),
    score: (form) => {
      const range = form.lowIndex ?? form.spotIndex;
      // An opaque, metallic surface shows no edge either.
      if (!range) return { logLikelihood: 0, tail: 1, distance: 0 };
      const above = softUniformSurvival({ low: range[0], high: range[1], sigma: Math.hypot(0.002, softness.index) }, limit);
      return { logLikelihood: Math.log((1 - blunderShare) * above + blunderShare * 0.2), tail: Math.min(1, 2 * above), distance: above < 0.5 ? (limit - range[1]) / 0.0025 : 0 };
    },
  };
}

/** Birefringence by itself. */
export function birefringenceTerm({ value, u = defaultU.birefringence }: { value: number; u?: number }): Term {
  return {
    property: "birefringence",
    observed: value.toFixed(3),
    isIndex: false,
    measure: { noun: "birefringence", decimals: 3 },
    unlistedLogLikelihood: Math.log(1 / span.birefringence),
    score: (form) =>
      form.birefringence
        ? numericScore({ value, u, range: form.birefringence, usual: form.usual.birefringence, softness: softness.birefringence, span: span.birefringence })
        : // An aggregate shows no birefringence of its own; what was read says little about it.
          { logLikelihood: Math.log(0.2 / span.birefringence), tail: 1, distance: 0 },
    reference: (forms) => written(forms.flatMap(({ birefringence }) => (birefringence ? [birefringence] : [])), 3) || "not observed on aggregates",
    contradiction: (form, { distance }) => (form.birefringence?.[1] === 0 ? "singly refractive, the stone is not" : outOfRange("birefringence", distance)),
  };
}

function indexTerm(property: string, observed: string): Omit<Term, "score"> {
  return {
    property,
    observed,
    isIndex: true,
    measure: { noun: "index", decimals: 3 },
    unlistedLogLikelihood: Math.log(1 / span.index),
    reference: (forms) => written(forms.flatMap((form) => hull(form) ?? form.spotIndex ?? []).length ? forms.flatMap((form) => { const range = hull(form); return range ? [range] : []; }) : [], 3) || "no index can be read",
    contradiction: (form, { distance }) => (hull(form) ? outOfRange("index", distance) : "opaque and metallic: it gives no index"),
  };
}

export function outOfRange(noun: string, distance: number): string {
  const times = Math.abs(distance) >= 100 ? "more than 100" : Math.abs(distance).toFixed(Math.abs(distance) < 10 ? 1 : 0);
  return `${noun} too ${distance > 0 ? "high" : "low"} by ${times} standard uncertainties`;
}

/** From the least to the greatest index of a form, whatever it is read with. */
export function hull(form: SpeciesForm): Interval | null {
  if (form.lowIndex && form.highIndex) return [form.lowIndex[0], form.highIndex[1]];
  return form.spotIndex;
}

/** What one edge or a spot shows of a form most: the middle of its usual indices. */
function usualOf({ usual: { lowIndex, highIndex, spotIndex } }: SpeciesForm): number | undefined {
  return spotIndex ?? (lowIndex !== undefined && highIndex !== undefined ? (lowIndex + highIndex) / 2 : undefined);
}

function outer(a: Interval, b: Interval | null): Interval {
  return b ? [Math.min(a[0], b[0]), Math.max(a[1], b[1])] : a;
}

/** The widest range over forms, written with so many decimals. */
export function written(ranges: readonly Interval[], decimals: number): string {
  if (ranges.length === 0) return "";
  const low = Math.min(...ranges.map(([least]) => least));
  const high = Math.max(...ranges.map(([, most]) => most));
  return low === high ? low.toFixed(decimals) : `${low.toFixed(decimals)}–${high.toFixed(decimals)}`;
}
