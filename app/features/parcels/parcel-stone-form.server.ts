import { z } from "zod";
import { lights, spotMethods } from "#app/domain/reading.ts";
import { mostParcelRows } from "#app/domain/parcel.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";

const instrument = z.string().optional().transform((ref, issues) => {
  if (!ref) return null;
  const id = idFromShortRef<"instrument">(ref);
  if (id) return id;
  issues.addIssue({ code: "custom", message: "Choose an instrument of this laboratory." });
  return z.NEVER;
});

/** How a row's figures were read, and which row becomes a stone. */
export const parcelStoneForm = z.object({
  position: z.coerce.number({ error: "There is no such row." }).int("There is no such row.").min(1, "There is no such row.").max(mostParcelRows, "There is no such row."),
  refractometer: instrument,
  balance: instrument,
  polariscope: instrument,
  light: z.enum(lights, { error: "Choose the light." }).optional().transform((light) => light ?? "sodium"),
  spotMethod: z.enum(spotMethods, { error: "Choose how the spots were read." }).optional().transform((method) => method ?? "50/50"),
  directionsTried: z
    .string()
    .optional()
    .transform((text, issues) => {
      if (!text?.trim()) return null;
      const count = Number(text);
      if (Number.isInteger(count) && count >= 1 && count <= 12) return count;
      issues.addIssue({ code: "custom", message: "Write in how many directions each was turned, from 1 to 12." });
      return z.NEVER;
    }),
});

export const parcelItemForm = z.object({ itemNumber: z.string({ error: "Write the number of the item." }).max(24, "At most 24 characters.") });
