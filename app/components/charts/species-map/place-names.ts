export type Placed = Readonly<{ id: string; name: string; x: number; y: number; anchor: "start" | "end" }>;
type Box = Readonly<{ id: string; name: string; left: number; right: number; top: number; bottom: number }>;
type Frame = Readonly<{ left: number; right: number; top: number; bottom: number }>;

const letterWidth = 6.4;
const lineHeight = 14;

/**
 * Names beside their boxes, the first ones first; a name that would lie on another or outside the frame is left out.
 *
 * @param boxes in the order of their claim to a name, in the picture's own units
 * @param most names in all
 * @param kept free of names: where the reading stands
 */
export function placeNames(boxes: readonly Box[], frame: Frame, { most, kept = [] }: { most: number; kept?: readonly Frame[] }): Placed[] {
  const taken: Frame[] = [...kept];
  const placed: Placed[] = [];
  for (const { id, name, left, right, top, bottom } of boxes) {
    if (placed.length >= most) break;
    const width = name.length * letterWidth;
    const middle = (Math.max(top, frame.top) + Math.min(bottom, frame.bottom)) / 2 + 4;
    const spots: Placed[] = [
      { id, name, x: right + 5, y: middle, anchor: "start" },
      { id, name, x: left - 5, y: middle, anchor: "end" },
      { id, name, x: Math.max(left, frame.left + 2), y: top - 5, anchor: "start" },
      { id, name, x: Math.max(left, frame.left + 2), y: bottom + 12, anchor: "start" },
    ];
    for (const spot of spots) {
      const start = spot.anchor === "start" ? spot.x : spot.x - width;
      const area = { left: start, right: start + width, top: spot.y - lineHeight + 3, bottom: spot.y + 3 };
      const isInside = area.left >= frame.left && area.right <= frame.right && area.top >= frame.top && area.bottom <= frame.bottom;
      if (!isInside || taken.some((other) => area.left < other.right + 4 && other.left < area.right + 4 && area.top < other.bottom && other.top < area.bottom)) continue;
      taken.push(area);
      placed.push(spot);
      break;
    }
  }
  return placed;
}
