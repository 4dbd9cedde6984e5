/** Right and down, from the middle of the drawing; the outline reaches from -1 to 1 both ways. */
export type Point = readonly [right: number, down: number];

const turn = 2 * Math.PI;

/** Points all around, from the top by the clock. */
export const around = (count: number, at: (angle: number) => Point): Point[] => Array.from({ length: count }, (_, index) => at((turn * index) / count));

/** The same figure stretched to reach from -1 to 1 both ways. */
export function filling(points: readonly Point[]): Point[] {
  const [rights, downs] = [points.map(([right]) => right), points.map(([, down]) => down)];
  const fit = (values: readonly number[]) => {
    const [low, high] = [Math.min(...values), Math.max(...values)];
    return (value: number) => (2 * (value - low)) / (high - low) - 1;
  };
  const [fitRight, fitDown] = [fit(rights), fit(downs)];
  return points.map(([right, down]) => [fitRight(right), fitDown(down)] as const);
}

export const scaled = (points: readonly Point[], factor: number): Point[] => points.map(([right, down]) => [right * factor, down * factor] as const);

/** Where a ray from the middle leaves the outline; the angle from the top, by the clock. */
export function edgeAt(outline: readonly Point[], angle: number): Point {
  const [dx, dy] = [Math.sin(angle), -Math.cos(angle)];
  let farthest = 0;
  outline.forEach(([ax, ay], index) => {
    const [bx, by] = outline[(index + 1) % outline.length]!;
    const across = dx * (by - ay) - dy * (bx - ax);
    if (Math.abs(across) < 1e-12) return;
    const share = (dy * ax - dx * ay) / across;
    const reach = (ax * (by - ay) - ay * (bx - ax)) / across;
    if (share >= -1e-9 && share <= 1 + 1e-9 && reach > farthest) farthest = reach;
  });
  return [dx * farthest, dy * farthest];
}
