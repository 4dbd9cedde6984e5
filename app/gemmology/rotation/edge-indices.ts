import { dot, type Orientation, type Vector } from "./vector.ts";

/** Principal indices along the crystal's axes 1, 2, 3, in any order. */
export type PrincipalIndices = readonly [number, number, number];
export type EdgePair = Readonly<{ upper: number; lower: number }>;

const degree = Math.PI / 180;

/**
 * Both index edges that a critical-angle refractometer shows of one facet at one rotation. At an edge the energy, not the
 * wave normal, grazes the facet: the edge is the largest tangential component of the wave vector on its sheet of the
 * index surface within the plane of incidence,
 *
 *   n_edge(φ) = max over ψ of n(w_ψ)·cos ψ,   w_ψ = s(φ) cos ψ + N sin ψ.
 *
 * @param indices principal refractive indices, above 1
 * @param angleDeg rotation of the stone on its facet
 *
 * Source: derived from Maxwell's equations; agrees with the number of real normal wave vectors of Booker's quartic.
 */
export function edgeIndices(indices: PrincipalIndices, axes: Orientation, angleDeg: number): EdgePair {
  const { upper, lower } = edgesWithTilt(sheetsOf(indices), facetView(axes, angleDeg));
  return { upper, lower };
}

/** Both index sheets over a wave normal in crystal axes: larger index, smaller index. */
export type Sheets = (wave: Vector) => readonly [number, number];
/** In crystal axes: the direction along the prism, and the facet's normal. */
export type FacetView = Readonly<{ along: Vector; normal: Vector }>;
/** Edges with the tilt ψ of the wave normal (radians, towards the facet's normal) at which each stands. */
export type TiltedEdges = EdgePair & Readonly<{ upperTilt: number; lowerTilt: number }>;

export function facetView(axes: Orientation, angleDeg: number): FacetView {
  const s: Vector = [Math.cos(angleDeg * degree), Math.sin(angleDeg * degree), 0];
  return { along: [dot(s, axes[0]), dot(s, axes[1]), dot(s, axes[2])], normal: [axes[0][2], axes[1][2], axes[2][2]] };
}

export function edgesWithTilt(sheets: Sheets, { along, normal }: FacetView): TiltedEdges {
  const [upper, upperTilt] = highest((psi) => sheets(wave(along, normal, psi))[0] * Math.cos(psi));
  const [lower, lowerTilt] = highest((psi) => sheets(wave(along, normal, psi))[1] * Math.cos(psi));
  return { upper, lower, upperTilt, lowerTilt };
}

/** What the edges would be if they stood at given tilts: near their own tilts right to the second order. */
export function edgesAtTilt(sheets: Sheets, { along, normal }: FacetView, { upperTilt, lowerTilt }: Pick<TiltedEdges, "upperTilt" | "lowerTilt">): EdgePair {
  return { upper: sheets(wave(along, normal, upperTilt))[0] * Math.cos(upperTilt), lower: sheets(wave(along, normal, lowerTilt))[1] * Math.cos(lowerTilt) };
}

/** Upper and lower index of the section of the indicatrix across a wave normal (in crystal axes): the wave-normal approximation of the edges. */
export function sectionIndices(indices: PrincipalIndices, wave: Vector): readonly [number, number] {
  return sheetsOf(indices)(wave);
}

/**
 * Angle, in degrees from the facet's normal (0 up to 180), of the vibration that makes the upper edge; the lower edge's
 * stands across it.
 *
 * tan 2χ = 2 η_Nt / (η_NN − η_tt), the branch with the smaller impermeability; t = N × s.
 */
export function upperVibrationDeg(indices: PrincipalIndices, axes: Orientation, angleDeg: number): number {
  const t: Vector = [-Math.sin(angleDeg * degree), Math.cos(angleDeg * degree), 0];
  let [nn, nt, tt] = [0, 0, 0];
  axes.forEach((axis, i) => {
    const a = 1 / indices[i]! ** 2;
    const [n, across] = [axis[2], dot(axis, t)];
    nn += a * n * n;
    nt += a * n * across;
    tt += a * across * across;
  });
  const chi = 0.5 * Math.atan2(2 * nt, nn - tt); // direction of the larger impermeability
  return (((chi + Math.PI / 2) / degree) % 180 + 180) % 180;
}

const wave = (along: Vector, normal: Vector, psi: number): Vector => {
  const [c, s] = [Math.cos(psi), Math.sin(psi)];
  return [along[0] * c + normal[0] * s, along[1] * c + normal[1] * s, along[2] * c + normal[2] * s];
};

/** Impermeabilities less their mean keep every digit where the two sheets nearly touch. */
export function sheetsOf(indices: PrincipalIndices): Sheets {
  const a = indices.map((n) => 1 / (n * n));
  const mean = (a[0]! + a[1]! + a[2]!) / 3;
  const [p, q, r] = [a[0]! - mean, a[1]! - mean, a[2]! - mean];
  return ([x, y, z]) => {
    const [xx, yy, zz] = [x * x, y * y, z * z];
    const half = (xx * (q + r) + yy * (p + r) + zz * (p + q)) / 2;
    const spread = Math.sqrt(Math.max(0, half * half - (xx * q * r + yy * p * r + zz * p * q)));
    return [1 / Math.sqrt(mean + half - spread), 1 / Math.sqrt(mean + half + spread)];
  };
}

/** The largest value near ψ = 0: by parabolas, or by golden section where two sheets meet and there is a kink. */
function highest(f: (psi: number) => number): readonly [value: number, psi: number] {
  let psi = 0;
  let step = 0.02;
  for (let turn = 0; turn < 4; turn++) {
    const [left, middle, right] = [f(psi - step), f(psi), f(psi + step)];
    const curvature = left - 2 * middle + right;
    if (!(curvature < 0)) break;
    const move = (step * (left - right)) / (2 * curvature);
    if (Math.abs(move) > 0.3) break;
    psi += move;
    if (turn >= 1 && Math.abs(move) < 1e-6) return [f(psi), psi];
    step = 1e-3;
  }
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [-0.35, 0.35];
  let [left, right] = [high - golden * (high - low), low + golden * (high - low)];
  let [fLeft, fRight] = [f(left), f(right)];
  while (high - low > 1e-7) {
    if (fLeft > fRight) {
      [high, right, fRight] = [right, left, fLeft];
      left = high - golden * (high - low);
      fLeft = f(left);
    } else {
      [low, left, fLeft] = [left, right, fRight];
      right = low + golden * (high - low);
      fRight = f(right);
    }
  }
  return fLeft > fRight ? [fLeft, left] : [fRight, right];
}
