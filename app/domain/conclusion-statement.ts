import { natureNames, treatmentNames, type Confidence, type Nature, type TreatmentCode, type TreatmentFinding } from "./conclusion.ts";

type Concluded = Readonly<{ speciesName: string; variety: string; nature: Nature; confidence: Confidence; treatments: readonly TreatmentFinding[] }>;

/** Treatments that change what a stone may be called: said in the title itself, with equal prominence (16 CFR 23.24 and 23.25). */
const inTitle: Partial<Record<TreatmentCode, string>> = {
  latticeDiffusion: "colour by diffusion",
  surfaceDiffusion: "colour by surface diffusion",
  glassFilling: "filled with glass",
  dyeing: "dyed",
  impregnation: "impregnated",
  coating: "coated",
};

/**
 * The conclusion in a title and sentences. An unqualified name is left to natural stones; "synthetic" and its like stand
 * before the name in the same type (16 CFR 23.25, ISO 18323).
 */
export function conclusionStatement({ speciesName, variety, nature, confidence, treatments }: Concluded): { title: string; statements: string[] } {
  const name = variety || speciesName;
  const statements: string[] = [];
  const title = confidence === "notDetermined" ? "Identity not determined" : [qualified(name, nature, confidence), ...disclosed(treatments)].join(", ");
  if (confidence !== "notDetermined") {
    const found = treatments.filter(({ status }) => status === "detected" || status === "indications").map(({ code, status }) => (status === "detected" ? lower(treatmentNames[code]) : `indications of ${lower(treatmentNames[code])}`));
    const identity = nature === "undetermined" ? `${sentence(speciesName)}; whether it is natural or synthetic was not determined` : `${natureNames[nature]} ${lower(speciesName)}`;
    statements.push(`${identity}${found.length > 0 ? `, with ${found.join(" and ")}` : ""}.`);
  }
  statements.push(confidenceSentences[confidence]);
  return { title, statements };
}

const confidenceSentences: Readonly<Record<Confidence, string>> = {
  identified: "Identified by the tests listed.",
  consistentWith: "The tests are consistent with this and do not exclude everything else.",
  groupOnly: "The tests determine the group only.",
  notDetermined: "The tests listed do not determine what the stone is.",
};

function qualified(name: string, nature: Nature, confidence: Confidence): string {
  const base = confidence === "groupOnly" ? `${name} group` : name;
  const named = {
    natural: sentence(base),
    synthetic: `Synthetic ${lower(base)}`,
    artificial: `${sentence(base)}, artificial product`,
    composite: `Composite: ${lower(base)}`,
    reconstituted: `Reconstituted ${lower(base)}`,
    imitation: `Imitation: ${lower(base)}`,
    organic: sentence(base),
    cultured: `Cultured ${lower(base)}`,
    undetermined: `${sentence(base)}, nature not determined`,
  }[nature];
  return confidence === "consistentWith" ? `Consistent with ${lower(named)}` : named;
}

function disclosed(treatments: readonly TreatmentFinding[]): string[] {
  return treatments.flatMap(({ code, status }) => (status === "detected" && inTitle[code] ? [inTitle[code]] : []));
}

const sentence = (text: string) => (text === "" ? "" : text[0]!.toUpperCase() + text.slice(1));
/** Lower case at the start, unless the first word is an abbreviation. */
const lower = (text: string) => (/^[A-Z]{2}/.test(text) || text === "" ? text : text[0]!.toLowerCase() + text.slice(1));
