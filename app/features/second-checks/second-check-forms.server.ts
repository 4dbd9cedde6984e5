import { z } from "zod";
import { natures } from "#app/domain/conclusion.ts";
import { optionalLines, requestIdField, requiredText } from "#app/features/form-fields.server.ts";

export const startCheckForm = z.object({ intent: z.literal("start"), requestId: requestIdField<"secondCheck">() });
export const compareCheckForm = z.object({
  intent: z.literal("compare"),
  ownSpecies: requiredText(120, "Write which species you found, or “not determined”."),
  ownNature: z.enum(natures, { error: "Choose the nature, or that it is not determined." }),
});
export const decideCheckForm = z
  .object({
    intent: z.literal("decide"),
    outcome: z.enum(["agreed", "returned"], { error: "Choose whether you agree." }),
    reason: optionalLines(1000),
  })
  .refine(({ outcome, reason }) => outcome === "agreed" || reason !== "", { path: ["reason"], error: "Say why the stone goes back: the examiner reads it." });
