import { z } from "zod";
import { withdrawalReasons } from "#app/domain/report-state.ts";

const words = (label: string, most: number) =>
  z.string({ error: `${label} is missing.` }).trim().min(3, `${label} is missing; a few words will do.`).max(most, `${label} is longer than ${most} characters.`);

/** What can be done to a report from its page; `intent` is the button pressed. */
export const reportAction = z.discriminatedUnion("intent", [
  z.object({ intent: z.literal("issue") }),
  z.object({ intent: z.literal("retryPdf") }),
  z.object({ intent: z.literal("withdraw"), reason: z.enum(withdrawalReasons, { error: "Choose the class of reason." }), note: words("The note", 1000) }),
  z.object({ intent: z.literal("amend"), note: words("What has to change", 500) }),
]);

/** The signatory says that they read what they sign. */
export const authoriseForm = z.object({
  isRead: z.literal("on", { error: "Read the draft, and say so here, before you authorise it." }),
});
