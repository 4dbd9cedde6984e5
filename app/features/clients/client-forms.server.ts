import { z } from "zod";
import { optionalLines, optionalText, requestIdField, requiredText, versionField } from "#app/features/form-fields.server.ts";

const addressShape = z.array(z.string().max(120)).max(6);
const emailShape = z.email();

/** An address as on an envelope. */
export const addressLinesField = optionalLines(600).transform((text, issues) => {
  const lines = text.split("\n").map((line) => line.trim()).filter(Boolean);
  if (!addressShape.safeParse(lines).success) issues.addIssue({ code: "custom", message: "At most six lines of 120 characters." });
  return lines;
});

export const emailField = optionalText(254).transform((text, issues) => {
  if (text !== "" && !emailShape.safeParse(text).success) issues.addIssue({ code: "custom", message: "This is not an e-mail address." });
  return text;
});

const details = {
  name: requiredText(120, "Write the client's name."),
  contactName: optionalText(120),
  email: emailField,
  phone: optionalText(40),
  addressLines: addressLinesField,
  note: optionalLines(2000),
};

export const createClientForm = z.object({ requestId: requestIdField<"client">(), ...details });
export const updateClientForm = z.object({ version: versionField(), ...details });
export const grantTermsForm = z.object({ terms: z.enum(["prepaid", "account"], { error: "Choose the terms." }), version: versionField() });
export const inviteClientForm = z.object({ requestId: requestIdField<"emailToken">() });

export type ClientDetails = Omit<z.output<typeof createClientForm>, "requestId">;
