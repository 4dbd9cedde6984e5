import { z } from "zod";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import type { UserId } from "#app/domain/ids.ts";
import { isTicked, optionalText, requestIdField, requiredText } from "#app/features/form-fields.server.ts";
import { massProblem } from "#app/features/take-ins/take-in-limits.ts";

export const handOverPurposes = ["toBench", "toSafe", "toOutside", "fromOutside"] as const;

const optionalMass = {
  massText: optionalText(24),
  massUnit: z.enum(["ct", "g"], { error: "Choose carats or grams." }),
};

function refuseBadMass({ massText, massUnit }: { massText: string; massUnit: "ct" | "g" }, issues: z.core.$RefinementCtx): void {
  const problem = massText === "" ? undefined : massProblem({ massText, massUnit });
  if (problem) issues.addIssue({ code: "custom", path: ["massText"], message: problem });
}

export const handOverForm = z
  .object({
    requestId: requestIdField<"custodyEvent">(),
    itemNumber: z.string({ error: "Choose the item." }).max(24),
    purpose: z.enum(handOverPurposes, { error: "Choose where the item goes." }),
    toPlace: requiredText(120, "Say where it goes."),
    holder: z
      .string()
      .max(40)
      .optional()
      .transform((ref) => (ref ? (idFromShortRef<"user">(ref) as UserId | undefined) : undefined)),
    ...optionalMass,
    seal: optionalText(60),
    remark: optionalText(400),
  })
  .superRefine(refuseBadMass);

export const releaseForm = z
  .object({
    requestId: requestIdField<"custodyEvent">(),
    itemNumber: z.string({ error: "Choose the item." }).max(24),
    collectedBy: requiredText(120, "Write who collects it."),
    idSeen: requiredText(120, "Say what was seen to know them by: a passport, the receipt, known to us."),
    ...optionalMass,
    isConditionAgreed: isTicked(),
    seal: optionalText(60),
    remark: optionalText(200),
  })
  .superRefine(refuseBadMass);

export type HandOver = z.output<typeof handOverForm>;
export type Release = z.output<typeof releaseForm>;
