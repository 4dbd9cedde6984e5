import type { InstrumentKind } from "../instrument-kind.ts";
import type { ConsentCode } from "../consent-code.ts";

/** Words by their code: what is stored, and what is shown. */
type Options = Readonly<Record<string, string>>;
type Common<Name extends string> = Readonly<{ name: Name; label: string; hint?: string; /** How it was seen, rather than what. */ isCondition?: true }>;

export type ChoiceField<Name extends string = string> = Common<Name> & Readonly<{ type: "choice"; options: Options; isRequired: boolean; /** What is said where it is left open. */ refusal?: string }>;
export type ManyField<Name extends string = string> = Common<Name> & Readonly<{ type: "many"; options: Options }>;
export type TickField<Name extends string = string> = Common<Name> & Readonly<{ type: "tick"; /** How a ticked one is told. */ words: string }>;
export type WordsField<Name extends string = string> = Common<Name> & Readonly<{ type: "words"; lines: 1 | 2 | 4; most: number; isRequired: boolean; refusal?: string; example?: string }>;
export type NumberField<Name extends string = string> = Common<Name> &
  Readonly<{
    type: "number";
    /** In a sentence: "the angle". */
    what: string;
    unit: "n" | "deg" | "mm" | "degC" | "cm" | "s" | "x" | "%" | "1";
    min: number;
    max: number;
    mostDecimals: number;
    example: string;
    isRequired: boolean;
    /** Typed as a whole number of steps of nothing finer. */
    isWhole?: true;
    isReadOnInstrument?: true;
    /** Usual standard uncertainty of one reading, in the unit; an instrument's own goes before it where it is read on one. Null: none is stated. */
    u: number | null;
  }>;
export type TestField = ChoiceField | ManyField | TickField | WordsField | NumberField;

/**
 * A test that is told by words, numbers and ticks: its form, its words and its rules are made from this one description.
 * Order is the order of the form; the first field is what the reading says, the others stand beside it.
 */
export type TestForm = Readonly<{
  kind: string;
  name: string;
  /** A key of the keyboard, alone. */
  hotkey: string;
  instrumentKind: InstrumentKind | null;
  /** False where the eye, or what lies about, is enough as well. */
  needsInstrument: boolean;
  evidenceClass: "index" | "character" | "density" | "spectrum" | "seen" | null;
  consent: ConsentCode | null;
  /** What the test may do to the stone or to whoever makes it; shown beside it. */
  caution: string | null;
  fields: readonly TestField[];
}>;

type FieldOf<Form extends TestForm> = Form["fields"][number];
type Named<Form extends TestForm, Type extends TestField["type"]> = Extract<FieldOf<Form>, { type: Type }>;

/** What is kept of a reading, but its numbers. A choice is null where nothing was read. */
export type DetailOf<Form extends TestForm> = Readonly<
  { kind: Form["kind"] } & { [Field in Named<Form, "choice"> as Field["name"]]: Extract<keyof Field["options"], string> | null } & {
    [Field in Named<Form, "many"> as Field["name"]]: ReadonlyArray<Extract<keyof Field["options"], string>>;
  } & { [Field in Named<Form, "tick"> as Field["name"]]: boolean } & { [Field in Named<Form, "words"> as Field["name"]]: string }
>;

/** The names of a test's numbers. */
export type NumberNameOf<Form extends TestForm> = Named<Form, "number">["name"];

export function testForm<const Form extends TestForm>(form: Form): Form {
  return form;
}
