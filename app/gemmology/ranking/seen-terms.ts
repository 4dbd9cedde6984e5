import { colourTerm, lustreTerm, phenomenaTerms, transparencyTerm } from "./appearance-terms.ts";
import type { Evidence } from "./evidence.ts";
import { colourFilterTerm, glowTerm, pleochroismTerm } from "./light-terms.ts";
import { half, probable, seenTerm, summary } from "./seen-term.ts";
import { spectrumTerm } from "./spectrum-term.ts";
import type { Term } from "./term.ts";

/** Everything that is looked at rather than read from a scale. Words that name nothing known say nothing. */
export function lookedAtTerms(evidence: Evidence): Term[] {
  const { colour = [], fluorescence = {} } = evidence;
  const terms: Array<Term | null | undefined | ""> = [
    colourTerm(colour),
    evidence.transparency && transparencyTerm(evidence.transparency),
    evidence.lustre && lustreTerm(evidence.lustre),
    ...phenomenaTerms(evidence.phenomena ?? []),
    evidence.pleochroism && pleochroismTerm(evidence.pleochroism),
    fluorescence.longWave && glowTerm("fluorescenceLongWave", fluorescence.longWave, ({ longWave }) => longWave),
    fluorescence.shortWave && glowTerm("fluorescenceShortWave", fluorescence.shortWave, ({ shortWave }) => shortWave),
    evidence.absorption && spectrumTerm(evidence.absorption, colour),
    evidence.colourFilter ? colourFilterTerm(evidence.colourFilter) : null,
    evidence.thermal && thermalTerm(evidence.thermal),
    evidence.magnetic && magneticTerm(evidence.magnetic),
  ];
  return terms.filter((term) => !!term);
}

function thermalTerm(observed: NonNullable<Evidence["thermal"]>): Term {
  const isDiamondLike = observed === "diamond-like";
  return {
    ...seenTerm("thermal", observed, 0.3),
    score: ({ thermal }) => probable((thermal === "diamond-like") === isDiamondLike ? 0.95 : 0.02),
    reference: (forms) => summary(forms.flatMap(({ thermal }) => thermal ?? [])),
  };
}

/** P(response to a strong magnet) of forms with iron or manganese in their formula and of others; colouring traces draw a little (house values, common practice). */
const magneticShares = { iron: { inert: 0.25, weak: 0.3, moderate: 0.25, strong: 0.2 }, other: { inert: 0.8, weak: 0.14, moderate: 0.045, strong: 0.015 } } as const;

function magneticTerm(observed: NonNullable<Evidence["magnetic"]>): Term {
  return {
    ...seenTerm("magnetic", observed, 0.25, half),
    score: ({ isMagnetic }) => probable(magneticShares[isMagnetic ? "iron" : "other"][observed], half, magneticShares[isMagnetic ? "iron" : "other"][observed] * 2),
    reference: (forms) => (forms.some(({ isMagnetic }) => isMagnetic) ? "iron or manganese in its formula" : "no iron or manganese in its formula"),
  };
}
