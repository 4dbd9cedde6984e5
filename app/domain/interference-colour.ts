/**
 * The colours that a quartz wedge shows between crossed polars: transmitted intensity sin²(πR/λ) over the visible
 * spectrum, for a retardation R, seen in daylight (a 6504 K radiator) and brought to sRGB.
 *
 * Sources: the interference formula is standard crystal optics; the eye's response is the multi-lobe Gaussian fit to the
 * CIE 1931 functions of Wyman, Sloan and Shirley, J. Computer Graphics Techniques 2 (2013) 1; sRGB by IEC 61966-2-1.
 */
const lobe = (x: number, height: number, centre: number, below: number, above: number) =>
  height * Math.exp(-0.5 * ((x - centre) / (x < centre ? below : above)) ** 2);
export const xBar = (nm: number) => lobe(nm, 1.056, 599.8, 37.9, 31.0) + lobe(nm, 0.362, 442.0, 16.0, 26.7) + lobe(nm, -0.065, 501.1, 20.4, 26.2);
export const yBar = (nm: number) => lobe(nm, 0.821, 568.8, 46.9, 40.5) + lobe(nm, 0.286, 530.9, 16.3, 31.1);
export const zBar = (nm: number) => lobe(nm, 1.217, 437.0, 11.8, 36.0) + lobe(nm, 0.681, 459.0, 26.0, 13.8);

const colourTempK = 6504;
/** Second radiation constant, nm·K (CODATA). */
const c2 = 1.438777e7;
const lamp = (nm: number) => (560 / nm) ** 5 * ((Math.exp(c2 / (560 * colourTempK)) - 1) / (Math.exp(c2 / (nm * colourTempK)) - 1));

const wavelengthsNm = Array.from({ length: 81 }, (_, i) => 380 + 5 * i);
const white = wavelengthsNm.reduce((sum, nm) => sum + lamp(nm) * yBar(nm), 0);

export type Rgb = Readonly<{ red: number; green: number; blue: number }>;

/**
 * @param retardationNm path difference, nm, ≥ 0
 * @returns sRGB components in [0, 1]
 * @throws RangeError when the retardation is negative or no number
 */
export function interferenceColour(retardationNm: number): Rgb {
  if (!(retardationNm >= 0) || !Number.isFinite(retardationNm)) throw new RangeError(`retardationNm out of range: ${retardationNm}`);
  let x = 0;
  let y = 0;
  let z = 0;
  for (const nm of wavelengthsNm) {
    const seen = (Math.sin((Math.PI * retardationNm) / nm) ** 2 * lamp(nm)) / white;
    x += seen * xBar(nm);
    y += seen * yBar(nm);
    z += seen * zBar(nm);
  }
  return {
    red: toSrgb(3.2406 * x - 1.5372 * y - 0.4986 * z),
    green: toSrgb(-0.9689 * x + 1.8758 * y + 0.0415 * z),
    blue: toSrgb(0.0557 * x - 0.204 * y + 1.057 * z),
  };
}

/** A CSS gradient from R = 0 to 1800 nm: the one ornament of a page. */
export function interferenceGradient({ stepNm = 50, mostNm = 1800 } = {}): string {
  const stops = [];
  for (let retardationNm = 0; retardationNm <= mostNm; retardationNm += stepNm) {
    const { red, green, blue } = interferenceColour(retardationNm);
    stops.push(`#${[red, green, blue].map((part) => Math.round(part * 255).toString(16).padStart(2, "0")).join("")}`);
  }
  return `linear-gradient(90deg,${stops.join(",")})`;
}

export function toSrgb(linear: number): number {
  const clipped = Math.min(1, Math.max(0, linear));
  return clipped <= 0.0031308 ? 12.92 * clipped : 1.055 * clipped ** (1 / 2.4) - 0.055;
}
