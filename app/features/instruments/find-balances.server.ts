import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { instrumentsWithLastCheck } from "./list-instruments.server.ts";

/** The balances that may be used, with their latest check. */
export async function findBalances(ctx: LabContext) {
  requireRole(ctx, "instruments.read");
  const rows = await instrumentsWithLastCheck(ctx, "balance");
  return rows
    .filter((row) => row.status !== "outOfService")
    .map(({ id, name, lastCheckedAt, isLastCheckPassed, nextDueOn }) => ({ id, ref: shortRef(id), name, lastCheckedAt, isLastCheckPassed, nextDueOn }));
}

export type Balance = Awaited<ReturnType<typeof findBalances>>[number];
