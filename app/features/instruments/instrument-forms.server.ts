import { z } from "zod";
import { decimalPlaces, parseDecimal } from "#app/domain/decimal.ts";
import { typedDecimal } from "#app/domain/typed-decimal.ts";
import { isCalendarDate } from "#app/domain/calendar-date.ts";
import { optionalText, requestIdField, requiredText, versionField } from "#app/features/form-fields.server.ts";
import { instrumentKinds } from "#app/domain/instrument-kind.ts";

/** A number of an instrument in its own unit, or nothing. */
function optionalNumber(label: string, { min, max }: { min: number; max: number }) {
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

function refuse(issues: z.core.$RefinementCtx<string | undefined>, message: string): never {
  issues.addIssue({ code: "custom", message });
  return z.NEVER;
}

const details = {
  kind: z.enum(instrumentKinds, { error: "Choose what kind of instrument it is." }),
  name: requiredText(40, "Write the short name on its label, for example B1."),
  description: optionalText(200),
  serial: optionalText(80),
  location: optionalText(80),
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
export const instrumentCheckForm = z.object({
  requestId: requestIdField<"instrumentCheck">(),
  referenceMaterial: requiredText(120, "Name the reference: a check weight, a piece of quartz."),
  nominal: requiredNumber("the reference's own value", { min: -largest, max: largest }),
  reading: requiredNumber("what the instrument showed", { min: -largest, max: largest }),
  limit: requiredNumber("how far it may be off", { min: 0, max: largest }),
  tempC: optionalNumber("the temperature", { min: -20, max: 60 }).transform((value) => (value === null ? null : Math.round(value * 10) / 10)),
  nextDueOn: z.string({ error: "Choose the day of the next check." }).refine(isCalendarDate, "Write the day of the next check as a date."),
  note: optionalText(500),
});

export type InstrumentDetails = Omit<z.output<typeof registerInstrumentForm>, "requestId">;
export type InstrumentEdit = z.output<typeof editInstrumentForm>;
export type InstrumentCheckInput = z.output<typeof instrumentCheckForm>;
