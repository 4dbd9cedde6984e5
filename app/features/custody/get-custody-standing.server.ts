import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { custodyStanding, type CustodyStanding } from "./custody-standing.server.ts";

/** For the desk: how much is held, and how much may be. Declared values are not for examiners, nor is their sum. */
export async function getCustodyStanding(ctx: LabContext): Promise<CustodyStanding> {
  requireRole(ctx, "declaredValue.read");
  return custodyStanding(ctx);
}
