import { z } from "zod";
import { isCalendarDate } from "#app/domain/calendar-date.ts";
import { parseDecimal } from "#app/domain/decimal.ts";
import { currencyCodes } from "#app/domain/money/money.ts";
import { parseAmount } from "#app/domain/money/parse-amount.ts";
import { certificationPoints, comparableKinds, marketLevels, valueTypes } from "#app/domain/valuation.ts";

const line = (label: string, most: number) =>
  z.string({ error: `${label} is missing.` }).trim().min(1, `${label} is missing.`).max(most, `${label} is longer than ${most} characters.`);
const optionalLine = (label: string, most: number) => z.string().trim().max(most, `${label} is longer than ${most} characters.`).default("");
const date = (label: string) => z.string({ error: `${label} is missing.` }).refine(isCalendarDate, `${label} is not a date; write it as 2026-12-01.`);
const ticked = z.preprocess((value) => value === "on" || value === true, z.boolean());
const factor = (label: string, { most }: { most: number }) =>
  z
    .string({ error: `${label} is missing.` })
    .transform((text) => parseDecimal(text) ?? Number.NaN)
    .refine((value) => value > 0 && value <= most, `${label} must be a number above 0 and at most ${most}.`);

const comparable = z
  .object({
    kind: z.enum(comparableKinds, { error: "Choose what kind of price this is." }),
    reference: line("The reference", 300),
    onDate: date("The date of the comparable"),
    place: optionalLine("The place", 120),
    description: line("The description", 300),
    amount: z.string({ error: "The price is missing." }),
    currency: z.enum(currencyCodes, { error: "Choose a currency." }),
    exchangeRate: factor("The exchange rate", { most: 100_000 }).default(1),
    isPremiumIncluded: ticked,
    isTaxIncluded: ticked,
    isSold: ticked,
    adjustmentFactor: factor("The adjustment", { most: 100 }).default(1),
    adjustmentReason: optionalLine("The reason", 300),
  })
  .transform((value, context) => {
    const amountMinor = parseAmount(value.amount, value.currency);
    if (amountMinor === undefined || amountMinor <= 0) {
      context.addIssue({ code: "custom", path: ["amount"], message: `Write the price as an amount above nothing in ${value.currency}, for example 1250.00.` });
      return z.NEVER;
    }
    if (value.adjustmentFactor !== 1 && value.adjustmentReason === "") {
      context.addIssue({ code: "custom", path: ["adjustmentReason"], message: "Say why the price is adjusted." });
      return z.NEVER;
    }
    return { ...value, amountMinor };
  });

/** A draft may lack the amount, comparables and certification; signing asks for them. */
export const valuationForm = z
  .object({
    rowVersion: z.coerce.number().int().min(0),
    purpose: line("The purpose", 200),
    intendedUse: line("The intended use", 300),
    intendedUsers: line("The intended users", 300),
    valueType: z.enum(valueTypes, { error: "Choose a value type." }),
    valueDefinition: line("The definition of the value", 4000),
    valueDefinitionSource: line("The source of the definition", 300),
    marketLevel: z.enum(marketLevels, { error: "Choose a market level." }),
    marketPlace: line("The market's place", 120),
    inspection: line("The inspection", 300),
    inspectedOn: z.preprocess((value) => (value === "" ? undefined : value), date("The inspection date").optional()),
    effectiveOn: date("The effective date"),
    currency: z.enum(currencyCodes, { error: "Choose a currency." }),
    amount: z.string().default(""),
    isTaxIncluded: ticked,
    approachReasoning: optionalLine("The reasoning", 8000),
    otherApproachesWhyNot: optionalLine("The note on other approaches", 4000),
    limitingConditions: z.string().max(8000, "The limiting conditions are longer than 8000 characters.").default(""),
    certification: z.array(z.enum(certificationPoints)).default([]),
    priorServices: optionalLine("The note on prior services", 500),
    comparables: z.array(comparable).max(12, "At most twelve comparables fit; keep the closest.").default([]),
  })
  .transform((value, context) => {
    const amountMinor = value.amount.trim() === "" ? null : parseAmount(value.amount, value.currency);
    if (amountMinor === undefined || amountMinor === 0) {
      context.addIssue({ code: "custom", path: ["amount"], message: `Write the value as an amount above nothing in ${value.currency}, for example 12500.00.` });
      return z.NEVER;
    }
    return {
      ...value,
      amountMinor,
      inspectedOn: value.inspectedOn ?? null,
      limitingConditions: value.limitingConditions.split(/\r?\n/).map((text) => text.trim()).filter(Boolean),
    };
  });
export type ValuationInput = z.output<typeof valuationForm>;
