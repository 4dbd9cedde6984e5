import type { Place } from "./inclusion.ts";

/**
 * A place on a plotted outline in the words of the bench: the hour on a clock's face, twelve at the top, and how far out.
 * @param place shares of the outline's own width and height
 */
export function clockWords({ x, y }: Place): string {
  const [right, up] = [2 * (x - 0.5), 2 * (0.5 - y)];
  const reach = Math.hypot(right, up);
  if (reach < 0.15) return "in the centre";
  const hour = Math.round(((Math.atan2(right, up) * 180) / Math.PI + 360) / 30) % 12 || 12;
  return `at ${hour} o'clock, ${reach < 0.5 ? "inside" : reach < 0.8 ? "half way out" : "at the girdle"}`;
}

/** A place on a photograph in words: "upper left", "middle". */
export function pictureWords({ x, y }: Place): string {
  const row = y < 1 / 3 ? "upper" : y > 2 / 3 ? "lower" : "middle";
  const column = x < 1 / 3 ? " left" : x > 2 / 3 ? " right" : row === "middle" ? "" : " middle";
  return `${row}${column}`;
}
