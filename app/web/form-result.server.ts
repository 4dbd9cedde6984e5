import type { Submission, SubmissionResult } from "@conform-to/react";
import { data } from "react-router";
import { AppError } from "#app/domain/app-error.ts";

/** Input that the form's schema refuses: 400, messages by field, and what was typed. */
export function formInvalid<T>(submission: Submission<T, string[]>, { hideFields = [] as string[] } = {}) {
  // A request to add or remove a row is not a failure.
  const isIntent = submission.status === undefined;
  return data({ result: submission.reply({ hideFields }) as SubmissionResult<string[]> }, { status: isIntent ? 200 : 400 });
}

/** A planned refusal becomes a sentence above the form or beside its fields; anything else is a bug and flies on. */
export function formRefused<T>(submission: Submission<T, string[]>, error: unknown, { hideFields = [] as string[] } = {}) {
  if (!(error instanceof AppError)) throw error;
  const fieldErrors = Object.fromEntries(Object.entries(error.fieldErrors).map(([field, messages]) => [field, [...messages]]));
  const hasFields = Object.keys(fieldErrors).length > 0;
  const result = submission.reply({ hideFields, fieldErrors, formErrors: hasFields ? [] : [error.userMessage] });
  return data(
    { result: result as SubmissionResult<string[]> },
    { status: error.status, headers: error.retryAfterS === null ? {} : { "Retry-After": String(error.retryAfterS) } },
  );
}
