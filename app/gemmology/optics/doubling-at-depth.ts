import { requireRange } from "../require-range.ts";
import { walkOffDeg } from "./walk-off-deg.ts";

/** What an eye parts at reading distance, mm (common practice); a magnification divides it. */
const eyeMm = 0.2;

export type Doubling = Readonly<{ separationMm: number; /** Whether the eye would part the two images at that magnification. */ isSeen: boolean }>;

/**
 * How far the images of a back edge stand apart, seen straight through a stone.
 *
 * @param omega, epsilon, fromAxisDeg as for walkOffDeg; without an angle the largest doubling that any direction gives
 * @param depthMm path inside the stone, mm, > 0
 * @param magnification of the loupe or microscope, in [1, 200]
 * @throws RangeError when an argument leaves its range
 *
 * Source: path × tan ρ, crystal optics. That no doubling is seen says little: the direction may lie near an optic axis.
 * @example doublingAtDepth({ omega: 1.925, epsilon: 1.984, depthMm: 4 }).separationMm // ≈ 0.121, zircon
 */
export function doublingAtDepth({ depthMm, magnification = 10, ...ray }: { omega: number; epsilon: number; fromAxisDeg?: number; depthMm: number; magnification?: number }): Doubling {
  requireRange("depthMm", depthMm, depthMm > 0);
  requireRange("magnification", magnification, magnification >= 1 && magnification <= 200);
  const separationMm = depthMm * Math.tan((walkOffDeg(ray) * Math.PI) / 180);
  return { separationMm, isSeen: separationMm >= eyeMm / magnification };
}
