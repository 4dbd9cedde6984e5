import { requireRange } from "../require-range.ts";

/** Outlines of set stones whose weight can be estimated, with what multiplies millimetres and density to carats. */
const factors = {
  round: { factor: 0.0018, uses: "meanDiameter", uShare: 0.05 },
  oval: { factor: 0.002, uses: "meanDiameter", uShare: 0.05 },
  square: { factor: 0.0024, uses: "lengthWidth", uShare: 0.06 },
  cushion: { factor: 0.0022, uses: "meanDiameter", uShare: 0.07 },
  octagon: { factor: 0.0025, uses: "lengthWidth", uShare: 0.05 },
  rectangle: { factor: 0.0026, uses: "lengthWidth", uShare: 0.05 },
  pear: { factor: 0.0018, uses: "lengthWidth", uShare: 0.07 },
  marquise: { factor: 0.0017, uses: "lengthWidth", uShare: 0.07 },
  heart: { factor: 0.002, uses: "lengthWidth", uShare: 0.08 },
  cabochon: { factor: 0.00265, uses: "lengthWidth", uShare: 0.08 },
  sphere: { factor: Math.PI / 6 / 200, uses: "sphere", uShare: 0.01 },
  roundBrilliantDiamond: { factor: 0.0061 / 3.52, uses: "meanDiameter", uShare: 0.03 },
} as const;
export type SetShape = keyof typeof factors;
export const setShapes = Object.keys(factors) as SetShape[];

const girdles = { ordinary: 1, slightlyThick: 1.02, thick: 1.03, veryThick: 1.06 } as const;
export type Girdle = keyof typeof girdles;

type SetStone = {
  shape: SetShape;
  lengthMm: number;
  widthMm: number;
  depthMm: number;
  sg: number;
  girdle?: Girdle;
  /** How much the pavilion bulges, or lacks, as a factor: 1.02–1.18 for native cuts, 0.95–0.99 for shallow ones. */
  bulge?: number;
  /** Standard uncertainties; a depth hidden by the setting has at least 0.2 mm. */
  uMm?: number;
  uDepthMm?: number;
  uSg?: number;
};
export type WeightEstimate = Readonly<{ weightCt: number; u: number; formula: string }>;

/**
 * Weight of a set stone from its measurements. An estimate, to be called one wherever it stands.
 *
 *   m = k · D̄² · depth · SG   or   k · L · W · depth · SG,   times girdle and bulge
 *   u(m)/m = √((2 u_Ø/Ø)² + (u_d/d)² + (u_SG/SG)² + u_k²)
 *
 * @throws RangeError
 *
 * Source: constants of the trade's tables, which disagree by up to 15 % (common practice); the sphere is exact geometry.
 */
export function estimateWeightCt({ shape, lengthMm, widthMm, depthMm, sg, girdle = "ordinary", bulge = 1, uMm = 0.02, uDepthMm = 0.2, uSg = 0.02 }: SetStone): WeightEstimate {
  for (const [name, value] of Object.entries({ lengthMm, widthMm, depthMm })) requireRange(name, value, value > 0 && value < 300);
  requireRange("sg", sg, sg > 0.8 && sg < 25);
  requireRange("bulge", bulge, bulge >= 0.8 && bulge <= 1.25);
  const { factor, uses, uShare } = factors[shape];
  const mean = (lengthMm + widthMm) / 2;
  const area = uses === "lengthWidth" ? lengthMm * widthMm : mean * mean;
  const weightCt = factor * area * (uses === "sphere" ? mean : depthMm) * sg * girdles[girdle] * bulge;
  const uArea = (2 * uMm) / mean;
  const uDepth = uses === "sphere" ? uMm / mean : uDepthMm / depthMm;
  return { weightCt, u: weightCt * Math.hypot(uArea, uDepth, uSg / sg, uShare), formula: `set-stone-1/${shape}` };
}
