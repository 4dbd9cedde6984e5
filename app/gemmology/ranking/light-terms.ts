import { colourMask } from "../species/colour-mask.ts";
import type { Glow, SpeciesForm } from "../species/species-table.ts";
import { inBritish } from "./appearance-terms.ts";
import { isBiaxial, isSingle } from "./character-terms.ts";
import type { Evidence, Fluorescence } from "./evidence.ts";
import { beside, half, probable, seenTerm, summary } from "./seen-term.ts";
import type { Term } from "./term.ts";

const degrees = { none: 0, inert: 0, weak: 1, moderate: 2, strong: 3 } as const;

/**
 * P(strength seen | strongest that the table knows): none to strong by column, none known to strong by row; rows sum to 1
 * (house values, common practice). Seen, pleochroism proves double refraction; unseen, it proves nothing.
 */
const pleochroismSeen = [[0.7, 0.2, 0.07, 0.03], [0.5, 0.35, 0.12, 0.03], [0.3, 0.32, 0.28, 0.1], [0.2, 0.18, 0.3, 0.32]] as const;
const onSingle = [0.96, 0.025, 0.01, 0.005] as const;
/** Three colours come from three different indices. */
const threeColoursUnlessBiaxial = 0.1;

export function pleochroismTerm({ strength, colours = [] }: NonNullable<Evidence["pleochroism"]>): Term {
  const observed = degrees[strength];
  const isTrichroic = new Set(colours).size >= 3;
  return {
    ...seenTerm("pleochroism", isTrichroic ? `${strength}, three colours` : strength, 0.25, half),
    score: (form) => {
      const row = isSingle(form) ? onSingle : pleochroismSeen[form.pleochroism as 0 | 1 | 2 | 3];
      const trichroism = isTrichroic && !isBiaxial(form) ? threeColoursUnlessBiaxial : 1;
      return beside(row[observed] * trichroism, Math.max(...row), half);
    },
    reference: (forms) => ["none", "weak", "distinct", "strong"][Math.max(...forms.map(({ pleochroism }) => pleochroism))]!,
  };
}

/** P(strength seen | strength of the alternative), by the steps between them; a step to either side is common (instruments' notes). */
const bySteps = [0.66, 0.24, 0.08, 0.02] as const;
/** A glow of a known colour shows it, or one that the table does not know. */
const glowColour = { same: 0.7, other: 0.05, unknown: 0.15 } as const;

export function glowTerm(property: "fluorescenceLongWave" | "fluorescenceShortWave", { strength, colour }: Fluorescence, glowsOf: (form: SpeciesForm) => readonly Glow[]): Term {
  const seen = degrees[strength];
  const mask = seen > 0 ? colourMask(colour && inBritish(colour)) : 0;
  const unlisted = 0.25 * (mask === 0 ? 1 : glowColour.unknown);
  return {
    ...seenTerm(property, [strength, colour].filter(Boolean).join(" "), unlisted, half),
    score: (form) => {
      const glows = glowsOf(form);
      if (glows.length === 0) return probable(unlisted, half, 1);
      let [sum, most] = [0, 0];
      for (const glow of glows) {
        sum += strengthShare(glow, seen) * (mask === 0 ? 1 : glow[2] === 0 ? glowColour.unknown : glow[2] & mask ? glowColour.same : glowColour.other);
        most = Math.max(most, strengthShare(glow, glow[1]));
      }
      return beside(sum / glows.length, (most / glows.length) * (mask === 0 ? 1 : glowColour.same), half);
    },
    reference: (forms) => summary(forms.flatMap((form) => glowsOf(form).map(([, most]) => ["inert", "weak", "moderate", "strong"][most]!))),
  };
}

function strengthShare([least, most]: Glow, seen: number): number {
  let sum = 0;
  for (let each = 0; each <= 3; each++) sum += bySteps[each < least ? least - each : each > most ? each - most : 0]!;
  return bySteps[seen < least ? least - seen : seen > most ? seen - most : 0]! / sum;
}

/** P(red through the filter) where some variety is known for it, where none is, and where nothing is known (house values). */
const redShare = { known: 0.6, never: 0.05, unknown: 0.2 } as const;

export function colourFilterTerm(observed: string): Term {
  const isRed = /red|pink/.test(observed.toLowerCase()) && !/\b(no|not)\b/.test(observed.toLowerCase());
  return {
    ...seenTerm("colourFilter", observed, isRed ? redShare.unknown : 1 - redShare.unknown, half),
    score: ({ filterRed }) => {
      const red = filterRed === null ? redShare.unknown : filterRed ? redShare.known : redShare.never;
      return beside(isRed ? red : 1 - red, Math.max(red, 1 - red), half);
    },
    reference: (forms) => (forms.some(({ filterRed }) => filterRed) ? "red possible" : "no red"),
  };
}
