import { z } from "zod";
import { confidences, limitCodes, natures, treatmentCodes, treatmentExtents, treatmentStatuses } from "#app/domain/conclusion.ts";
import { optionalLines, optionalText, requestIdField, requiredText, versionField } from "#app/features/form-fields.server.ts";

const treatment = z
  .object({
    code: z.enum(treatmentCodes, { error: "There is no such treatment in the list." }),
    status: z.enum(treatmentStatuses, { error: "Choose what can be said of this treatment." }).optional(),
    extent: z.enum(treatmentExtents, { error: "Choose the extent from the list." }).optional(),
    evidence: optionalText(300),
  })
  .superRefine(({ status, extent, evidence }, issues) => {
    if (!status && (extent || evidence)) issues.addIssue({ code: "custom", path: ["status"], message: "Choose what can be said of this treatment, or clear its evidence." });
    if ((status === "detected" || status === "indications") && evidence === "") issues.addIssue({ code: "custom", path: ["evidence"], message: "Write what was seen of it." });
  });

const rejected = z.object({ name: optionalText(120), because: optionalText(300) }).superRefine(({ name, because }, issues) => {
  if (name !== "" && because === "") issues.addIssue({ code: "custom", path: ["because"], message: "Write what speaks against it." });
  if (name === "" && because !== "") issues.addIssue({ code: "custom", path: ["name"], message: "Name the alternative." });
});

export const conclusionForm = z.object({
  requestId: requestIdField<"conclusion">(),
  version: versionField(),
  speciesName: requiredText(120, "Name the species, or write what can be said of it."),
  variety: optionalText(120),
  nature: z.enum(natures, { error: "Choose the nature, or that it is not determined." }),
  natureEvidence: optionalLines(1000),
  confidence: z.enum(confidences, { error: "Choose how sure the conclusion is." }),
  treatments: z
    .array(treatment)
    .max(treatmentCodes.length * 2)
    .optional()
    .transform((findings = []) => findings.flatMap(({ code, status, extent, evidence }) => (status ? [{ code, status, extent: extent ?? null, evidence }] : []))),
  evidence: optionalLines(2000),
  limits: z.array(z.enum(limitCodes, { error: "Choose limits from the list." })).optional().transform((limits = []) => limits),
  rejected: z
    .array(rejected)
    .max(12)
    .optional()
    .transform((alternatives = []) => alternatives.filter(({ name }) => name !== "")),
  contradictionsExplained: optionalLines(2000),
  description: z.object({
    shape: optionalText(80),
    cut: optionalText(80),
    transparency: optionalText(80),
    colour: optionalText(120),
    colourLight: optionalText(80),
    phenomenon: optionalText(120),
    condition: optionalText(300),
  }),
  reasoning: optionalLines(8000),
});
export type ConclusionInput = z.output<typeof conclusionForm>;
