import { z } from "zod";
import { optionalText, requestIdField, requiredText } from "#app/features/form-fields.server.ts";

export const spectrumForm = z.discriminatedUnion("intent", [
  z.object({
    intent: z.literal("add"),
    requestId: requestIdField<"spectrum">(),
    file: z.instanceof(File, { error: "Choose the file of the spectrum first." }),
    xUnit: z.enum(["nm", "um", "1/cm"], { error: "Choose what the first column counts." }),
    yUnit: z.enum(["absorbance", "transmittance", "reflectance", "arbitrary"], { error: "Choose what was measured." }),
    note: optionalText(500),
  }),
  z.object({
    intent: z.literal("withdraw"),
    sequence: z.coerce.number().int().min(1).max(1_000_000),
    reason: requiredText(500, "Say why it does not belong to this stone."),
  }),
], { error: "This form is not known here. Open the page anew." });
