import type { SubmissionResult } from "@conform-to/react";

/** The answer to one of several forms on a page, told apart by the hidden values it sent. */
export function resultFor(result: SubmissionResult<string[]> | undefined, sent: Readonly<Record<string, string>>): SubmissionResult<string[]> | undefined {
  const typed = result?.initialValue;
  return typed && Object.entries(sent).every(([name, value]) => typed[name] === value) ? result : undefined;
}
