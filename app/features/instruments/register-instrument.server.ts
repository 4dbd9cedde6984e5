import { and, eq } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { instruments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { InstrumentId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import type { InstrumentDetails } from "./instrument-forms.server.ts";

/** @param input.requestId becomes the instrument's id, so that a form sent twice registers one */
export async function registerInstrument(ctx: LabContext, { requestId, ...details }: InstrumentDetails & { requestId: InstrumentId }): Promise<InstrumentId> {
  requireRole(ctx, "instruments.manage");
  try {
    await inTransaction(ctx.db, async (tx) => {
      await tx.insert(instruments).values({ ...details, laboratoryId: ctx.laboratoryId, id: requestId, createdAt: ctx.now });
      await recordAudit({ ...ctx, db: tx }, { action: "instrument.registered", subject: { kind: "instrument", id: requestId }, detail: { name: details.name } });
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    const [made] = await ctx.db.select({ id: instruments.id }).from(instruments).where(and(eq(instruments.laboratoryId, ctx.laboratoryId), eq(instruments.id, requestId)));
    if (!made) throw nameTaken(details.name, error);
  }
  return requestId;
}

export function nameTaken(name: string, cause: unknown): AppError {
  const message = `There is already an instrument called ${name}. Names are on labels, so each is used once.`;
  return new AppError("conflict", message, { cause, fieldErrors: { name: [message] } });
}
