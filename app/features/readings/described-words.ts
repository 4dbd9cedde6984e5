import type { TestField } from "#app/domain/bench-tests/test-form.ts";
import { testForms, type DescribedDetail } from "#app/domain/bench-tests/test-forms.ts";
import type { ReadingValue } from "#app/domain/reading.ts";
import { typedDecimal } from "#app/domain/typed-decimal.ts";

const unitWords: Partial<Record<ReadingValue["unit"], string>> = { deg: "°", mm: " mm", degC: " °C", cm: " cm", s: " s", x: "×", "%": " %" };

/** A described reading in the words of its form: what it says first, what else was seen, and how. */
export function describedWords(detail: DescribedDetail, values: readonly ReadingValue[]): Readonly<{ headline: string; seen: string; conditions: string }> {
  const { fields } = testForms[detail.kind];
  const [first, ...others] = fields.filter((field) => !field.isCondition);
  const told = (field: TestField) => fieldWords(field, detail, values);
  const list = (some: readonly TestField[]) => some.map(told).filter(Boolean).map((words, at) => (at === 0 ? words : lowerFirst(words))).join(", ");
  return { headline: first ? told(first) : "", seen: lowerFirst(list(others)), conditions: lowerFirst(list(fields.filter(({ isCondition }) => isCondition))) };
}

function fieldWords(field: TestField, detail: DescribedDetail, values: readonly ReadingValue[]): string {
  const part = (detail as unknown as Record<string, unknown>)[field.name];
  switch (field.type) {
    case "choice":
      return typeof part === "string" ? withLabel(field, field.options[part] ?? "") : "";
    case "many":
      return Array.isArray(part) ? part.map((code: string) => field.options[code] ?? "").map((word, at) => (at === 0 ? word : lowerFirst(word))).join(", ") : "";
    case "tick":
      return part === true ? field.words : "";
    case "words":
      return typeof part === "string" ? part : "";
    case "number": {
      const value = values.find(({ name }) => name === field.name);
      if (!value) return "";
      const digits = `${typedDecimal(value.typedText || String(value.value))}${unitWords[value.unit] ?? ""}`;
      return countWords[field.name]?.(value.value) ?? (field.isCondition && !field.isRequired && field.unit !== "x" ? `${field.label.toLowerCase()} ${digits}` : digits);
    }
  }
}

/** "None seen" of what: a choice that would not tell of itself is told with its field's name. */
function withLabel({ name, label }: TestField, words: string): string {
  return needsLabel.has(name) ? `${label}: ${lowerFirst(words)}` : words;
}
const needsLabel: ReadonlySet<string> = new Set(["doubling", "relief", "lustre"]);

const countWords: Partial<Record<string, (count: number) => string>> = {
  directionsTried: (count) => `${count} ${count === 1 ? "direction" : "directions"}`,
  pointsTried: (count) => `${count} ${count === 1 ? "point" : "points"}`,
  phosphorescenceS: (count) => (count === 0 ? "no afterglow" : `afterglow ${count} s`),
};

const lowerFirst = (text: string) => (/^[A-Z][a-z]/.test(text) ? text[0]!.toLowerCase() + text.slice(1) : text);
