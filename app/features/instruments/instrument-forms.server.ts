import { z } from "zod";
import { decimalPlaces, parseDecimal } from "#app/domain/decimal.ts";
import { typedDecimal } from "#app/domain/typed-decimal.ts";
import { isCalendarDate } from "#app/domain/calendar-date.ts";
import { optionalText, requestIdField, requiredText, versionField } from "#app/features/form-fields.server.ts";
import { instrumentKinds } from "#app/domain/instrument-kind.ts";
import { scaleUnits } from "#app/domain/instrument-scale.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { mostCalibrationChecks } from "./find-calibration.server.ts";

/** A number of an instrument in its own unit, or nothing. */
export function optionalNumber(label: string, { min, max }: { min: number; max: number }) {
  return z
    .string()
    .max(24, "At most 24 characters.")
    .optional()
    .transform((text, issues) => {
      if (!text?.trim()) return null;
      const value = parseDecimal(text);
      if (value === undefined) return refuse(issues, `Write ${label} as a number, for example 0.001.`);
      if (decimalPlaces(text) > 6) return refuse(issues, "At most six decimals.");
      if (value < min || value > max) return refuse(issues, `Between ${min} and ${max}.`);
      return value;
    });
}

function requiredNumber(label: string, { min, max }: { min: number; max: number }) {
  return z.string({ error: `Write ${label}.` }).max(24, "At most 24 characters.").transform((text, issues) => {
    const value = parseDecimal(text);
    if (value === undefined) return refuse(issues, `Write ${label} as a number, for example 1.544.`);
    if (decimalPlaces(text) > 6) return refuse(issues, "At most six decimals.");
    if (value < min || value > max) return refuse(issues, `Between ${min} and ${max}.`);
    return { value, text: typedDecimal(text) };
  });
}

function refuse(issues: Pick<z.core.$RefinementCtx<unknown>, "addIssue">, message: string): never {
  issues.addIssue({ code: "custom", message });
  return z.NEVER;
}

const details = {
  kind: z.enum(instrumentKinds, { error: "Choose what kind of instrument it is." }),
  name: requiredText(40, "Write the short name on its label, for example B1."),
  description: optionalText(200),
  serial: optionalText(80),
  location: optionalText(80),
  scaleUnit: z.enum(scaleUnits, { error: "Choose the unit from the list." }).optional().transform((unit) => unit ?? null),
  checkDays: optionalNumber("the days between checks", { min: 1, max: 3650 }).refine((days) => days === null || Number.isInteger(days), "Whole days."),
  resolution: optionalNumber("the smallest step", { min: 0.000001, max: 1000 }),
  standardUncertainty: optionalNumber("the standard uncertainty", { min: 0.000001, max: 1000 }),
  upperLimit: optionalNumber("the highest index", { min: 1.3, max: 2.1 }),
  prismIndex: optionalNumber("the index of the prism", { min: 1.3, max: 2.7 }),
};

export const registerInstrumentForm = z.object({ requestId: requestIdField<"instrument">(), ...details });
export const editInstrumentForm = z
  .object({
    version: versionField(),
    ...details,
    status: z.enum(["inService", "restricted", "outOfService"], { error: "Choose whether it is in service." }),
    statusReason: optionalText(300),
  })
  .refine((input) => input.status === "inService" || input.statusReason !== "", { path: ["statusReason"], error: "Say why it is not in full service." });

const largest = 1_000_000;
const checkNumber = (label: string, range: { min: number; max: number }) => requiredNumber(label, range).optional().transform((typed) => typed ?? null);

/** A row of the laboratory named in a form; null where none was chosen. */
function rowRef<Noun extends string>(message: string) {
  return z.string().optional().transform((ref, issues) => {
    if (!ref) return null;
    return idFromShortRef<Noun>(ref) ?? refuse(issues, message);
  });
}

export const instrumentCheckForm = z
  .object({
    requestId: requestIdField<"instrumentCheck">(),
    reference: rowRef<"referenceMaterial">("Choose a reference of this laboratory."),
    referenceMaterial: optionalText(120),
    nominal: checkNumber("the reference's own value", { min: -largest, max: largest }),
    reading: checkNumber("what the instrument showed", { min: -largest, max: largest }),
    limit: checkNumber("how far it may be off", { min: 0, max: largest }),
    /** Sent by the form of an instrument without a scale. */
    isSeen: z.literal("on").optional(),
    seenText: optionalText(200),
    outcome: z.enum(["asExpected", "notAsExpected"], { error: "Choose whether it was as it should be." }).optional(),
    tempC: optionalNumber("the temperature", { min: -20, max: 60 }).transform((value) => (value === null ? null : Math.round(value * 10) / 10)),
    nextDueOn: z.string({ error: "Choose the day of the next check." }).refine(isCalendarDate, "Write the day of the next check as a date."),
    note: optionalText(500),
  })
  .superRefine(({ reference, referenceMaterial, nominal, reading, limit, isSeen, seenText, outcome }, issues) => {
    const say = (field: string, message: string) => issues.addIssue({ code: "custom", path: [field], message });
    if (!reference && referenceMaterial === "") say("referenceMaterial", "Choose a reference, or name it: a check weight, a piece of quartz.");
    if (isSeen) {
      if (seenText === "") say("seenText", "Write what was seen.");
      if (!outcome) say("outcome", "Choose whether it was as it should be.");
      return;
    }
    if (!reading) say("reading", "Write what the instrument showed.");
    if (!reference && !nominal) say("nominal", "Write the reference's own value.");
    if (!reference && !limit) say("limit", "Write how far it may be off.");
  })
  .transform(({ reference, isSeen, seenText, outcome, ...rest }) => ({ ...rest, referenceId: reference, seen: isSeen ? { text: seenText, isAsExpected: outcome === "asExpected" } : null }));

const calibrationChoice = {
  checks: z
    .array(z.string())
    .max(mostCalibrationChecks, `At most ${mostCalibrationChecks} checks.`)
    .optional()
    .transform((refs = [], issues) => {
      if (refs.length === 0) return refuse(issues, "Choose the checks that the correction is worked out from.");
      return refs.map((ref) => idFromShortRef<"instrumentCheck">(ref) ?? refuse(issues, "Choose checks of this instrument."));
    }),
  model: z.enum(["offset", "line"], { error: "Choose an offset or a line." }),
};
export const correctionChoiceForm = z.object(calibrationChoice);
export const startCorrectionForm = z.object({ requestId: requestIdField<"instrumentCorrection">(), ...calibrationChoice, reason: requiredText(300, "Say why the readings are corrected from now on.") });
export const endCorrectionForm = z.object({ reason: requiredText(300, "Say why the correction ends.") });

type LaterFields = "scaleUnit" | "checkDays";
type Details<Form> = Omit<Form, LaterFields> & { [Field in LaterFields & keyof Form]?: Form[Field] };
/** Left out, the unit and the interval are the kind's usual ones. */
export type InstrumentDetails = Details<Omit<z.output<typeof registerInstrumentForm>, "requestId">>;
export type InstrumentEdit = Details<z.output<typeof editInstrumentForm>>;
export type { InstrumentCheckInput } from "./record-instrument-check.server.ts";
