import { z } from "zod";
import { parseDecimal } from "#app/domain/decimal.ts";
import { currencyCodes, type CurrencyCode } from "#app/domain/money/money.ts";
import { parseAmount } from "#app/domain/money/parse-amount.ts";
import { roles } from "#app/domain/roles.ts";
import { serviceCodes, serviceNames } from "#app/domain/take-in.ts";

const line = (most: number, what: string) => z.string({ error: `Give ${what}.` }).trim().min(1, `Give ${what}.`).max(most, `At most ${most} characters.`);
const optionalLine = (most: number) => z.string().trim().max(most, `At most ${most} characters.`).default("");
export const emailField = z
  .string({ error: "Give an e-mail address." })
  .trim()
  .max(254, "This address is longer than an e-mail address can be.")
  .pipe(z.email("This is not an e-mail address: it has a name, an @ and a domain, as in desk@example.org."));

const timeZones = new Set([...Intl.supportedValuesOf("timeZone"), "UTC"]);
const timeZone = z.string({ error: "Choose the time zone." }).refine((zone) => timeZones.has(zone), "Choose a time zone from the list.");

/** "sole" or "laboratory" as a radio button sends it. */
const practice = z.enum(["laboratory", "sole"], { error: "Choose one of the two." });

export const slugField = z
  .string({ error: "Choose a short name." })
  .trim()
  .toLowerCase()
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, "Small letters a–z, digits and single hyphens only.")
  .min(3, "At least 3 characters.")
  .max(40, "At most 40 characters.");
export const prefixField = z
  .string({ error: "Choose the letters that lead your numbers." })
  .trim()
  .toUpperCase()
  .regex(/^[A-Z][A-Z0-9]{1,5}$/, "2 to 6 letters A–Z or digits, a letter first.");

export const newLaboratoryFields = { laboratoryName: line(120, "the laboratory's name"), slug: slugField, prefix: prefixField, practice, timeZone, currency: z.enum(currencyCodes, { error: "Choose the currency." }) };

/** The fields of a form as `NewLaboratory`. */
export function asNewLaboratory({ laboratoryName, slug, prefix, practice: kind, timeZone: zone, currency }: z.infer<z.ZodObject<typeof newLaboratoryFields>>) {
  return { name: laboratoryName, slug, prefix, isSolePractice: kind === "sole", timeZone: zone, currency };
}

const whole = (most: number, sentence: string) =>
  z
    .string({ error: sentence })
    .trim()
    .regex(/^\d{1,6}$/, sentence)
    .transform(Number)
    .refine((value) => value <= most, sentence);

export function laboratorySettingsForm(currency: CurrencyCode) {
  return z
    .object({
      name: line(120, "the laboratory's name"),
      address: z
        .string({ error: "Give the address that is printed on reports." })
        .transform((text) => text.split(/\r?\n/).map((part) => part.trim()).filter(Boolean))
        .refine((lines) => lines.length > 0, "Give the address that is printed on reports.")
        .refine((lines) => lines.length <= 6 && lines.every((part) => part.length <= 80), "At most six lines of 80 characters each."),
      phone: optionalLine(40),
      email: z.union([z.literal(""), emailField]).default(""),
      timeZone,
      practice,
      taxLabel: line(40, "the name of the tax, as invoices print it"),
      taxPercent: z
        .string({ error: "Give the rate in percent; 0 where there is none." })
        .transform((text, context) => {
          const percent = parseDecimal(text);
          const shareE4 = percent === undefined ? undefined : Math.round(percent * 100);
          if (percent === undefined || shareE4 === undefined || percent < 0 || percent > 50 || Math.abs(shareE4 - percent * 100) > 1e-6) {
            context.addIssue("A rate from 0 to 50 percent, with at most two decimals.");
            return z.NEVER;
          }
          return shareE4;
        }),
      usualDays: whole(365, "A whole number of days, at most 365.").refine((days) => days >= 1, "At least one day."),
      selfCheckDelayHours: whole(720, "A whole number of hours from 24 to 720.").refine((hours) => hours >= 24, "At least 24 hours: a self-check is made with fresh eyes."),
      custodyLimit: z
        .string()
        .default("")
        .transform((text, context) => {
          if (text.trim() === "") return null;
          const amountMinor = parseAmount(text, currency);
          if (amountMinor === undefined || amountMinor <= 0) {
            context.addIssue(`An amount in ${currency}, as in 250000; or leave it empty where the insurer sets no limit.`);
            return z.NEVER;
          }
          return amountMinor;
        }),
      version: z.coerce.number().int().positive(),
    })
    .transform(({ address, practice: kind, taxPercent, custodyLimit, ...rest }) => ({ ...rest, addressLines: address, isSolePractice: kind === "sole", taxShareE4: taxPercent, custodyLimitMinor: custodyLimit }));
}
export type LaboratorySettings = z.infer<ReturnType<typeof laboratorySettingsForm>>;

const roleBoxes = z.array(z.enum(roles)).min(1, "Choose at least one role.").default([]).refine((held) => held.length > 0, "Choose at least one role.");
const roleList = z
  .string()
  .default("")
  .transform((text) => roles.filter((role) => text.split(",").includes(role)));

export const teamForm = z.discriminatedUnion("intent", [
  z.object({ intent: z.literal("invite"), requestId: z.uuid(), name: line(120, "the person's name"), email: emailField, title: optionalLine(120), roles: roleBoxes }),
  z.object({ intent: z.literal("setRoles"), userId: z.uuid(), title: optionalLine(120), roles: roleBoxes, rolesBefore: roleList, titleBefore: z.string().default("") }),
  z.object({ intent: z.literal("end"), userId: z.uuid() }),
  z.object({ intent: z.literal("withdraw"), invitationId: z.string() }),
]);

/** One form for the whole list; its fields are named after the service: "identification-amount". */
export function pricesForm(currency: CurrencyCode) {
  const amount = z.string({ error: "Give the fee." }).transform((text, context) => {
    const amountMinor = parseAmount(text, currency);
    if (/%/.test(text)) context.addIssue("A fixed amount, no percentage: a fee never depends on a value.");
    else if (amountMinor === undefined) context.addIssue(`An amount in ${currency}, as in 85 or 85,50.`);
    else if (amountMinor > 100_000_00) context.addIssue("More than a fee can be. Check the amount.");
    else return amountMinor;
    return z.NEVER;
  });
  return z
    .object({
      before: z.string(),
      ...Object.fromEntries(serviceCodes.flatMap((service) => [[`${service}-label`, line(120, `what invoices call it, as in “${serviceNames[service]}”`)], [`${service}-active`, z.literal("on").optional()]])),
      ...Object.fromEntries(serviceCodes.map((service) => [`${service}-amount`, amount])),
    })
    .transform((fields) => {
      const typed = fields as unknown as Record<string, string | number | undefined> & { before: string };
      return {
        before: typed.before,
        changes: serviceCodes.map((service) => ({
          service,
          label: String(typed[`${service}-label`]),
          amountMinor: Number(typed[`${service}-amount`]),
          isActive: typed[`${service}-active`] === "on",
        })),
      };
    });
}
