export type Vector = readonly [number, number, number];
/** Rows are the crystal's axes 1, 2, 3 as unit vectors of the facet's frame: x at rotation 0°, y at 90°, z the facet's normal. */
export type Orientation = readonly [Vector, Vector, Vector];

export const dot = (a: Vector, b: Vector) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const cross = (a: Vector, b: Vector): Vector => [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
export const unit = (a: Vector): Vector => {
  const length = Math.hypot(...a);
  return [a[0] / length, a[1] / length, a[2] / length];
};

/** The crystal turned by a small rotation vector that is given along its own axes (Rodrigues' formula), kept orthonormal. */
export function turned(axes: Orientation, [x, y, z]: Vector): Orientation {
  const angle = Math.hypot(x, y, z);
  if (angle === 0) return axes;
  const along = unit([axes[0][0] * x + axes[1][0] * y + axes[2][0] * z, axes[0][1] * x + axes[1][1] * y + axes[2][1] * z, axes[0][2] * x + axes[1][2] * y + axes[2][2] * z]);
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const turn = (a: Vector): Vector => {
    const k = dot(along, a) * (1 - c);
    const side = cross(along, a);
    return [a[0] * c + side[0] * s + along[0] * k, a[1] * c + side[1] * s + along[1] * k, a[2] * c + side[2] * s + along[2] * k];
  };
  const first = unit(turn(axes[0]));
  const rough = turn(axes[1]);
  const second = unit([rough[0] - dot(rough, first) * first[0], rough[1] - dot(rough, first) * first[1], rough[2] - dot(rough, first) * first[2]]);
  return [first, second, cross(first, second)];
}
