/** What a feature seen under magnification or lamp says, of the species that it can be seen in. */
export type Meaning = Readonly<{
  /** Species' ids; "any" where the feature means the same in all. */
  species: readonly string[] | "any";
  question: "nature" | "treatment";
  answer: string;
  /** A process that it shows, where it shows one: "flame fusion". */
  process: string | null;
  /** Proof at the bench, or only an indication that others must bear out. */
  strength: "positive" | "indication";
}>;
export type Feature = Readonly<{
  name: string;
  /** How observers write it; matched without regard to case. */
  words: RegExp;
  /** Words of the same phrase that give it another sense. */
  unlessWith?: RegExp;
  meanings: readonly Meaning[];
  /** What it does not say, where it is often taken to. */
  saysNothingOf?: string;
}>;

const corundum = ["corundum"];
const natural = (strength: Meaning["strength"], species: readonly string[] | "any" = "any"): Meaning => ({ species, question: "nature", answer: "natural", process: null, strength });
const synthetic = (process: string, strength: Meaning["strength"], species: readonly string[] | "any" = "any"): Meaning => ({ species, question: "nature", answer: "synthetic", process, strength });
const treated = (answer: string, strength: Meaning["strength"], species: readonly string[] | "any" = "any"): Meaning => ({ species, question: "treatment", answer, process: null, strength });

/**
 * Features of growth, inclusions and treatment, and what each is evidence of. No constant is among them: index, density
 * and optics are the same for natural, synthetic and treated forms of one species.
 *
 * Source: common practice, as the trade teaches it.
 */
export const features: readonly Feature[] = [
  { name: "curved striae", words: /\bcurved (growth )?(striae|lines|bands)\b|\bcurved colou?r bands?\b/i, meanings: [synthetic("flame fusion or pulling", "positive", [...corundum, "spinel"])] },
  { name: "gas bubbles", words: /\b(gas )?bubbles?\b/i, unlessWith: /\b(two|three|2|3|multi)[- ]?phase\b|\b(fluid|liquid|negative crystals?|fissures?|fractures?|cracks?|cavit(y|ies)|fill(ed|ing|ings|er)|glue|cement|join|seam)\b/i, meanings: [synthetic("melting", "indication", [...corundum, "spinel", "chrysoberyl"]), { species: ["glass", "plastic"], question: "nature", answer: "artificial", process: "melting", strength: "positive" }] },
  { name: "chevron growth", words: /\bchevrons?\b|\bzig-?zag growth\b/i, meanings: [synthetic("hydrothermal growth", "positive", ["beryl", "quartz", ...corundum])] },
  { name: "seed plate", words: /\bseed(s|[- ]plates?|[- ]crystals?)?\b(?![- ]*pearl)/i, meanings: [synthetic("hydrothermal or flux growth on a seed", "positive")] },
  { name: "nail-head spicules", words: /\bnail-?head/i, meanings: [synthetic("hydrothermal growth", "indication", ["beryl", "quartz"])] },
  { name: "flux residues", words: /\bflux\b|\bwispy veils?\b/i, meanings: [synthetic("flux growth", "indication", [...corundum, "beryl", "spinel", "chrysoberyl"]), treated("fissures healed with flux", "indication", corundum)] },
  { name: "metal platelets", words: /\bplatin(um|a)\b|\bmetallic (platelets|crystals)\b/i, meanings: [synthetic("growth in a metal crucible", "positive")] },
  { name: "silk, intact", words: /\b(intact|sharp|fine|rutile) silk\b|\bshort needles\b|\bsilk in three directions\b/i, meanings: [natural("indication", corundum)], saysNothingOf: "heating at low temperature, which leaves silk as it is" },
  { name: "silk, dissolved", words: /\b(dissolved|broken|dotted|partly dissolved|altered) (silk|needles)\b|\bsilk (is )?(partly )?dissolved\b/i, meanings: [treated("heating at high temperature", "indication", corundum)] },
  { name: "discs about crystals", words: /\b(halo|halos|haloes|discoid|stress (disc|fracture)s?)\b/i, meanings: [treated("heating at high temperature", "indication", corundum)], saysNothingOf: "nature: halos form in nature too" },
  { name: "flash effect", words: /\bflash[- ]effects?\b|\bflash(es)?\b[^.;,]{0,40}\b(fissures?|fractures?|cracks?|feathers?)\b|\b(fissures?|fractures?|cracks?|feathers?)\b[^.;,]{0,40}\bflash(es)?\b/i, meanings: [treated("fissures filled with glass or resin", "positive")] },
  { name: "bubbles in a filling", words: /\bbubbles?\b[^.;,]{0,40}\b(fissures?|fractures?|cracks?|cavit(y|ies)|fillings?|filler)\b|\b(fissures?|fractures?|cracks?|cavit(y|ies)|fillings?|filler)\b[^.;,]{0,40}\bbubbles?\b/i, meanings: [treated("fissures filled with glass or resin", "indication")] },
  { name: "flow structure", words: /\bflow (lines|structure)\b|\bswirls?\b/i, meanings: [treated("filling with glass", "indication", corundum), { species: ["glass"], question: "nature", answer: "artificial", process: "melting", strength: "positive" }] },
  { name: "dye in fissures", words: /\bdye\b|\bcolou?r (concentrated|collects?) in (the )?(fissures|fractures|cracks)\b/i, meanings: [treated("dyeing", "positive")] },
  { name: "colour at facet edges", words: /\bcolou?r (outlines?|concentrated|along|at) .{0,20}facet (edges|junctions)\b|\bspider-?web colou?r\b/i, meanings: [treated("surface diffusion", "positive")] },
  { name: "worn coating", words: /\bcoating\b|\biridescent (film|surface)\b/i, meanings: [treated("coating", "positive")] },
  { name: "join of an assembled stone", words: /((^|[,;:.]\s*)|\b(a|the|its|one|glued?|cemented|visible|straight|flat|fine)\s+)(join|seam)\b(?! of (?!glue|cement))|\b(join|seam) (line|plane)\b|\b(assembly plane|glue (layer|plane)|red ring)\b/i, meanings: [{ species: "any", question: "nature", answer: "composite", process: "assembling", strength: "positive" }] },
  { name: "three-phase inclusions", words: /\bthree-?phase\b/i, meanings: [natural("indication", ["beryl", "corundum"])] },
  { name: "horsetail fibres", words: /\bhorse-?tails?\b/i, meanings: [natural("indication", ["garnet-andradite"])] },
  { name: "crystals of another mineral", words: /\b(included|mineral) crystals?\b|\b(zircon|apatite|calcite|spinel|mica|amphibole) (crystal|inclusion)s?\b/i, meanings: [natural("indication")] },
  { name: "straight zoning", words: /\b(straight|angular) (growth|colou?r )?(zoning|bands?|lines)\b/i, meanings: [], saysNothingOf: "nature: natural, flux and hydrothermal crystals all grow straight faces" },
  { name: "no inclusions", words: /\b(no inclusions|inclusion-?free|nothing seen|clean under)\b/i, meanings: [], saysNothingOf: "nature or treatment: a stone without inclusions may be either" },
];
