import { defaultU, softness, span } from "./defaults.ts";
import { outOfRange, written } from "./index-terms.ts";
import { numericScore } from "./numeric-score.ts";
import type { Evidence, OpticCharacter } from "./evidence.ts";
import type { TabulatedCharacter } from "../species/species-row.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import type { Score, Term } from "./term.ts";

/**
 * P(observed | true) between crossed polars, for a trained eye; rows sum to 1 (house values, common practice). A uniaxial
 * or biaxial figure is seldom mistaken for another; looking down an axis makes a doubly refractive stone stay dark.
 */
const confusion: Readonly<Record<"single" | "uniaxial" | "biaxial" | "aggregate", Readonly<Record<OpticCharacter, number>>>> = {
  single: { isotropic: 0.8, anomalous: 0.155, uniaxial: 0.0005, biaxial: 0.0005, anisotropic: 0.02, aggregate: 0.024 },
  uniaxial: { isotropic: 0.02, anomalous: 0.025, uniaxial: 0.45, biaxial: 0.015, anisotropic: 0.45, aggregate: 0.04 },
  biaxial: { isotropic: 0.015, anomalous: 0.025, uniaxial: 0.015, biaxial: 0.45, anisotropic: 0.455, aggregate: 0.04 },
  aggregate: { isotropic: 0.03, anomalous: 0.05, uniaxial: 0.01, biaxial: 0.01, anisotropic: 0.1, aggregate: 0.8 },
};
const rowOf: Readonly<Record<TabulatedCharacter, keyof typeof confusion>> = { isotropic: "single", amorphous: "single", uniaxial: "uniaxial", biaxial: "biaxial", aggregate: "aggregate" };
const characterNames: Readonly<Record<OpticCharacter, string>> = {
  isotropic: "singly refractive",
  anomalous: "singly refractive, anomalous",
  uniaxial: "uniaxial",
  biaxial: "biaxial",
  anisotropic: "doubly refractive",
  aggregate: "aggregate",
};
const tabulatedNames: Readonly<Record<TabulatedCharacter, string>> = { isotropic: "singly refractive", amorphous: "singly refractive", uniaxial: "uniaxial", biaxial: "biaxial", aggregate: "aggregate" };
/** Colour, pleochroism and fluorescence are subjective and hang together: they count with half their weight. */
const half = 0.5;

export function sgTerm({ value, u = defaultU.sg }: { value: number; u?: number }): Term {
  return {
    property: "sg",
    observed: value.toFixed(u < 0.01 ? 3 : 2),
    isIndex: false,
    measure: { noun: "density", decimals: 2 },
    unlistedLogLikelihood: Math.log(1 / span.sg),
    score: (form) => (form.sg ? numericScore({ value, u, range: form.sg, usual: form.usual.sg, softness: softness.sg, span: span.sg }) : { logLikelihood: Math.log(1 / span.sg), tail: 1, distance: 0 }),
    reference: (forms) => written(forms.flatMap(({ sg }) => (sg ? [sg] : [])), 2) || "not known",
    contradiction: (_form, { distance }) => outOfRange("density", distance),
  };
}

export function opticCharacterTerm(observed: OpticCharacter): Term {
  return {
    ...seenTerm("opticCharacter", characterNames[observed], 0.4),
    score: (form) => probable(mean(form.character.map((character) => confusion[rowOf[character]][observed]))),
    reference: (forms) => [...new Set(forms.flatMap(({ character }) => character.map((each) => tabulatedNames[each])))].join(" or "),
    contradiction: (form) => `${[...new Set(form.character.map((each) => tabulatedNames[each]))].join(" or ")}, the stone is ${characterNames[observed]}`,
  };
}

export function opticSignTerm(observed: "+" | "-"): Term {
  const words = { "+": "positive", "-": "negative" } as const;
  return {
    ...seenTerm("opticSign", words[observed], 0.5),
    score: (form) => probable(form.sign === "±" ? 0.5 : form.sign === null ? 0.05 : form.sign === observed ? 0.95 : 0.05),
    reference: (forms) => [...new Set(forms.map(({ sign }) => (sign === null ? "none" : sign === "±" ? "either" : words[sign])))].join(" or "),
    contradiction: (form) => (form.sign === null ? "it has no optic sign" : `its sign is ${form.sign === "±" ? "either" : words[form.sign]}`),
  };
}

/** Everything that is looked at rather than read from a scale. */
export function lookedAtTerms(evidence: Evidence): Term[] {
  const terms: Term[] = [];
  const inList = (property: string, observed: readonly string[], listOf: (form: SpeciesForm) => readonly string[], { hit, miss, exponent = 1 }: { hit: number; miss: number; exponent?: number }) => {
    if (observed.length === 0) return;
    const words = observed.map((word) => word.toLowerCase());
    terms.push({
      ...seenTerm(property, observed.join(", "), Math.sqrt(hit * miss)),
      score: (form) => probable(words.some((word) => listOf(form).some((known) => sameWord(word, known))) ? hit : miss, exponent),
      reference: (forms) => summary(forms.flatMap((form) => listOf(form))),
    });
  };
  inList("colour", evidence.colour ?? [], ({ colours }) => colours, { hit: 0.85, miss: 0.15, exponent: half });
  inList("transparency", evidence.transparency ? [evidence.transparency] : [], ({ transparency }) => transparency, { hit: 0.9, miss: 0.05 });
  inList("lustre", evidence.lustre ? [evidence.lustre] : [], ({ lustre }) => lustre, { hit: 0.8, miss: 0.2 });
  inList("phenomena", (evidence.phenomena ?? []).filter((each) => each !== "none"), ({ phenomena }) => phenomena, { hit: 0.8, miss: 0.03 });
  if (evidence.pleochroism) {
    const observed = { none: 0, weak: 1, moderate: 2, strong: 3 }[evidence.pleochroism.strength];
    terms.push({
      ...seenTerm("pleochroism", evidence.pleochroism.strength, 0.25),
      // Seen, it proves double refraction; unseen, it proves nothing.
      score: (form) => probable(isSingle(form) ? (observed === 0 ? 0.97 : 0.01) : observed === 0 ? 0.4 : [0.25, 0.3, 0.25, 0.12][Math.abs(observed - form.pleochroism)] ?? 0.08, half),
      reference: (forms) => ["none", "weak", "distinct", "strong"][Math.max(...forms.map(({ pleochroism }) => pleochroism))]!,
    });
  }
  for (const [property, observed, of] of [
    ["fluorescenceLongWave", evidence.fluorescence?.longWave, (form: SpeciesForm) => form.longWave],
    ["fluorescenceShortWave", evidence.fluorescence?.shortWave, (form: SpeciesForm) => form.shortWave],
  ] as const) {
    if (!observed) continue;
    const strength = { inert: 0, weak: 1, moderate: 2, strong: 3 }[observed.strength];
    terms.push({
      ...seenTerm(property, [observed.strength, observed.colour].filter(Boolean).join(" "), 0.25),
      score: (form) => (of(form).length === 0 ? probable(0.25, half) : probable([0.6, 0.3, 0.1, 0.04][Math.min(...of(form).map((known) => Math.abs(known - strength)))]!, half)),
      reference: (forms) => summary(forms.flatMap((form) => of(form).map((each) => ["inert", "weak", "moderate", "strong"][each]!))),
    });
  }
  const lines = evidence.absorption ?? [];
  if (lines.length > 0) {
    terms.push({
      ...seenTerm("absorption", lines.map(({ nm, kind }) => (kind === "line" ? `${nm}` : `${nm} band`)).join(", "), 0.1 ** Math.min(lines.length, 4)),
      score: (form) => {
        // A line that the species is known for, or a stray one; at most four count, since lines of one cause come together.
        const logs = lines.map(({ nm, kind }) => Math.log(Math.max(0.03, ...form.absorption.map(([known, halfWidth, strength]) => (Math.abs(known - nm) <= halfWidth + (kind === "band" ? 15 : 5) ? 0.28 * strength : 0)))));
        const sum = (logs.reduce((total, log) => total + log, 0) / lines.length) * Math.min(lines.length, 4);
        return { logLikelihood: half * sum, tail: 1, distance: 0 };
      },
      reference: (forms) => summary(forms.flatMap(({ absorption }) => absorption.filter(([, , strength]) => strength >= 2).map(([nm]) => `${nm} nm`))),
    });
  }
  if (evidence.colourFilter) {
    const isRed = /red|pink/.test(evidence.colourFilter.toLowerCase());
    terms.push({ ...seenTerm("colourFilter", evidence.colourFilter, 0.4), score: ({ filterRed }) => probable(filterRed === null ? 0.4 : filterRed === isRed ? 0.7 : isRed ? 0.1 : 0.4, half), reference: (forms) => (forms.some(({ filterRed }) => filterRed) ? "red possible" : "no red") });
  }
  if (evidence.thermal) {
    const isDiamondLike = evidence.thermal === "diamond-like";
    terms.push({ ...seenTerm("thermal", evidence.thermal, 0.3), score: ({ thermal }) => probable((thermal === "diamond-like") === isDiamondLike ? 0.95 : 0.02), reference: (forms) => summary(forms.flatMap(({ thermal }) => thermal ?? [])) });
  }
  return terms;
}

function seenTerm(property: string, observed: string, unlisted: number): Omit<Term, "score" | "reference"> {
  return { property, observed, isIndex: false, measure: null, unlistedLogLikelihood: Math.log(unlisted), contradiction: () => `${observed} is not known of it` };
}

function probable(probability: number, exponent = 1): Score {
  return { logLikelihood: exponent * Math.log(probability), tail: probability, distance: 0 };
}

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
const isSingle = (form: SpeciesForm) => form.character.every((character) => rowOf[character] === "single");
const summary = (words: readonly string[]) => [...new Set(words)].slice(0, 8).join(", ") || "not known";

/** "purplish red" is a red; "red" is not "reddish brown". */
function sameWord(observed: string, known: string): boolean {
  return observed === known || known.split(/[\s-]+/).at(-1) === observed.split(/[\s-]+/).at(-1);
}
