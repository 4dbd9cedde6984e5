/** Which product of measurements a shape's factor multiplies. */
export type SizeForm = "meanDiameterSquared" | "lengthWidth";
export type SetStoneShape = keyof typeof setStoneShapes;

export type ShapeFactor = Readonly<{
  form: SizeForm;
  /** ct/mm³ per unit of specific gravity. */
  factor: number;
  /** Where published tables disagree, their least and greatest. */
  published?: readonly [least: number, greatest: number];
}>;

/*
 * Factors for coloured stones of usual make. Sources: published compilations of weight-estimation constants (two, read);
 * Carmona, "Estimating weights of mounted colored gemstones" (1998) for shape factor × profile correction. Cabochons: from
 * memory; a half ellipsoid has π/6/200 = 0.00262. Bead: exact, π/6/200.
 */
export const setStoneShapes = {
  round: { form: "meanDiameterSquared", factor: 0.0018 },
  oval: { form: "meanDiameterSquared", factor: 0.002 },
  square: { form: "lengthWidth", factor: 0.0024, published: [0.0023, 0.0025] },
  squareCushion: { form: "meanDiameterSquared", factor: 0.0018 },
  rectangularCushion: { form: "meanDiameterSquared", factor: 0.0022 },
  octagon: { form: "lengthWidth", factor: 0.0025 },
  rectangle: { form: "lengthWidth", factor: 0.0026 },
  pear: { form: "lengthWidth", factor: 0.0018 },
  marquise: { form: "lengthWidth", factor: 0.0017, published: [0.0016, 0.0017] },
  heart: { form: "lengthWidth", factor: 0.00195, published: [0.0018, 0.0021] },
  cabochon: { form: "lengthWidth", factor: 0.00265, published: [0.0026, 0.0027] },
  bead: { form: "meanDiameterSquared", factor: Math.PI / 1200 },
} as const satisfies Readonly<Record<string, ShapeFactor>>;
