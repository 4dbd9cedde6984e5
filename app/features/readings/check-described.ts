import { readSpectrumLines } from "#app/domain/bench-tests/spectrum-lines.ts";
import type { DescribedDetail } from "#app/domain/bench-tests/test-forms.ts";
import type { ReadingValue } from "#app/domain/reading.ts";

/** What cannot be true together of one described reading, a sentence beside the field to look at. */
export function checkDescribed(detail: DescribedDetail, values: readonly ReadingValue[], refuse: (field: string, message: string) => void): void {
  const valueOf = (name: ReadingValue["name"]) => values.find((value) => value.name === name)?.value;
  switch (detail.kind) {
    case "dichroscope": {
      const colours = detail.colours.split(",").filter((colour) => colour.trim() !== "").length;
      if (detail.strength === "none" && colours > 0) refuse("colours", "None was seen, so there are no two colours. Which of the two is meant?");
      else if (colours === 1) refuse("colours", "Pleochroism shows two or three colours: write both, with a comma between.");
      else if (colours > 3) refuse("colours", "No stone has more than three pleochroic colours.");
      return;
    }
    case "spectroscope": {
      const { problem } = readSpectrumLines(detail.lines);
      if (problem) refuse("lines", problem);
      return;
    }
    case "ultraviolet":
      if (detail.strength === "inert" && detail.colour !== "") refuse("colour", "An inert stone has no colour under the lamp. Which of the two was seen?");
      return;
    case "magnification":
      if (detail.features.includes("noInclusions") && detail.features.length > 1) refuse("features", "“No inclusions” and what was seen exclude each other.");
      else if (detail.features.length === 0 && detail.text === "" && detail.doubling === null) refuse("features", "Tick what was seen, or write it below.");
      return;
    case "immersion":
      if (detail.comparison === "near" && (detail.relief === "high" || detail.relief === "veryHigh")) refuse("relief", "A stone near the liquid's index stands out little. Which of the two was seen?");
      return;
    case "realDepth": {
      const [realMm, apparentMm] = [valueOf("realMm")!, valueOf("apparentMm")!];
      if (apparentMm >= realMm) refuse("apparentMm", "The focus travels less than the real depth. Are the two exchanged?");
      else if (realMm / apparentMm > 4) refuse("apparentMm", `These depths give an index of ${(realMm / apparentMm).toFixed(1)}, which no stone has.`);
      else if (realMm / apparentMm < 1.2) refuse("apparentMm", `These depths give an index of ${(realMm / apparentMm).toFixed(2)}, below that of any stone.`);
      return;
    }
    default:
      return;
  }
}
