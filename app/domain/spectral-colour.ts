import { toSrgb, xBar, yBar, zBar, type Rgb } from "./interference-colour.ts";

/** White mixed in, so that dark lines stand out at both ends, where the eye sees little. */
const whiteShare = 0.04;
/** Beyond these the hue stays as it is there; the fit of the eye's response is not made for its tails. */
const hueNm = { from: 420, to: 660 } as const;

/**
 * The hue of one wavelength, for a drawn spectrum: as near as a screen comes to it, and equally bright throughout, which
 * the real one is not. Sources: see interference-colour.ts.
 *
 * @param wavelengthNm 380 to 780
 * @returns sRGB components in [0, 1]
 */
export function spectralColour(wavelengthNm: number): Rgb {
  const nm = Math.min(hueNm.to, Math.max(hueNm.from, wavelengthNm));
  const [x, y, z] = [xBar(nm), yBar(nm), zBar(nm)];
  const linear = [3.2406 * x - 1.5372 * y - 0.4986 * z, -0.9689 * x + 1.8758 * y + 0.0415 * z, 0.0557 * x - 0.204 * y + 1.057 * z];
  // No screen shows a pure colour: grey is added until nothing is negative.
  const least = Math.min(0, ...linear);
  const most = Math.max(...linear) - least;
  const [red, green, blue] = linear.map((part) => toSrgb(whiteShare + (1 - whiteShare) * ((part - least) / most))) as [number, number, number];
  return { red, green, blue };
}
