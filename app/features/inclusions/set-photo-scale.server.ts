import { and, eq, isNull, or } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { attachments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { AttachmentId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { stoneUnderExamination } from "#app/features/stones/stone-under-examination.server.ts";

export type PhotoScale = Readonly<{ stoneCode: string; photoId: AttachmentId; /** As the microscope says; null where none was used. */ magnificationX: number | null; /** What the picture shows from left to right, mm. */ pictureWidthMm: number | null }>;

/** Says how large a photograph shows things, for its scale bar. */
export async function setPhotoScale(ctx: LabContext, { stoneCode, photoId, magnificationX, pictureWidthMm }: PhotoScale): Promise<void> {
  requireRole(ctx, "readings.record");
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const stone = await stoneUnderExamination(scope, stoneCode);
    const mine = and(eq(attachments.laboratoryId, ctx.laboratoryId), eq(attachments.id, photoId), eq(attachments.itemId, stone.itemId), or(isNull(attachments.stoneId), eq(attachments.stoneId, stone.id)));
    const [photo] = await tx.select({ id: attachments.id }).from(attachments).where(mine);
    if (!photo) throw new AppError("not_found", "There is no such photograph of this stone.");
    await tx.update(attachments).set({ magnificationX, pictureWidthMm }).where(mine);
    await recordAudit(scope, { action: "photo.scaled", subject: { kind: "attachment", id: photoId }, detail: { magnificationX, pictureWidthMm } });
  });
}
