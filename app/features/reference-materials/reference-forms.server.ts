import { z } from "zod";
import { isCalendarDate } from "#app/domain/calendar-date.ts";
import { instrumentKinds } from "#app/domain/instrument-kind.ts";
import { scaleUnits, scaleUnitsOf } from "#app/domain/instrument-scale.ts";
import { isTicked, optionalText, requestIdField, requiredText, versionField } from "#app/features/form-fields.server.ts";
import { optionalNumber } from "#app/features/instruments/instrument-forms.server.ts";

const largest = 1_000_000;
const fields = {
  name: requiredText(120, "Write the name on its label, with which of its values it is: “Quartz Q1, ordinary ray”."),
  forKind: z.enum(instrumentKinds, { error: "Choose what kind of instrument it checks." }),
  unit: z.enum(scaleUnits, { error: "Choose the unit from the list." }).optional().transform((unit) => unit ?? null),
  nominalValue: optionalNumber("its value", { min: -largest, max: largest }),
  standardUncertainty: optionalNumber("the standard uncertainty", { min: 0, max: largest }),
  limitValue: optionalNumber("how far an instrument may be off", { min: 0, max: largest }),
  expectedText: optionalText(200),
  source: requiredText(300, "Say where its value is from: a certificate with its date, or the literature."),
  condition: optionalText(300),
  conditionSeenOn: z.string().optional().refine((text) => !text || isCalendarDate(text), "Write the day as a date.").transform((text) => text || null),
};

type Filled = { forKind: (typeof instrumentKinds)[number]; unit: (typeof scaleUnits)[number] | null; nominalValue: number | null; limitValue: number | null; expectedText: string };

/** A kind with a scale has a value and a limit in its unit; one that the eye judges has what is to be seen. */
function fits({ forKind, unit, nominalValue, limitValue, expectedText }: Filled, issues: z.core.$RefinementCtx): void {
  const refuse = (field: string, message: string) => issues.addIssue({ code: "custom", path: [field], message });
  const units = scaleUnitsOf[forKind];
  if (units.length === 0) {
    if (nominalValue !== null) refuse("nominalValue", "Instruments of this kind have no scale: leave this empty, and write what is to be seen.");
    if (expectedText === "") refuse("expectedText", "Write what is to be seen with it.");
    return;
  }
  if (nominalValue === null) refuse("nominalValue", "Write its value.");
  if (limitValue === null) refuse("limitValue", "Write how far an instrument may be off.");
  if (unit !== null && !units.includes(unit)) refuse("unit", "Instruments of this kind are not read in this unit.");
}

/** The usual unit of the kind where none was chosen. */
const withUnit = <Input extends Filled>(input: Input): Input => ({ ...input, unit: scaleUnitsOf[input.forKind].length === 0 ? null : (input.unit ?? scaleUnitsOf[input.forKind][0]!) });

export const addReferenceForm = z.object({ requestId: requestIdField<"referenceMaterial">(), ...fields }).superRefine(fits).transform(withUnit);
export const editReferenceForm = z.object({ version: versionField(), ...fields, isRetired: isTicked() }).superRefine(fits).transform(withUnit);

export type ReferenceDetails = Omit<z.output<typeof addReferenceForm>, "requestId">;
export type ReferenceEdit = z.output<typeof editReferenceForm>;
