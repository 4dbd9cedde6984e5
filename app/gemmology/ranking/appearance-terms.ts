import { colourFamilies, type ColourFamily } from "../species/colour-families.ts";
import { colourMask, sharedColours } from "../species/colour-mask.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import { beside, half, probable, seenTerm, summary } from "./seen-term.ts";
import type { Term } from "./term.ts";

/** How common what stands first in a list is beside what stands behind it: the table lists the usual before the possible (house value). */
const weightAt = (place: number) => 1 / (1 + place / 2);
/** Share of words that another observer would not have chosen; of colours, one beside it on the circle, and any other (house values). */
const misnamed = { colourNear: 0.12, colourFar: 0.03, transparency: 0.08, lustre: 0.3 } as const;

/** Families that one observer calls so and another so; a dark stone of most hues is black to somebody, a pale one colourless. */
const neighbours: Readonly<Record<ColourFamily, readonly ColourFamily[]>> = {
  colourless: ["white", "grey", "yellow"],
  white: ["colourless", "grey", "yellow"],
  grey: ["white", "black", "blue", "brown"],
  black: ["grey", "brown", "blue", "green"],
  brown: ["orange", "yellow", "red", "green", "black"],
  yellow: ["orange", "green", "brown", "colourless"],
  orange: ["red", "yellow", "brown", "pink"],
  red: ["pink", "orange", "purple", "brown"],
  pink: ["red", "purple", "orange"],
  purple: ["violet", "pink", "red"],
  violet: ["purple", "blue"],
  blue: ["violet", "green", "grey"],
  green: ["blue", "yellow", "brown"],
  multicoloured: [],
};

const shares = new WeakMap<SpeciesForm, readonly number[]>();

/** How likely each family of colours is named of a form; they sum to 1. */
function colourShares(form: SpeciesForm): readonly number[] {
  let known = shares.get(form);
  if (!known) shares.set(form, (known = namedShares(shownShares(form))));
  return known;
}

/** How likely each family is shown: the listed ones, the usual before the possible; all alike where none is listed. */
function shownShares({ colours }: SpeciesForm): number[] {
  const weights = colourFamilies.map(() => 0);
  colours.forEach((words, place) => {
    const mask = colourMask(words);
    const count = sharedColours(mask, mask);
    for (let family = 0; family < weights.length; family++) if (mask & (1 << family)) weights[family]! += weightAt(place) / count;
  });
  const sum = weights.reduce((total, weight) => total + weight, 0);
  return weights.map((weight) => (sum > 0 ? weight / sum : 1 / weights.length));
}

function namedShares(shown: readonly number[]): number[] {
  const named = shown.map((share) => (1 - misnamed.colourNear - misnamed.colourFar) * share + misnamed.colourFar / shown.length);
  colourFamilies.forEach((family, at) => {
    const near = neighbours[family];
    if (near.length === 0) named[at]! += misnamed.colourNear * shown[at]!;
    for (const other of near) named[colourFamilies.indexOf(other)]! += (misnamed.colourNear * shown[at]!) / near.length;
  });
  return named;
}

/**
 * Colour by its families: a form that shows many colours makes each of them less likely, so that one colour speaks for a
 * form that has no other. Null where the words name no colour.
 */
export function colourTerm(words: readonly string[]): Term | null {
  const observed = words.join(", ");
  const mask = words.reduce((all, word) => all | colourMask(inBritish(word)), 0);
  if (mask === 0) return null;
  const families = colourFamilies.flatMap((_, at) => (mask & (1 << at) ? [at] : []));
  return {
    ...seenTerm("colour", observed, 1 / colourFamilies.length, half),
    score: (form) => {
      const known = colourShares(form);
      return beside(families.reduce((sum, family) => sum + known[family]!, 0) / families.length, Math.max(...known), half);
    },
    reference: (forms) => summary(forms.flatMap(({ colours }) => colours)),
  };
}

export const inBritish = (text: string) => text.toLowerCase().replaceAll("color", "colour").replaceAll("gray", "grey");

const transparencies = ["transparent", "translucent", "opaque"] as const;

export function transparencyTerm(words: string): Term | null {
  const text = words.toLowerCase();
  const observed = /opaque/.test(text) ? "opaque" : /translucent|semi/.test(text) ? "translucent" : /transparent|clear/.test(text) ? "transparent" : null;
  return observed && listedTerm("transparency", words, ({ transparency }) => transparency, (known) => known === observed, { among: transparencies.length, miss: misnamed.transparency });
}

export function lustreTerm(words: string): Term | null {
  const text = words.toLowerCase();
  const observed = ["subadamantine", "adamantine", "vitreous", "resinous", "waxy", "greasy", "pearly", "silky", "metallic", "dull"].find((each) => text.replace("sub-", "sub").includes(each));
  return observed ? listedTerm("lustre", words, ({ lustre }) => lustre, (known) => known.startsWith(observed), { among: 10, miss: misnamed.lustre }) : null;
}

/** One of a list that a form shows, the usual ones first. */
function listedTerm(property: string, observed: string, listOf: (form: SpeciesForm) => readonly string[], isIt: (known: string) => boolean, { among, miss }: { among: number; miss: number }): Term {
  return {
    ...seenTerm(property, observed, 1 / among),
    score: (form) => {
      const list = listOf(form);
      if (list.length === 0) return probable(1 / among, 1, 1);
      let [hit, sum] = [0, 0];
      for (let place = 0; place < list.length; place++) {
        sum += weightAt(place);
        if (isIt(list[place]!)) hit += weightAt(place);
      }
      return beside(((1 - miss) * hit) / sum + miss / among, (1 - miss) / sum + miss / among);
    },
    reference: (forms) => summary(forms.flatMap(listOf)),
  };
}

const phenomenonWords: Readonly<Record<string, RegExp>> = {
  "play of colour": /play[- ]of[- ]colou?r/,
  chatoyancy: /chatoyan|cat[’']?s?[- ]?eye/,
  asterism: /asteris|\bstar\b/,
  "colour change": /colou?r[- ]chang|change of colou?r/,
  adularescence: /adularescen/,
  labradorescence: /labradorescen/,
  aventurescence: /aventurescen/,
  schiller: /schiller|sheen/,
  iridescence: /iridescen|\biris\b/,
  orient: /\borient\b/,
  tenebrescence: /tenebrescen/,
};
/** Of a stone that a form is seen in: listed, met in some, rare, and never heard of (formulas §10.6, halved, since most stones show none). */
const phenomenonShares = { listed: 0.4, some: 0.1, rare: 0.02, none: 0.006 } as const;

export function phenomenaTerms(observed: readonly string[]): Term[] {
  return observed.flatMap((words): Term[] => {
    const phenomenon = Object.keys(phenomenonWords).find((each) => phenomenonWords[each]!.test(inBritish(words)));
    if (!phenomenon) return [];
    const pattern = phenomenonWords[phenomenon]!;
    return [
      {
        ...seenTerm("phenomena", words, 0.03),
        score: ({ phenomena }) => {
          const listed = phenomena.find((each) => pattern.test(each));
          return probable(!listed ? phenomenonShares.none : /rare/.test(listed) ? phenomenonShares.rare : /some|slight|rich/.test(listed) ? phenomenonShares.some : phenomenonShares.listed, 1, listed ? 1 : phenomenonShares.none);
        },
        reference: (forms) => summary(forms.flatMap(({ phenomena }) => phenomena)),
      },
    ];
  });
}
