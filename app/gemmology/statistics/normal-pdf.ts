const oneOverRootTwoPi = 0.3989422804014327;

/** Standard normal density at z. */
export function normalPdf(z: number): number {
  return oneOverRootTwoPi * Math.exp(-0.5 * z * z);
}
