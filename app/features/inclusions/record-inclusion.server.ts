import { and, eq, isNull, or, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { attachments, inclusions, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { AttachmentId, InclusionId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { stoneUnderExamination, type StoneUnderExamination } from "#app/features/stones/stone-under-examination.server.ts";
import { takeUpExamination } from "#app/features/stones/take-up-examination.server.ts";
import type { InclusionPlacing } from "./inclusion-forms.server.ts";

export type RecordInclusion = Omit<InclusionPlacing, "intent"> & { stoneCode: string };

const mostAStone = 200;

/** Keeps what was seen in a stone and where: on a photograph, on the outline of its cut, or on both. Sent twice, it is kept once. */
export async function recordInclusion(ctx: LabContext, input: RecordInclusion): Promise<{ sequence: number }> {
  requireRole(ctx, "readings.record");
  const { laboratoryId, actorId, now } = ctx;
  return inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const stone = await stoneUnderExamination(scope, input.stoneCode);
    const repeat = await findRepeat(scope, input.requestId, stone);
    if (repeat) return repeat;
    if (input.onPhoto) await requirePhoto(scope, input.onPhoto.photoId, stone);
    await takeUpExamination(scope, { stone, what: "First inclusion plotted" });
    const theirs = await tx.select({ sequence: inclusions.sequence }).from(inclusions).where(and(eq(inclusions.laboratoryId, laboratoryId), eq(inclusions.stoneId, stone.id)));
    if (theirs.length >= mostAStone) throw new AppError("conflict", `This stone has ${mostAStone} inclusions already. Say “many” of one kind instead of placing each.`);
    const sequence = Math.max(0, ...theirs.map((one) => one.sequence)) + 1;
    await tx.insert(inclusions).values({
      laboratoryId,
      id: input.requestId,
      stoneId: stone.id,
      sequence,
      type: input.type,
      otherText: input.otherText,
      photoId: input.onPhoto?.photoId ?? null,
      photoX: input.onPhoto ? share(input.onPhoto.at.x) : null,
      photoY: input.onPhoto ? share(input.onPhoto.at.y) : null,
      plotSide: input.onPlot?.side ?? null,
      plotX: input.onPlot ? share(input.onPlot.at.x) : null,
      plotY: input.onPlot ? share(input.onPlot.at.y) : null,
      depth: input.depth,
      amount: input.amount,
      sizeMm: input.size?.value ?? null,
      sizeText: input.size?.text ?? "",
      note: input.note,
      observerId: actorId,
      recordedAt: now,
    });
    await tx.update(stones).set({ version: sql`${stones.version} + 1` }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id)));
    await recordAudit(scope, { action: "inclusion.recorded", subject: { kind: "stone", id: stone.id }, detail: { sequence, type: input.type } });
    return { sequence };
  });
}

/** At the column's four decimals. */
const share = (value: number) => Math.round(value * 10_000) / 10_000;

async function findRepeat({ db, laboratoryId, actorId }: LabContext, id: InclusionId, stone: StoneUnderExamination) {
  const [row] = await db.select({ sequence: inclusions.sequence, stoneId: inclusions.stoneId, observerId: inclusions.observerId }).from(inclusions).where(and(eq(inclusions.laboratoryId, laboratoryId), eq(inclusions.id, id)));
  if (!row) return undefined;
  if (row.stoneId !== stone.id || row.observerId !== actorId) throw new AppError("conflict", "This form was sent for another inclusion before. Open the page anew and send it again.");
  return { sequence: row.sequence };
}

async function requirePhoto({ db, laboratoryId }: LabContext, photoId: AttachmentId, stone: StoneUnderExamination): Promise<void> {
  const [photo] = await db
    .select({ id: attachments.id })
    .from(attachments)
    .where(and(eq(attachments.laboratoryId, laboratoryId), eq(attachments.id, photoId), eq(attachments.itemId, stone.itemId), or(isNull(attachments.stoneId), eq(attachments.stoneId, stone.id))));
  if (!photo) throw new AppError("invalid_input", "Choose a photograph of this stone.", { fieldErrors: { photo: ["Choose a photograph of this stone."] } });
}
