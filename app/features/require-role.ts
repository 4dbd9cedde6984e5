import { AppError } from "#app/domain/app-error.ts";
import { isAllowed, type Operation } from "#app/domain/permissions.ts";
import type { LabContext } from "./lab-context.ts";

/** @throws AppError forbidden when none of the member's roles may do this */
export function requireRole(ctx: Pick<LabContext, "roles">, operation: Operation): void {
  if (!isAllowed(ctx.roles, operation)) {
    throw new AppError("forbidden", "Your role in this laboratory does not include this. Ask an owner if it should.");
  }
}
