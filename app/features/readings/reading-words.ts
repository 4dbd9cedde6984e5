import { isDescribed, type DescribedDetail } from "#app/domain/bench-tests/test-forms.ts";
import { describedWords } from "./described-words.ts";
import { weighingNotes } from "./weighing-notes.ts";
import { rotationPositions } from "./rotation-rows.ts";
import { facetNames, interferenceFigureNames, lightNames, polariscopeBehaviourNames, weighingMethodNames, type Facet, type Light, type ReadingDetail, type ReadingValue, type ReadingValueName } from "#app/domain/reading.ts";
import { decimalPlaces } from "#app/domain/decimal.ts";
import { typedDecimal } from "#app/domain/typed-decimal.ts";

type Told = Readonly<{ detail: ReadingDetail; values: readonly ReadingValue[] }>;

/** What was measured, in the digits that were typed: "1.762 – 1.770", "3.997 ± 0.021". Empty where nothing was. */
export function readingValueText({ detail, values }: Told): string {
  const get = (name: ReadingValueName) => values.find((value) => value.name === name);
  const typed = (name: ReadingValueName) => {
    const value = get(name);
    return value ? figureText(value) : "";
  };
  if (isDescribedDetail(detail)) return derivesIndex.has(detail.kind) && get("n") ? `n ${withUncertainty(get("n")!, 3)}` : describedWords(detail, values).headline;
  switch (detail.kind) {
    case "refractometer":
      return get("low") ? `${typed("low")} – ${typed("high")}` : typed("n");
    case "spot":
      return typed("n");
    case "overLimit":
      return get("limit") ? `> ${typed("limit")}` : "";
    case "criticalAngle":
      return get("n") ? withUncertainty(get("n")!, 4) : "";
    case "polariscope":
      return polariscopeBehaviourNames[detail.behaviour];
    case "density":
      return get("sg") ? withUncertainty(get("sg")!, 3) : "";
    case "weight":
      return get("weightCt") ? `${typed("weightCt")} ct` : "";
    case "dimensions":
      return get("lengthMm") ? `${[typed("lengthMm"), typed("widthMm"), typed("depthMm")].join(" × ")} mm` : "";
    case "rotation":
      return rotationIndices({ detail, values });
    case "free":
      return "";
  }
}

const isDescribedDetail = (detail: ReadingDetail): detail is DescribedDetail => isDescribed(detail.kind);
const derivesIndex: ReadonlySet<ReadingDetail["kind"]> = new Set(["reflectivity", "brewster", "realDepth"]);

/** "nω 1.7689(6)  nε 1.7605(7)", or the two ends where one facet leaves the middle open. */
function rotationIndices({ values }: Told): string {
  const names = { n: "n", omega: "nω", epsilon: "nε", alpha: "nα", beta: "nβ", gamma: "nγ" } as const;
  const own = Object.entries(names).flatMap(([name, symbol]) => values.filter((value) => value.name === name).map((value) => `${symbol} ${withUncertainty(value, 4)}`));
  if (own.length > 0) return own.join(", ");
  const [low, high] = [values.find(({ name }) => name === "low"), values.find(({ name }) => name === "high")];
  return low && high ? `${withUncertainty(low, 4)} to ${withUncertainty(high, 4)}` : "";
}

/** The digits as typed; where a correction was added, the corrected figure with one digit more. */
export function figureText({ typedText, value, rawValue }: Pick<ReadingValue, "typedText" | "value" | "rawValue">): string {
  if (typeof rawValue === "number") return value.toFixed(decimalPlaces(typedText) + 1);
  return typedDecimal(typedText || String(value));
}

const figureOrder: readonly ReadingValueName[] = ["low", "high", "n", "angleDeg", "massAirCt", "massAirCt2", "massAirCt3", "massLiquidCt", "massLiquidCt2", "massLiquidCt3", "weightCt", "lengthMm", "widthMm", "depthMm"];

/** What the instrument showed before its correction: "read 1.762 – 1.770, corrected by +0.0004"; empty where none was in force. */
export function correctionText(values: readonly ReadingValue[]): string {
  // The database keeps them by name.
  const inOrder = values.toSorted((a, b) => figureOrder.indexOf(a.name) - figureOrder.indexOf(b.name));
  const corrected = inOrder.flatMap(({ typedText, value, rawValue }) => (typeof rawValue === "number" ? [{ text: typedDecimal(typedText), added: value - rawValue, decimals: decimalPlaces(typedText) + 1 }] : []));
  if (corrected.length === 0) return "";
  const amounts = [...new Set(corrected.map(({ added, decimals }) => `${added < 0 ? "−" : "+"}${Math.abs(added).toFixed(decimals)}`))];
  return `read ${corrected.map(({ text }) => text).join(" – ")}, corrected by ${amounts.join(" and ")}`;
}

/** Whether a value is digits, to be set in figures, or words. */
export const isFigures = (valueText: string): boolean => /^(\D?|n[ωεαβγ]? )\d/.test(valueText);

/** What was seen beside the value, in words. */
export function readingSeenText({ detail, values }: Told): string {
  const typed = (name: ReadingValueName) => typedDecimal(values.find((value) => value.name === name)?.typedText ?? "");
  if (isDescribedDetail(detail)) {
    const { headline, seen } = describedWords(detail, values);
    return derivesIndex.has(detail.kind) ? [headline, seen].filter(Boolean).join(", ") : seen;
  }
  switch (detail.kind) {
    case "rotation": {
      const { facetCount, positionCount } = rotationPositions(detail.rows);
      const sign = detail.sign === "+" ? "positive" : detail.sign === "-" ? "negative" : "";
      const found = detail.character === "undetermined" ? "character left open" : [detail.character, sign].filter(Boolean).join(" ");
      return `${found}; ${positionCount} positions${facetCount > 1 ? ` on ${facetCount} facets` : ""}`;
    }
    case "refractometer":
      return detail.edges === "one" ? "one edge" : detail.isRotated ? "two edges, extremes of a rotation" : "two edges, one position";
    case "spot":
      return `spot, ${detail.method}`;
    case "overLimit":
      return "only the liquid's edge seen";
    case "criticalAngle":
      return values.length > 0 ? `${typed("angleDeg")}° against a prism of ${typed("prismN")}` : "";
    case "polariscope": {
      const figure = detail.figure === "notSought" ? "" : detail.figure === "none" ? "no figure found" : interferenceFigureNames[detail.figure].toLowerCase();
      const sign = detail.sign === "+" ? "positive" : detail.sign === "-" ? "negative" : "";
      const tried = detail.directionsTried > 0 ? `${detail.directionsTried} ${detail.directionsTried === 1 ? "direction" : "directions"}` : "";
      return [tried, figure, sign].filter(Boolean).join(", ");
    }
    case "density": {
      if (values.length === 0) return "";
      const notes = weighingNotes({ detail, values });
      return [`${typed("massAirCt")} ct in air, ${typed("massLiquidCt")} ct ${detail.method === "suspended" ? "in water" : "gained by the beaker"}`, notes?.spread].filter(Boolean).join("; ");
    }
    case "free":
      return detail.text;
    default:
      return "";
  }
}

/** Where and in which light; how it was weighed. */
export function readingConditions({ detail, values }: Told): string {
  if (detail.kind === "density") {
    const tempC = values.find(({ name }) => name === "tempC")?.typedText;
    return [weighingMethodNames[detail.method].split(",")[0], tempC ? `${typedDecimal(tempC)} °C` : ""].filter(Boolean).join(", ");
  }
  if (isDescribedDetail(detail)) return describedWords(detail, values).conditions;
  if (detail.kind === "rotation") return detail.light === "sodium" ? "Na" : lightNames[detail.light].split(",")[0]!.toLowerCase();
  if (detail.kind === "dimensions") return detail.shape === "round" ? "round" : "";
  return "facet" in detail ? seenAt(detail) : "";
}

function seenAt({ facet, light }: { facet: Facet; light: Light }): string {
  return `${facetNames[facet].toLowerCase()}, ${light === "sodium" ? "Na" : lightNames[light].split(",")[0]!.toLowerCase()}`;
}

/** "3.997 ± 0.021": two digits of the uncertainty, the value to the same place. */
export function withUncertainty({ value, standardUncertainty }: Pick<ReadingValue, "value" | "standardUncertainty">, mostDecimals: number): string {
  if (!standardUncertainty) return value.toFixed(mostDecimals);
  const decimals = Math.min(mostDecimals, Math.max(0, 1 - Math.floor(Math.log10(standardUncertainty))));
  return `${value.toFixed(decimals)} ± ${standardUncertainty.toFixed(decimals)}`;
}
