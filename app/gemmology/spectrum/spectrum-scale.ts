import type { DispersionFormula } from "../optics/dispersion-formula.ts";
import { indexAtWavelength } from "../optics/index-at-wavelength.ts";

/** How a hand spectroscope shows the visible spectrum: which end lies to the left, and what spreads the light. */
export type SpectrumView = Readonly<{ leftEnd: "red" | "violet"; spread: "prism" | "grating" }>;
export const usualSpectrumView: SpectrumView = { leftEnd: "red", spread: "grating" };

/** A view as one word: "red-grating". */
export const spectrumViewText = ({ leftEnd, spread }: SpectrumView): string => `${leftEnd}-${spread}`;
/** The view that a word means; the usual one where it means none. */
export function readSpectrumView(text: string | undefined): SpectrumView {
  const [, leftEnd, spread] = /^(red|violet)-(prism|grating)$/.exec(text ?? "") ?? [];
  return leftEnd && spread ? { leftEnd: leftEnd as SpectrumView["leftEnd"], spread: spread as SpectrumView["spread"] } : usualSpectrumView;
}

/** What is drawn, nm: what the eye sees in a hand spectroscope. */
export const drawnSpectrumNm = { from: 400, to: 700 } as const;

/**
 * The flint of a direct-vision prism. Its spread alone decides the scale: the angle between two colours is, for the
 * small angles of such a train, in proportion to the difference of their indices.
 *
 * Source: Sellmeier coefficients of the optical glass F2 as its maker's data sheet gives them.
 */
export const flintGlass: DispersionFormula = {
  kind: "sellmeier",
  fromNm: 334,
  toNm: 2500,
  constant: 1,
  terms: [
    { strength: 1.34533359, pole: 0.00997743871 },
    { strength: 0.209073176, pole: 0.0470450767 },
    { strength: 0.937357162, pole: 111.886764 },
  ],
};

const shareFromRed = {
  grating: (nm: number) => (drawnSpectrumNm.to - nm) / (drawnSpectrumNm.to - drawnSpectrumNm.from),
  prism: (nm: number) => (indexAtWavelength(flintGlass, nm) - indexAtWavelength(flintGlass, drawnSpectrumNm.to)) / (indexAtWavelength(flintGlass, drawnSpectrumNm.from) - indexAtWavelength(flintGlass, drawnSpectrumNm.to)),
} as const;

/**
 * Where a wavelength lies on the drawn spectrum.
 * @param nm wavelength in [334, 2500]
 * @returns share of the width from the left end, 0 to 1 within what is drawn, beyond that outside
 * @throws RangeError beyond the prism's own range
 */
export function shareAtNm(nm: number, { leftEnd, spread }: SpectrumView): number {
  const share = shareFromRed[spread](nm);
  return leftEnd === "red" ? share : 1 - share;
}

/**
 * The wavelength at a place on the drawn spectrum.
 * @param share of the width from the left end; beyond 0 and 1 it is taken as the end
 * @returns nm, in what is drawn
 */
export function nmAtShare(share: number, { leftEnd, spread }: SpectrumView): number {
  const fromRed = Math.min(1, Math.max(0, leftEnd === "red" ? share : 1 - share));
  const { from, to } = drawnSpectrumNm;
  if (spread === "grating") return to - fromRed * (to - from);
  // The index falls with the wavelength throughout: halving finds the place.
  let [low, high] = [from as number, to as number];
  for (let step = 0; step < 40; step++) {
    const middle = (low + high) / 2;
    if (shareFromRed.prism(middle) > fromRed) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
