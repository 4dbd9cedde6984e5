import { z } from "zod";

const reason = z.string({ error: "Say why." }).trim().min(3, "Say why, in a few words.").max(300, "The reason is longer than 300 characters.");

/** What can be done to an invoice from its page; `intent` is the button pressed. */
export const invoiceAction = z.discriminatedUnion("intent", [
  z.object({ intent: z.literal("send") }),
  z.object({
    intent: z.literal("take"),
    method: z.enum(["cash", "transfer"], { error: "Choose how it was paid." }),
    reference: z.string({ error: "Give the till's or the bank's reference." }).trim().min(1, "Give the till's or the bank's reference.").max(100, "The reference is longer than 100 characters."),
  }),
  z.object({ intent: z.literal("void"), reason }),
  z.object({ intent: z.literal("refund"), reason }),
]);
