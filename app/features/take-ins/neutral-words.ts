/**
 * Words that say what a thing is, where the desk may only say what it looks like (workflow 1.2: a receipt holds no
 * species, no fineness, no origin and no value). Names are singular and without accents.
 */
const materials = [
  // Species, varieties and groups.
  "actinolite", "agate", "alexandrite", "almandine", "amber", "amblygonite", "amethyst", "ametrine", "ammolite", "andalusite", "andesine",
  "andradite", "apatite", "aquamarine", "aventurine", "azurite", "benitoite", "beryl", "bloodstone", "brazilianite", "bronzite", "calcite",
  "carnelian", "chalcedony", "charoite", "chrysoberyl", "chrysocolla", "chrysoprase", "citrine", "copal", "coral", "cordierite", "corundum",
  "danburite", "demantoid", "diamond", "diopside", "dioptase", "emerald", "enstatite", "epidote", "euclase", "feldspar", "fluorite", "fluorspar",
  "garnet", "goshenite", "grossular", "hauyne", "heliodor", "hematite", "haematite", "hessonite", "hiddenite", "howlite", "idocrase", "iolite",
  "ivory", "jade", "jadeite", "jasper", "jet", "kornerupine", "kunzite", "kyanite", "labradorite", "larimar", "lazulite", "malachite", "marcasite",
  "moissanite", "moldavite", "moonstone", "morganite", "nephrite", "obsidian", "onyx", "opal", "orthoclase", "padparadscha", "pearl", "peridot",
  "petalite", "phenakite", "prehnite", "pyrite", "pyrope", "quartz", "rhodochrosite", "rhodolite", "rhodonite", "rubellite", "ruby", "rutile",
  "sapphire", "sard", "sardonyx", "scapolite", "scheelite", "serpentine", "sinhalite", "sodalite", "spessartine", "spessartite", "sphalerite",
  "sphene", "spinel", "spodumene", "sugilite", "sunstone", "taaffeite", "tanzanite", "titanite", "topaz", "tortoiseshell", "tourmaline",
  "tremolite", "tsavorite", "turquoise", "uvarovite", "variscite", "vesuvianite", "zircon", "zoisite", "tiger's eye", "cat's eye", "lapis",
  "lapis lazuli", "cubic zirconia", "zirconia", "mother of pearl", "rock crystal",
  // What a thing is made of or how it came to be.
  "glass", "paste", "plastic", "resin", "doublet", "triplet", "synthetic", "natural", "genuine", "real", "fake", "imitation", "simulant",
  "artificial", "cultured", "lab grown", "laboratory grown", "treated", "untreated", "heated", "unheated",
  // Metals.
  "gold", "silver", "platinum", "palladium", "rhodium", "titanium", "steel", "brass", "bronze", "copper", "pewter", "vermeil", "electrum",
  // Origin.
  "burma", "burmese", "ceylon", "colombian", "kashmir", "mogok", "paraiba", "zambian",
] as const;

const worth = ["valuable", "precious", "semi precious", "semiprecious", "expensive", "cheap", "worthless", "priceless", "worth", "value", "flawless", "investment"] as const;

/** Names that are borrowed for a shape or a colour, and what to write instead (wording §3 and §5). */
const insteadOf: ReadonlyArray<readonly [RegExp, string]> = [
  [/\bemerald[\s-]?(cut|shape|shaped)\b/, "octagon"],
  [/\bdiamond[\s-]?(shape|shaped)\b/, "kite"],
  [/\bpearl[\s-]?(shape|shaped)\b/, "bead"],
  [/\b(silver|platinum|steel)\b/, "white metal"],
  [/\bgold\b/, "yellow metal"],
  [/\bruby\b/, "red"],
  [/\bsapphire\b/, "blue"],
  [/\bemerald\b/, "green"],
  [/\bturquoise\b/, "greenish blue"],
  [/\bamber\b/, "brownish orange"],
  [/\bcoral\b/, "pinkish orange"],
  [/\bjade\b/, "green"],
  [/\bivory\b/, "yellowish white"],
  [/\bjet\b/, "black"],
];

// 585 or 750 stamped, "18k", "22 kt", "9ct gold": a fineness. A count of beads or a size is none.
const fineness = /\b(?:333|375|417|500|585|750|800|835|875|900|916|917|925|950|958|990|999)\b(?!\s*(?:x|×|mm|cm|g|ct|bead|beads|stone|stones|piece|pieces)\b)|(?<![.,\d])\b(?:8|9|10|14|15|18|20|21|22|24)\s?(?:k|kt|karat)\b|(?<![.,\d])\b(?:9|14|15|18|22)\s?ct\b/g;
const amount = /[€$£¥]\s?\d[\d.,\s]*|\b\d[\d.,]*\s?(?:eur|usd|gbp|chf|euros?|dollars?|pounds?)\b/g;

const phrases: ReadonlySet<string> = new Set([...materials, ...worth].map(fold));
const longestPhrase = 3;

/** The words of a description that are conclusions, as they were typed, each once. Whole words only: "golden" is a colour. */
export function findConclusionWords(text: string): string[] {
  const found: string[] = [];
  const words = [...text.matchAll(/[\p{L}\p{M}]+(?:['’][\p{L}\p{M}]+)*/gu)];
  for (let at = 0; at < words.length; at++) {
    for (let length = longestPhrase; length >= 1; length--) {
      const slice = words.slice(at, at + length);
      if (slice.length < length) continue;
      if (!singularForms(slice.map((match) => fold(match[0])).join(" ")).some((form) => phrases.has(form))) continue;
      const last = slice[length - 1]!;
      found.push(text.slice(words[at]!.index, last.index + last[0].length));
      at += length - 1;
      break;
    }
  }
  const folded = fold(text);
  for (const pattern of [fineness, amount]) for (const match of folded.matchAll(pattern)) found.push(match[0].trim());
  return [...new Map(found.map((word) => [fold(word), word])).values()];
}

/** What to tell the desk, or undefined when the words are neutral. */
export function neutralWordsMessage(text: string): string | undefined {
  const words = findConclusionWords(text);
  if (words.length === 0) return undefined;
  const quoted = words.slice(0, 4).map((word) => `“${word}”`);
  const list = quoted.length === 1 ? quoted[0]! : `${quoted.slice(0, -1).join(", ")} and ${quoted.at(-1)}`;
  const verdict = words.length === 1 ? "is a conclusion" : "are conclusions";
  const folded = fold(text);
  const shape = insteadOf.slice(0, 3).find(([pattern]) => pattern.test(folded));
  const example = shape ? `For the shape write “${shape[1]}”.` : `For example: ${exampleFor(folded)}.`;
  return `Describe what is seen: ${list} ${verdict}. ${example}`;
}

function exampleFor(folded: string): string {
  const metal = /\b(silver|platinum|palladium|steel)\b/.test(folded) ? "white metal" : "yellow metal";
  const colour = insteadOf.slice(5).find(([pattern]) => pattern.test(folded))?.[1] ?? "red";
  return `${colour} oval in a ${metal} ring`;
}

function singularForms(phrase: string): string[] {
  const forms = [phrase];
  if (phrase.endsWith("ies")) forms.push(`${phrase.slice(0, -3)}y`);
  if (phrase.endsWith("es")) forms.push(phrase.slice(0, -2));
  if (phrase.endsWith("s")) forms.push(phrase.slice(0, -1));
  return forms;
}

function fold(text: string): string {
  return text.normalize("NFKD").replace(/\p{M}/gu, "").replaceAll("’", "'").replaceAll("'", "'").toLowerCase();
}
