import { z } from "zod";
import { mostRecalled, recallDeeds } from "#app/domain/recall.ts";
import { optionalLines } from "#app/features/form-fields.server.ts";

const oneItem = z.string().transform((text, issues) => {
  const parts = /^([A-Z0-9-]{3,28})\/(\d{1,6})$/.exec(text);
  if (parts) return { stoneCode: parts[1]!, sequence: Number(parts[2]) };
  issues.addIssue({ code: "custom", message: "Choose readings of the list." });
  return z.NEVER;
});

export const recallForm = z
  .object({
    items: z.array(oneItem).max(mostRecalled).optional().transform((items = []) => items),
    deed: z.enum(recallDeeds, { error: "Choose what was done." }),
    reason: optionalLines(1000),
  })
  .superRefine(({ items, deed, reason }, issues) => {
    if (items.length === 0) issues.addIssue({ code: "custom", path: ["items"], message: "Choose the readings that it was done about." });
    if (deed === "accepted" && reason.length < 10) issues.addIssue({ code: "custom", path: ["reason"], message: "Say why these readings can stand although the instrument failed: in a sentence that a colleague could follow." });
  });
