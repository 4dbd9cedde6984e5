import { inclusionAmountNames, inclusionDepthNames, plotSideNames } from "#app/domain/inclusion.ts";
import { clockWords, pictureWords } from "#app/domain/place-words.ts";
import { typedDecimal } from "#app/domain/typed-decimal.ts";
import type { PlottedInclusion } from "#app/features/inclusions/get-inclusions.server.ts";

/** Where an inclusion lies, for those who read it: "at 2 o'clock, half way out; photograph 1, upper left". */
export function whereWords({ onPlot, onPhoto }: Pick<PlottedInclusion, "onPlot" | "onPhoto">, photoNumber: (ref: string) => number): string {
  const plot = onPlot && `${clockWords(onPlot.at)}${onPlot.side === "crown" ? "" : `, ${plotSideNames.pavilion.toLowerCase()}`}`;
  const photo = onPhoto && `photograph ${photoNumber(onPhoto.photoRef)}, ${pictureWords(onPhoto.at)}`;
  return [plot, photo].filter(Boolean).join("; ");
}

/** How deep, how many, how large. */
export function howWords({ depth, amount, sizeText }: Pick<PlottedInclusion, "depth" | "amount" | "sizeText">): string {
  return [depth === "notJudged" ? "" : inclusionDepthNames[depth].toLowerCase(), amount === "one" ? "" : inclusionAmountNames[amount].toLowerCase(), sizeText && `${typedDecimal(sizeText)} mm`].filter(Boolean).join(", ");
}
