/** Families a colour is looked for by; a trade's table says "purplish red", "lavender", "honey". */
export const colourFamilies = ["colourless", "white", "grey", "black", "brown", "yellow", "orange", "red", "pink", "purple", "violet", "blue", "green", "multicoloured"] as const;
export type ColourFamily = (typeof colourFamilies)[number];

/** Words of the table that stand for a family; common practice. */
const words: Readonly<Record<ColourFamily, RegExp>> = {
  colourless: /\b(near-)?colourless\b/,
  white: /\b(white|cream|ivory)\b/,
  grey: /\b(grey|silver|steel)\b/,
  black: /\bblack\b/,
  brown: /\b(brown|bronze|cinnamon|sherry|mahogany|tortoiseshell|smoky)\b/,
  yellow: /\b(yellow|yellowish$|golden|gold|honey|brassy|blond)\b/,
  orange: /\b(orange|peach)\b/,
  red: /\b(red|reddish$)\b/,
  pink: /\b(pink|rose)\b/,
  purple: /\b(purple|mauve)\b/,
  violet: /\b(violet|lavender|lilac|mauve)\b/,
  blue: /\b(blue|aquamarine)\b/,
  green: /\b(green|greenish$)\b/,
  multicoloured: /\b(multicoloured|bicoloured|mottled|banded|banding|rainbow|play of colour|colour change|colour flakes|marbled)\b/,
};

/** @returns the families that the colours of one form fall under, in the families' order; all of them for "any" */
export function colourFamiliesOf(colours: readonly string[]): ColourFamily[] {
  const texts = colours.map((colour) => colour.toLowerCase());
  if (texts.some((text) => /\bany\b/.test(text))) return [...colourFamilies];
  return colourFamilies.filter((family) => texts.some((text) => words[family].test(text)));
}
