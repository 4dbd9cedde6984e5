export type Direction = "left" | "right" | "up" | "down";
/** A box by its middle, in the picture's own units: x to the right, y downwards. */
export type Middle = Readonly<{ id: string; x: number; y: number }>;

/**
 * The next box in a direction, as the eye would take it: what lies straight ahead before what is nearer and aside.
 * @returns undefined where there is none further
 */
export function nextBox(boxes: readonly Middle[], from: Readonly<{ x: number; y: number; id?: string }>, direction: Direction): Middle | undefined {
  let best: { box: Middle; cost: number } | undefined;
  for (const box of boxes) {
    if (box.id === from.id) continue;
    const [right, down] = [box.x - from.x, box.y - from.y];
    const [ahead, aside] = { left: [-right, down], right: [right, down], up: [-down, right], down: [down, right] }[direction] as [number, number];
    // Beyond 60° to the side it belongs to another direction.
    if (ahead <= 0 || Math.abs(aside) > ahead * 1.74) continue;
    const cost = ahead + 2.5 * Math.abs(aside);
    if (!best || cost < best.cost || (cost === best.cost && box.id < best.box.id)) best = { box, cost };
  }
  return best?.box;
}
