import { normalCdf } from "../statistics/normal-cdf.ts";
import { birefringenceTerm, differenceU } from "./birefringence-term.ts";
import { blunderShares, defaultU, softness, span } from "./defaults.ts";
import type { EstimateWay, Evidence, ReadingGrade, RefractiveEvidence } from "./evidence.ts";
import { hull, roughIndex, usualIndex } from "./form-ranges.ts";
import { indexTerm, opaque, twoEdgesOnAggregateShare } from "./index-term.ts";
import { numericScore } from "./numeric-score.ts";
import { rotationTerm } from "./rotation-term.ts";
import { softUniformCdf, softUniformSurvival, softUniformTwoSided } from "./soft-uniform.ts";
import type { Interval, SpeciesForm } from "../species/species-table.ts";
import type { Term } from "./term.ts";

/** A second edge that can be told apart and still was not seen: hidden by the light, or not looked for (house value). */
const hiddenEdgeShare = 0.15;

/** Terms of the refractive index readings; `hasBirefringence`: it is given by itself and must not count twice. */
export function indexTerms(readings: NonNullable<Evidence["ri"]>, { hasBirefringence }: { hasBirefringence: boolean }): Term[] {
  return readings.flatMap((reading): Term[] => {
    switch (reading.kind) {
      case "edges":
        return reading.rotated ? rotatedEdges(reading, hasBirefringence) : [unrotatedEdges(reading)];
      case "single":
        return [singleEdge(reading.n, reading.u ?? defaultU.edge, `${reading.n.toFixed(3)}`, reading.quality)];
      case "criticalAngle": {
        const theta = (reading.angleDeg * Math.PI) / 180;
        const n = reading.prismN * Math.sin(theta);
        const uAngle = ((reading.u ?? defaultU.criticalAngleDeg) * Math.PI) / 180;
        return [singleEdge(n, Math.hypot(reading.prismN * Math.cos(theta) * uAngle, Math.sin(theta) * defaultU.prismN), `${n.toFixed(4)} by critical angle`, reading.quality)];
      }
      case "spot":
        return [rough(reading.n, reading.u ?? defaultU.spot, `${reading.n.toFixed(2)} spot`, reading.quality)];
      case "interval":
        return [betweenMarks(reading)];
      case "estimate":
        return [{ ...rough(reading.n, reading.u, `${reading.n.toFixed(2)} ${ways[reading.by]}`, reading.quality), isIndex: false }];
      case "overLimit":
        return [overLimit(reading.limit)];
      case "rotation":
        return [rotationTerm(reading)];
    }
  });
}

const ways: Readonly<Record<EstimateWay, string>> = { brewster: "by Brewster’s angle", reflectance: "by reflectance", depth: "by real and apparent depth", immersion: "by immersion" };

function rotatedEdges(reading: Extract<RefractiveEvidence, { kind: "edges" }>, hasBirefringence: boolean): Term[] {
  const { u = defaultU.edge, quality = "good" } = reading;
  const mean = (reading.low + reading.high) / 2;
  const blunderShare = blunderShares[quality];
  const low: Term = {
    ...indexTerm("ri", `${reading.low.toFixed(3)}–${reading.high.toFixed(3)}`, quality),
    score: (form, offset) => {
      if (form.lowIndex) return numericScore({ value: reading.low - offset, u, range: form.lowIndex, usual: form.usual.lowIndex, softness: softness.index, span: span.index, blunderShare });
      if (!form.spotIndex) return opaque;
      const score = numericScore({ value: mean - offset, u, range: form.spotIndex, usual: form.usual.spotIndex, softness: softness.index, span: span.index, blunderShare });
      return reading.high - reading.low <= 2 * differenceU(u) ? score : { ...score, logLikelihood: score.logLikelihood + Math.log(twoEdgesOnAggregateShare) };
    },
  };
  if (hasBirefringence) return [low];
  return [low, birefringenceTerm({ value: reading.high - reading.low, u: differenceU(u), quality })];
}

/** One position only: the two edges lie somewhere within the stone's indices, and its birefringence is at least their gap. */
function unrotatedEdges(reading: Extract<RefractiveEvidence, { kind: "edges" }>): Term {
  const { u = defaultU.edge, quality = "good" } = reading;
  const mean = (reading.low + reading.high) / 2;
  const gap = reading.high - reading.low;
  const blunderShare = blunderShares[quality];
  return {
    ...indexTerm("ri", `${reading.low.toFixed(3)}–${reading.high.toFixed(3)} at one position`, quality),
    unlistedLogLikelihood: Math.log(1 / span.index) + Math.log(0.5),
    score: (form, offset) => {
      const range = hull(form);
      if (!range) return opaque;
      const score = numericScore({ value: mean - offset, u, range, softness: softness.index, span: span.index, blunderShare });
      const most: Interval = form.birefringence ?? [0, range[1] - range[0]];
      const sigma = Math.hypot(differenceU(u), softness.birefringence);
      // P(birefringence ≥ gap): survival of the form's range at the gap, softened by the reading.
      const enough = form.lowIndex ? softUniformSurvival({ low: most[0], high: most[1], sigma }, gap) : twoEdgesOnAggregateShare;
      return { logLikelihood: score.logLikelihood + Math.log((1 - blunderShare) * enough + blunderShare), tail: Math.min(score.tail, Math.max(enough, 1e-12) * 2), distance: score.distance };
    },
  };
}

function singleEdge(n: number, u: number, observed: string, quality: ReadingGrade = "good"): Term {
  const blunderShare = blunderShares[quality];
  return {
    ...indexTerm("ri", observed, quality),
    score: (form, offset) => {
      const range = hull(form);
      if (!range) return opaque;
      const score = numericScore({ value: n - offset, u, range, usual: usualIndex(form), softness: softness.index, span: span.index, blunderShare });
      const share = oneEdgeShare(form, u);
      return share === 1 ? score : { ...score, logLikelihood: score.logLikelihood + Math.log(share) };
    },
  };
}

/** How often a doubly refractive form is read as one edge. Edges closer than three uncertainties cannot be told apart (formulas §4.6). */
function oneEdgeShare(form: SpeciesForm, u: number): number {
  if (!form.lowIndex || !form.birefringence || form.birefringence[1] === 0) return 1;
  const gap = form.usual.birefringence ?? (form.birefringence[0] + form.birefringence[1]) / 2;
  return 1 - normalCdf((gap - 3 * u) / u) * (1 - hiddenEdgeShare);
}

/** A spot, or any way that blurs the edges into one value. */
function rough(n: number, u: number, observed: string, quality: ReadingGrade = "good"): Term {
  return {
    ...indexTerm("ri", observed, quality),
    score: (form, offset) => {
      const range = roughIndex(form);
      return range ? numericScore({ value: n - offset, u, range, usual: usualIndex(form), softness: softness.index, span: span.index, blunderShare: blunderShares[quality] }) : opaque;
    },
  };
}

/** The index lies between two marks: F(high) − F(low). */
function betweenMarks({ low, high, u = defaultU.interval, quality = "good" }: Extract<RefractiveEvidence, { kind: "interval" }>): Term {
  const sigma = Math.hypot(u, softness.index);
  const width = Math.max(high - low, 1e-6);
  const blunderShare = blunderShares[quality];
  return {
    ...indexTerm("ri", `${low.toFixed(3)}–${high.toFixed(3)} as bounds`, quality),
    unlistedLogLikelihood: Math.log(Math.min(1, width / span.index)),
    score: (form, offset) => {
      const range = roughIndex(form);
      if (!range) return { ...opaque, logLikelihood: Math.log((blunderShare * width) / span.index) };
      const soft = { low: range[0], high: range[1], sigma };
      const [from, to] = [low - offset, high - offset];
      const between = softUniformCdf(soft, to) - softUniformCdf(soft, from);
      const distance = to < range[0] ? (to - range[0]) / sigma : from > range[1] ? (from - range[1]) / sigma : 0;
      const tail = distance === 0 ? 1 : softUniformTwoSided(soft, distance < 0 ? to : from);
      return { logLikelihood: Math.log((1 - blunderShare) * Math.max(0, between) + blunderShare * Math.min(1, width / span.index)), tail, distance };
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
      return { logLikelihood: Math.log((1 - blunderShares.good) * above + blunderShares.good * 0.2), tail: Math.min(1, 2 * above), distance: above < 0.5 ? (limit - range[1]) / 0.0025 : 0 };
    },
  };
}
