import { z } from "zod";
import { emailField, newLaboratoryFields, prefixField, slugField } from "#app/features/laboratories/laboratory-forms.server.ts";
import { longestPassword } from "./password-length.ts";

const name = z.string({ error: "Give your name." }).trim().min(1, "Give your name.").max(120, "At most 120 characters.");
/** Length and commonness are judged where the person's words are known; here only what no password can be. Never trimmed. */
const newPassword = z.string({ error: "Choose a password." }).max(longestPassword * 2, `At most ${longestPassword} characters are kept.`);
const currentPassword = z.string({ error: "Give your password." }).max(longestPassword * 2, "This is longer than any password here.");

export const signInForm = z.object({ email: emailField, password: currentPassword });
export const signUpForm = z.object({ name, email: emailField, password: newPassword, requestId: z.uuid(), ...newLaboratoryFields });
export const openLaboratoryForm = z.object(newLaboratoryFields);
export const confirmForm = z.object({ slug: slugField, prefix: prefixField });
export const forgotPasswordForm = z.object({ email: emailField, requestId: z.uuid() });
export const newPasswordForm = z.object({ password: newPassword });
export const acceptInvitationForm = z.discriminatedUnion("intent", [z.object({ intent: z.literal("join") }), z.object({ intent: z.literal("newAccount"), name, password: newPassword })]);
export const accountForm = z.discriminatedUnion("intent", [
  z.object({ intent: z.literal("rename"), name }),
  z.object({ intent: z.literal("changePassword"), currentPassword, password: newPassword }),
  z.object({ intent: z.literal("endSession"), sessionId: z.string() }),
  z.object({ intent: z.literal("endOthers") }),
  z.object({ intent: z.literal("endAll") }),
]);
