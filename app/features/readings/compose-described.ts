import type { TestField } from "#app/domain/bench-tests/test-form.ts";
import { testForms, type DescribedDetail } from "#app/domain/bench-tests/test-forms.ts";
import type { ReadingQuality, ReadingValue, ReadingValueName } from "#app/domain/reading.ts";
import { plainText } from "#app/domain/plain-text.ts";
import { checkDescribed } from "./check-described.ts";
import type { Composed } from "./compose-reading.ts";
import { correctedValue } from "./corrected-value.ts";
import { derivedFromDescribed } from "./derived-from-described.ts";
import type { DescribedDraft } from "./reading-draft.ts";
import type { ReadingInstrument } from "./reading-instrument.ts";
import { readNumber, type NumberRule } from "./read-number.ts";

/** A reading of a described test: every field by its own rule, then those by which fields bear on each other, then what follows. */
export function composeDescribed({ kind, quality, typed }: DescribedDraft & { quality: ReadingQuality }, instrument: ReadingInstrument | null): Composed {
  const { fields } = testForms[kind];
  const problems: Record<string, string[]> = {};
  const refuse = (field: string, message: string) => void (problems[field] ??= []).push(message);
  const values: ReadingValue[] = [];
  const isEmpty = quality === "noResult";
  const parts = Object.fromEntries(
    fields.flatMap((field): Array<[string, unknown]> => {
      if (field.type === "number") {
        const text = textOf(typed[field.name]);
        if (!isEmpty && (field.isRequired || text.trim() !== "")) {
          const rule = ruleOf(field, instrument);
          const value = readNumber(text, rule, instrument);
          if (typeof value === "string") refuse(field.name, value);
          else values.push(correctedValue(value, text, rule, instrument));
        }
        return [];
      }
      const { part, problem } = readPart(field, typed[field.name], isEmpty);
      if (problem) refuse(field.name, problem);
      return [[field.name, part]];
    }),
  );
  const detail = { kind, ...parts } as DescribedDetail;
  if (!isEmpty && Object.keys(problems).length === 0) checkDescribed(detail, values, refuse);
  if (Object.keys(problems).length > 0) return { problems };
  return { reading: { detail, quality, values: isEmpty ? values : [...values, ...derivedFromDescribed(detail, values)] } };
}

const textOf = (entry: string | readonly string[] | undefined): string => (typeof entry === "string" ? entry : (entry?.[0] ?? ""));

function ruleOf(field: Extract<TestField, { type: "number" }>, instrument: ReadingInstrument | null): NumberRule {
  const own = field.isReadOnInstrument ? instrument?.standardUncertainty : null;
  return { ...field, name: field.name as ReadingValueName, u: own ?? field.u };
}

/** A choice, ticks or words; nothing is asked of them where there is no reading. */
function readPart(field: Exclude<TestField, { type: "number" }>, entry: string | readonly string[] | undefined, isEmpty: boolean): { part: unknown; problem?: string } {
  switch (field.type) {
    case "choice": {
      const chosen = textOf(entry);
      if (chosen === "") return { part: null, problem: field.isRequired && !isEmpty ? (field.refusal ?? `Choose: ${field.label.toLowerCase()}.`) : undefined };
      return Object.hasOwn(field.options, chosen) ? { part: chosen } : { part: null, problem: "Choose from the list." };
    }
    case "many": {
      const chosen = [...new Set(typeof entry === "string" ? [entry] : (entry ?? []))].filter((code) => code !== "");
      const known = Object.keys(field.options).filter((code) => chosen.includes(code));
      return { part: known, problem: known.length < chosen.length ? "Choose from the list." : undefined };
    }
    case "tick":
      return { part: textOf(entry) === "on" };
    case "words": {
      const text = plainText(textOf(entry));
      if (text.length > field.most) return { part: "", problem: `At most ${field.most} characters; this is ${text.length}.` };
      return { part: text, problem: text === "" && field.isRequired && !isEmpty ? (field.refusal ?? `Write ${field.label.toLowerCase()}.`) : undefined };
    }
  }
}
