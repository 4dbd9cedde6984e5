/** The bar of a picture: a round length near a fifth of its width. */
export type ScaleBar = Readonly<{ text: string; /** Of the picture's width. */ share: number }>;

const mostShare = 0.28;

/**
 * A scale bar for a picture whose width is known: the longest of 1, 2, 5 times a power of ten below 28 % of the width.
 * @param pictureWidthMm what the picture shows from its left to its right edge, mm, > 0
 * @throws RangeError for a width that is none
 */
export function scaleBar(pictureWidthMm: number): ScaleBar {
  if (!Number.isFinite(pictureWidthMm) || pictureWidthMm <= 0) throw new RangeError(`pictureWidthMm out of range: ${pictureWidthMm}`);
  const most = pictureWidthMm * mostShare;
  const decade = 10 ** Math.floor(Math.log10(most));
  // The logarithm of a power of ten may fall a hair short of a whole number.
  const lengthMm = [10, 5, 2, 1].map((digit) => digit * decade).find((length) => length <= most * (1 + 1e-9))!;
  return { text: lengthMm >= 0.9995 ? `${Number(lengthMm.toPrecision(3))} mm` : `${Number((lengthMm * 1000).toPrecision(3))} µm`, share: lengthMm / pictureWidthMm };
}
