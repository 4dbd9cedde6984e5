import { parseWithZod } from "@conform-to/zod/v4";
import { AppError } from "#app/domain/app-error.ts";
import { readingForm, sentStrikeForm } from "#app/features/readings/reading-forms.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import type { Route } from "./+types/sent-readings";

/**
 * Takes one deed that waited on a device for the line: a reading, or a strike. The same forms and rules as at the bench;
 * only the answer is for a script. Sent again it is kept once.
 *
 * Answers 200 where it is kept, now or before; 4xx with a sentence where it is refused for good; anything else: try again.
 */
export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "readings.record");
  const form = await request.formData();
  const answer = (body: object, status = 200) => Response.json(body, { status, headers: { "Cache-Control": "no-store" } });
  try {
    if (form.get("deed") === "strike") {
      const { status, value, error } = parseStrike(form);
      if (status !== "success") return answer({ message: firstOf(error) }, 400);
      await strikeReading(ctx, { stoneCode: params.stoneCode, reason: value.reason, ...value.named });
      return answer({ kept: true });
    }
    const submission = parseWithZod(form, { schema: readingForm });
    if (submission.status !== "success") return answer({ message: firstOf(submission.error) }, 400);
    const { sequence, warnings } = await recordReading(ctx, { ...submission.value, stoneCode: params.stoneCode });
    return answer({ kept: true, sequence, warnings });
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    return answer({ message: Object.values(error.fieldErrors)[0]?.[0] ?? error.userMessage }, error.status);
  }
}

function parseStrike(form: FormData) {
  const submission = parseWithZod(form, { schema: sentStrikeForm });
  return submission.status === "success" ? { status: submission.status, value: submission.value } : { status: "error" as const, error: submission.error };
}

const firstOf = (error: Readonly<Record<string, readonly string[] | null>> | null | undefined): string => Object.values(error ?? {}).find((messages) => messages?.length)?.[0] ?? "This could not be read.";
