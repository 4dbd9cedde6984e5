import { parseWithZod } from "@conform-to/zod/v4";
import type { z } from "zod";

/** Parses as a route does: through form data, where an empty field is a missing one. */
export function parseForm<Schema extends z.ZodType>(schema: Schema, fields: Record<string, string | readonly string[]>): { status: string | undefined; value: z.output<Schema> | undefined; error: Record<string, string[] | null> | null | undefined } {
  const formData = new FormData();
  for (const [name, value] of Object.entries(fields)) for (const one of typeof value === "string" ? [value] : value) formData.append(name, one);
  const submission = parseWithZod(formData, { schema });
  return submission.status === "success" ? { status: "success", value: submission.value as z.output<Schema>, error: undefined } : { status: submission.status, value: undefined, error: submission.error as Record<string, string[] | null> | null | undefined };
}
