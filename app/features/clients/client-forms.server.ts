import { z } from "zod";
import { optionalLines, optionalText, requestIdField, requiredText, versionField } from "#app/features/form-fields.server.ts";

const addressLines = optionalLines(600)
  .transform((text) => text.split("\n").map((line) => line.trim()).filter(Boolean))
  .pipe(z.array(z.string().max(120, "At most 120 characters a line.")).max(6, "At most six lines."));

export const emailField = optionalText(254).pipe(z.union([z.literal(""), z.email("This is not an e-mail address.")]));

const details = {
  name: requiredText(120, "Write the client's name."),
  contactName: optionalText(120),
  email: emailField,
  phone: optionalText(40),
  addressLines,
  note: optionalLines(2000),
};

export const createClientForm = z.object({ requestId: requestIdField<"client">(), ...details });
export const updateClientForm = z.object({ version: versionField(), ...details });
export const grantTermsForm = z.object({ terms: z.enum(["prepaid", "account"], { error: "Choose the terms." }), version: versionField() });

export type ClientDetails = Omit<z.output<typeof createClientForm>, "requestId">;
