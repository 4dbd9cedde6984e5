import { z } from "zod";
import { isId, type Id } from "#app/domain/ids.ts";

// Control characters are typed by nobody; a line break is one in a field of one line only.
const controls = /[\u0000-\u0008\u000b-\u001f\u007f\u2028\u2029]/;

type TextRules = Readonly<{ max: number; hasLines: boolean; requiredMessage?: string }>;

// One transform, no pipe: the form library turns every empty text into undefined, in front of a pipe's second schema too.
function cleaned({ max, hasLines, requiredMessage }: TextRules) {
  return (typed: string | undefined, issues: z.core.$RefinementCtx<string | undefined>): string => {
    const text = hasLines ? manyLines(typed ?? "") : oneLine(typed ?? "");
    if (requiredMessage && text === "") issues.addIssue({ code: "custom", message: requiredMessage });
    if (text.length > max) issues.addIssue({ code: "custom", message: `At most ${max} characters.` });
    if (controls.test(text)) issues.addIssue({ code: "custom", message: "Remove the characters that cannot be seen." });
    return text;
  };
}

/** One line of text that must be there. */
export function requiredText(max: number, message: string) {
  return z.string({ error: message }).transform(cleaned({ max, hasLines: false, requiredMessage: message }));
}

/** One line of text, or "" where nothing was typed. */
export function optionalText(max: number) {
  return z.string().optional().transform(cleaned({ max, hasLines: false }));
}

/** Several lines of text, or "". */
export function optionalLines(max: number) {
  return z.string().optional().transform(cleaned({ max, hasLines: true }));
}

/** Made by the form's page, so that a form sent twice makes one thing. It becomes the id of what is made. */
export function requestIdField<Noun extends string>() {
  return z
    .string({ error: "This form is not complete. Open it anew and send it again." })
    .refine(isId, "This form is not complete. Open it anew and send it again.")
    .transform((text) => text as Id<Noun>);
}

/** The version of a row that the form was filled from. */
export function versionField() {
  return z.coerce.number({ error: "This form is not complete. Open it anew and send it again." }).int().min(1).max(2_147_483_647);
}

export function isTicked() {
  return z
    .literal("on")
    .optional()
    .transform((value) => value === "on");
}

function oneLine(text: string): string {
  return text.normalize("NFC").replace(/[\r\n\t ]+/g, " ").trim();
}

function manyLines(text: string): string {
  return text.replace(/\r\n?/g, "\n").normalize("NFC").trim();
}
