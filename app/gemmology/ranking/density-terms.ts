import type { HeavyLiquidObservation } from "../density/heavy-liquid.ts";
import { blunderShares, defaultU, softness, span } from "./defaults.ts";
import type { Evidence } from "./evidence.ts";
import { outOfRange, written } from "./form-ranges.ts";
import { numericScore } from "./numeric-score.ts";
import { softUniformDensity, softUniformSurvival } from "./soft-uniform.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import type { Score, Term } from "./term.ts";

const reference = (forms: readonly SpeciesForm[]) => written(forms.flatMap(({ sg }) => (sg ? [sg] : [])), 2) || "not known";

export function sgTerm({ value, u = defaultU.sg, quality = "good" }: NonNullable<Evidence["sg"]>): Term {
  const notKnown: Score = { logLikelihood: Math.log(1 / span.sg), tail: 1, distance: 0 };
  return {
    property: "sg",
    observed: value.toFixed(u < 0.01 ? 3 : 2),
    isIndex: false,
    measure: { noun: "density", decimals: 2 },
    unlistedLogLikelihood: Math.log(1 / span.sg),
    cannotContradict: quality !== "good",
    score: (form) => (form.sg ? numericScore({ value, u, range: form.sg, usual: form.usual.sg, softness: softness.sg, span: span.sg, blunderShare: blunderShares[quality] }) : notKnown),
    reference,
    contradiction: (_form, { distance }) => outOfRange("density", distance),
  };
}

const did = { floats: "floats in", suspended: "is suspended in", sinks: "sinks in" } as const;

/** A stone in a liquid of known density: a bound on its own, or a reading where it stays suspended (formulas §8.6). */
export function heavyLiquidTerm({ behaviour, liquidSg, uLiquidSg = defaultU.liquidSg }: HeavyLiquidObservation): Term {
  const sigma = Math.hypot(uLiquidSg, softness.sg);
  const unlisted = behaviour === "suspended" ? 1 / span.sg : 0.5;
  const blunderShare = blunderShares.good;
  return {
    property: "heavyLiquid",
    observed: `${did[behaviour]} ${liquidSg.toFixed(2)}`,
    isIndex: false,
    measure: { noun: "density", decimals: 2 },
    unlistedLogLikelihood: Math.log(unlisted),
    score: (form) => {
      if (!form.sg) return { logLikelihood: Math.log(unlisted), tail: 1, distance: 0 };
      const [low, high] = form.sg;
      const distance = behaviour !== "floats" && high < liquidSg ? (liquidSg - high) / sigma : behaviour !== "sinks" && low > liquidSg ? (liquidSg - low) / sigma : 0;
      const denser = softUniformSurvival({ low, high, sigma }, liquidSg);
      const lighter = softUniformSurvival({ low: -high, high: -low, sigma }, -liquidSg);
      const fitting = behaviour === "suspended" ? softUniformDensity({ low, high, sigma }, liquidSg) : behaviour === "sinks" ? denser : lighter;
      const tail = Math.min(1, 2 * (behaviour === "suspended" ? Math.min(denser, lighter) : fitting));
      return { logLikelihood: Math.log((1 - blunderShare) * fitting + blunderShare * unlisted), tail: distance === 0 ? 1 : tail, distance };
    },
    reference,
    contradiction: (_form, { distance }) => (distance > 0 ? `it would float: ${outOfRange("liquid’s density", distance)}` : `it would sink: ${outOfRange("liquid’s density", distance)}`),
  };
}
