import { data, type RouterContextProvider } from "react-router";
import type { Operation } from "#app/domain/permissions.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { labContext } from "./contexts.server.ts";

/** Who acts, before what they sent is read: somebody without the role is told so, whatever is in the form. The feature asks again. */
export function labContextFor(context: Readonly<RouterContextProvider>, operation: Operation): LabContext {
  const ctx = context.get(labContext);
  try {
    requireRole(ctx, operation);
  } catch (error) {
    if (error instanceof AppError) throw data({ userMessage: error.userMessage }, { status: error.status });
    throw error;
  }
  return ctx;
}
