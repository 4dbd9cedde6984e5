/** Questions that a bench cannot answer, by species; they belong on a report as not determinable, and to a laboratory where they matter. */
const beyondTheBench: Readonly<Record<string, readonly string[]>> = {
  corundum: ["heating at low temperature", "diffusion of beryllium", "geographic origin"],
  beryl: ["heating", "oil or resin in the fissures, and which", "geographic origin"],
  diamond: ["natural or grown, where the colour is near colourless", "high pressure and high temperature", "irradiation"],
  topaz: ["irradiation"],
  tourmaline: ["irradiation and heating", "copper as the cause of colour", "geographic origin"],
  quartz: ["heating and irradiation", "natural or grown, without inclusions"],
  zoisite: ["heating"],
  spodumene: ["irradiation"],
  jadeite: ["impregnation with polymer"],
  turquoise: ["impregnation"],
  opal: ["impregnation"],
  amber: ["clarifying and heating"],
  pearl: ["natural or cultured"],
  spinel: ["heating"],
  chrysoberyl: ["geographic origin"],
  zircon: ["heating"],
};

const referred: ReadonlyArray<{ when: RegExp; speciesIds: readonly string[]; because: string }> = [
  { speciesIds: ["corundum"], when: /ruby|sapphire|padparadscha/i, because: "a ruby or sapphire: heating and origin decide much of its value, and the bench decides neither" },
  { speciesIds: ["beryl"], when: /emerald/i, because: "an emerald: which filler, and how much, is a laboratory's question" },
  { speciesIds: ["chrysoberyl"], when: /alexandrite/i, because: "an alexandrite: natural against grown needs advanced methods" },
  { speciesIds: ["spinel"], when: /red|cobalt|blue/i, because: "a red or cobalt-blue spinel: heating and origin matter and cannot be decided here" },
  { speciesIds: ["tourmaline"], when: /copper|neon|paraiba/i, because: "a tourmaline that may owe its colour to copper: only chemistry tells" },
  { speciesIds: ["jadeite"], when: /./, because: "jadeite: impregnation is seen by infrared only" },
  { speciesIds: ["diamond"], when: /./, because: "a diamond: grown and treated ones are told by spectroscopy only" },
  { speciesIds: ["pearl"], when: /natural/i, because: "a pearl said to be natural: that needs X-rays" },
];

/** What the bench cannot decide for a species; empty where nothing is listed. Source: common practice. */
export function beyondBench(speciesId: string | null): readonly string[] {
  return (speciesId && (beyondTheBench[speciesId] ?? beyondTheBench[speciesId.split("-")[0]!])) || [];
}

/**
 * Why a stone should go to an outside laboratory, where the client agrees to it; empty where no rule asks for it.
 *
 * @param variety as it was named, "" for none; null while nobody has named it: then it may be any of its species
 *
 * Source: the project's workflow, §1.7, referral triggers.
 */
export function referralReasons({ speciesId, variety, hasConflict }: { speciesId: string | null; variety: string | null; hasConflict: boolean }): string[] {
  const bySpecies = referred.filter(({ speciesIds, when }) => speciesId !== null && speciesIds.includes(speciesId) && (variety === null || when.test(variety || " "))).map(({ because }) => because);
  return [...bySpecies, ...(hasConflict ? ["the findings contradict each other"] : [])];
}
