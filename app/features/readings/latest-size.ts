import { readingValueText } from "./reading-words.ts";
import type { ReadingView } from "./reading-view.ts";

/** The last dimensions that stand: "8.41 × 6.90 × 4.52 mm"; empty where there are none. */
export function latestSize(readings: readonly Pick<ReadingView, "detail" | "quality" | "values" | "strike">[]): string {
  const measured = readings.findLast(({ detail, quality, strike }) => detail.kind === "dimensions" && quality !== "noResult" && !strike);
  return measured ? readingValueText(measured) : "";
}
