import { z } from "zod";
import { cutOutlines } from "#app/domain/cut-outline/cut-outline.ts";
import { inclusionAmounts, inclusionDepths, inclusionTypes, plotSides, type Place } from "#app/domain/inclusion.ts";
import { parseDecimal } from "#app/domain/decimal.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { optionalText, requestIdField, requiredText } from "#app/features/form-fields.server.ts";

/** A share of a picture as it is typed or placed: per cent from 0 to 100; null where nothing is. */
const percent = () =>
  z
    .string()
    .optional()
    .transform((text, issues): number | null => {
      if (!text?.trim()) return null;
      const value = parseDecimal(text);
      if (value === undefined || value < 0 || value > 100) {
        issues.addIssue({ code: "custom", message: "Per cent of the picture, from 0 to 100." });
        return z.NEVER;
      }
      return value / 100;
    });

const photoRef = z
  .string()
  .optional()
  .transform((ref, issues) => {
    if (!ref) return null;
    const id = idFromShortRef<"attachment">(ref);
    if (id === undefined) {
      issues.addIssue({ code: "custom", message: "Choose a photograph of this stone." });
      return z.NEVER;
    }
    return id;
  });

/** A decimal as typed, with its digits; null where nothing was. */
const decimal = ({ least, most, unit, example }: { least: number; most: number; unit: string; example: string }) =>
  z
    .string()
    .optional()
    .transform((text, issues): { value: number; text: string } | null => {
      if (!text?.trim()) return null;
      const value = text.trim().length > 24 ? undefined : parseDecimal(text);
      const message = value === undefined ? `Write it in digits: for example ${example}.` : value < least || value > most ? `From ${least} to ${most} ${unit}.` : undefined;
      if (message || value === undefined) {
        issues.addIssue({ code: "custom", message: message ?? "" });
        return z.NEVER;
      }
      return { value, text: text.trim() };
    });

const place = z
  .object({
    intent: z.literal("place"),
    requestId: requestIdField<"inclusion">(),
    type: z.enum(inclusionTypes, { error: "Choose what it is." }),
    otherText: optionalText(60),
    photo: photoRef,
    photoX: percent(),
    photoY: percent(),
    plotSide: z.enum(plotSides, { error: "Choose the side." }),
    plotX: percent(),
    plotY: percent(),
    depth: z.enum(inclusionDepths, { error: "Choose how deep it lies." }),
    amount: z.enum(inclusionAmounts, { error: "Choose how many there are." }),
    size: decimal({ least: 0.001, most: 100, unit: "mm", example: "0.12" }),
    note: optionalText(500),
  })
  .superRefine((input, issues) => {
    const say = (field: string, message: string) => issues.addIssue({ code: "custom", path: [field], message });
    if (input.type === "other" && input.otherText === "") say("otherText", "Say what it is.");
    if (input.type !== "other" && input.otherText !== "") say("otherText", "A word from the list is chosen already: choose “Other”, or leave this empty.");
    const [isOnPhoto, isOnPlot] = [input.photoX !== null || input.photoY !== null, input.plotX !== null || input.plotY !== null];
    if (isOnPhoto && !input.photo) say("photo", "Choose the photograph that it is placed on.");
    if (isOnPhoto && (input.photoX === null || input.photoY === null)) say(input.photoX === null ? "photoX" : "photoY", "A place on the photograph needs both numbers.");
    if (isOnPlot && (input.plotX === null || input.plotY === null)) say(input.plotX === null ? "plotX" : "plotY", "A place on the outline needs both numbers.");
    if (!isOnPhoto && !isOnPlot) say("plotX", "Place it: on the outline, or on a photograph.");
  })
  .transform(({ photo, photoX, photoY, plotSide, plotX, plotY, ...input }) => ({
    ...input,
    onPhoto: photo && photoX !== null && photoY !== null ? { photoId: photo, at: { x: photoX, y: photoY } satisfies Place } : null,
    onPlot: plotX !== null && plotY !== null ? { side: plotSide, at: { x: plotX, y: plotY } satisfies Place } : null,
  }));

/** The page's forms by what they ask for. */
export const inclusionForms = {
  place,
  strike: z.object({ intent: z.literal("strike"), sequence: z.coerce.number().int().min(1).max(1_000_000), reason: requiredText(500, "Say why it is struck.") }),
  outline: z.object({ intent: z.literal("outline"), outline: z.enum(cutOutlines, { error: "Choose an outline from the list." }) }),
  photo: z.object({
    intent: z.literal("photo"),
    requestId: requestIdField<"attachment">(),
    file: z.instanceof(File, { error: "Choose the photograph first." }),
    magnification: decimal({ least: 1, most: 1000, unit: "×", example: "40" }),
    pictureWidth: decimal({ least: 0.01, most: 500, unit: "mm", example: "4.2" }),
  }),
  scale: z.object({
    intent: z.literal("scale"),
    photo: photoRef,
    magnification: decimal({ least: 1, most: 1000, unit: "×", example: "40" }),
    pictureWidth: decimal({ least: 0.01, most: 500, unit: "mm", example: "4.2" }),
  }),
} as const;
export type InclusionIntent = keyof typeof inclusionForms;
export type InclusionPlacing = z.output<typeof place>;
