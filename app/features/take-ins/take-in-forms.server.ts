import { z } from "zod";
import { isCalendarDate } from "#app/domain/calendar-date.ts";
import { consentCodes } from "#app/domain/consent-code.ts";

import type { ClientId, InstrumentId } from "#app/domain/ids.ts";
import { parseAmount } from "#app/domain/money/parse-amount.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";
import { parseDecimal } from "#app/domain/decimal.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { capacities, mountStates, returnMethods } from "#app/domain/take-in.ts";
import { typedDecimal } from "#app/domain/typed-decimal.ts";
import { addressLinesField, emailField } from "#app/features/clients/client-forms.server.ts";
import { isTicked, optionalLines, optionalText, requestIdField, requiredText } from "#app/features/form-fields.server.ts";
import { largestDeclared, massProblem, notAMass, mostItems, stoneCountProblem } from "./take-in-limits.ts";
import { neutralWordsMessage } from "./neutral-words.ts";

function neutral(text: string, issues: z.core.$RefinementCtx<string>): string {
  const message = neutralWordsMessage(text);
  if (message) issues.addIssue({ code: "custom", message });
  return text;
}

export const massText = z.string({ error: "Write the weight that the balance shows." }).max(24, "At most 24 characters.");
export const massUnit = z.enum(["ct", "g"], { error: "Choose carats or grams." });

const item = (currency: CurrencyCode) =>
  z
    .object({
      description: requiredText(300, "Describe what is seen.").transform(neutral),
      mount: z.enum(mountStates, { error: "Choose loose, mounted or strung." }),
      stoneCount: z
        .string({ error: "Count the stones." })
        .transform((text, issues) => {
          const count = /^\s*\d{1,9}\s*$/.test(text) ? Number(text) : Number.NaN;
          if (!Number.isInteger(count)) {
            issues.addIssue({ code: "custom", message: "Write the count as a whole number, for example 1." });
            return z.NEVER;
          }
          return count;
        }),
      // Said here too, because what spans several fields is judged only when each of them is in order.
      massText: massText.refine((text) => parseDecimal(text) !== undefined, notAMass),
      massUnit,
      balanceId: z.string({ error: "Choose the balance." }).transform((ref, issues) => {
        const id = idFromShortRef<"instrument">(ref);
        if (!id) {
          issues.addIssue({ code: "custom", message: "Choose the balance." });
          return z.NEVER;
        }
        return id as InstrumentId;
      }),
      condition: requiredText(1000, "Say what condition it is in; if nothing is seen, write “none seen with 10×”.").transform(neutral),
      declaredValue: z
        .string()
        .max(40, "At most 40 characters.")
        .optional()
        .transform((text, issues) => {
          if (!text?.trim()) return null;
          const amountMinor = parseAmount(text.replace(new RegExp(`\\s*${currency}\\s*$`, "i"), ""), currency);
          if (amountMinor === undefined || amountMinor > largestDeclared) {
            issues.addIssue({ code: "custom", message: amountMinor === undefined ? `Write the amount in ${currency}, for example 6500.00.` : "This is more than can be entered." });
            return z.NEVER;
          }
          return amountMinor;
        }),
      consents: z.array(z.enum(consentCodes, { error: "This is none of the consents." })).max(consentCodes.length).default([]),
      seal: optionalText(60),
    })
    .superRefine((input, issues) => {
      const count = stoneCountProblem(input);
      if (count) issues.addIssue({ code: "custom", path: ["stoneCount"], message: count });
      const mass = massProblem(input);
      if (mass) issues.addIssue({ code: "custom", path: ["massText"], message: mass });
    })
    .transform((input) => ({ ...input, massText: typedDecimal(input.massText) }));

export function takeInForm({ currency }: { currency: CurrencyCode }) {
  return z
    .object({
      requestId: requestIdField(),
      clientName: optionalText(120),
      /** A client's reference, or "new". */
      client: z.string().max(40).optional(),
      newClientEmail: emailField,
      newClientPhone: optionalText(40),
      newClientAddress: addressLinesField,
      handedOverBy: requiredText(120, "Write who hands the goods over."),
      capacity: z.enum(capacities, { error: "Choose in what capacity they act." }),
      returnMethod: z.enum(returnMethods, { error: "Choose how the goods go back." }),
      clientStatements: optionalLines(4000),
      dueOn: z.string({ error: "Choose the day it is due." }).refine(isCalendarDate, "Write the day it is due as a date."),
      place: requiredText(120, "Say where the goods are put."),
      isValuationWanted: isTicked(),
      isFeeAgreed: isTicked().refine((agreed) => agreed, "Agree the fee with the client before anything is examined."),
      limitOverrideNote: optionalText(500),
      items: z
        .array(item(currency), { error: "Enter at least one item." })
        .min(1, "Enter at least one item.")
        .max(mostItems, `At most ${mostItems} items at a time: take the others in separately.`),
    })
    .transform(({ client, clientName, newClientEmail, newClientPhone, newClientAddress, ...input }, issues) => {
      const chosen = chooseClient({ client, clientName, newClientEmail, newClientPhone, newClientAddress });
      if (typeof chosen === "string") {
        issues.addIssue({ code: "custom", path: ["clientName"], message: chosen });
        return z.NEVER;
      }
      return { ...input, client: chosen };
    });
}

function chooseClient(typed: { client: string | undefined; clientName: string; newClientEmail: string; newClientPhone: string; newClientAddress: string[] }) {
  if (typed.client && typed.client !== "new") {
    const id = idFromShortRef<"client">(typed.client) as ClientId | undefined;
    return id ? { id } : "Choose the client from the list.";
  }
  if (typed.clientName === "") return "Write the client's name.";
  if (typed.client !== "new") return "Choose the client from the list below, or say that it is a new one.";
  return { new: { name: typed.clientName, contactName: "", email: typed.newClientEmail, phone: typed.newClientPhone, addressLines: typed.newClientAddress, note: "" } };
}

