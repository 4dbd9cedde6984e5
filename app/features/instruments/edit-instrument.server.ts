import { and, eq, sql } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { instruments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { InstrumentId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import type { InstrumentEdit } from "./instrument-forms.server.ts";
import { failingReferences } from "./instrument-standing.server.ts";
import { nameTaken } from "./register-instrument.server.ts";

/** Changes what is known of an instrument, unless somebody changed it since this version was read. */
export async function editInstrument(ctx: LabContext, instrumentId: InstrumentId, { version, ...fields }: InstrumentEdit): Promise<void> {
  requireRole(ctx, "instruments.manage");
  try {
    await inTransaction(ctx.db, async (tx) => {
      const mine = and(eq(instruments.laboratoryId, ctx.laboratoryId), eq(instruments.id, instrumentId));
      const [before] = await tx.select({ status: instruments.status, version: instruments.version }).from(instruments).where(mine).for("update");
      if (!before) throw new AppError("not_found", "There is no such instrument.");
      if (before.version !== version) {
        throw new AppError("conflict", "Somebody has changed this instrument since you opened the page. What you typed is still here: compare it with the instrument's page, then save again.");
      }
      if (before.status === "outOfService" && fields.status !== "outOfService") await requirePassedCheck({ ...ctx, db: tx }, instrumentId, fields.name);
      const statusReason = fields.status === "inService" ? "" : fields.statusReason;
      await tx.update(instruments).set({ ...fields, statusReason, version: sql`${instruments.version} + 1` }).where(mine);
      await recordAudit(
        { ...ctx, db: tx },
        { action: "instrument.changed", subject: { kind: "instrument", id: instrumentId }, detail: { from: before.status, to: fields.status }, reason: statusReason },
      );
    });
  } catch (error) {
    if (constraintKind(error) === "duplicate") throw nameTaken(fields.name, error);
    throw error;
  }
}

async function requirePassedCheck(ctx: LabContext, instrumentId: InstrumentId, name: string): Promise<void> {
  const failing = await failingReferences(ctx, instrumentId);
  if (failing.length === 0) return;
  const message = `${name} failed its last check with ${failing.join(" and ")}. Record a passed check with it first.`;
  throw new AppError("conflict", message, { fieldErrors: { status: [message] } });
}
