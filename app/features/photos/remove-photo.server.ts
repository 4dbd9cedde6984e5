import { and, asc, eq, ne } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { attachments, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { AttachmentId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Takes a wrong photograph away while nothing was examined yet; afterwards it is part of the record. */
export async function removePhoto(ctx: LabContext, attachmentId: AttachmentId): Promise<void> {
  requireRole(ctx, "photos.add");
  const fileKey = await inTransaction(ctx.db, async (tx) => {
    const [photo] = await tx
      .select({ itemId: attachments.itemId, fileKey: attachments.fileKey })
      .from(attachments)
      .where(and(eq(attachments.laboratoryId, ctx.laboratoryId), eq(attachments.id, attachmentId)))
      .for("update");
    if (!photo) throw new AppError("not_found", "There is no such photograph.");
    const theirs = await tx
      .select({ id: stones.id, photoId: stones.photoId, state: stones.examinationState })
      .from(stones)
      .where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.itemId, photo.itemId)))
      .for("update");
    if (theirs.some((stone) => stone.state !== "received")) throw new AppError("conflict", "The examination has begun, so this photograph is part of the record and stays.");
    const [next] = await tx
      .select({ id: attachments.id })
      .from(attachments)
      .where(and(eq(attachments.laboratoryId, ctx.laboratoryId), eq(attachments.itemId, photo.itemId), ne(attachments.id, attachmentId)))
      .orderBy(asc(attachments.createdAt), asc(attachments.id))
      .limit(1);
    await tx
      .update(stones)
      .set({ photoId: next?.id ?? null })
      .where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.itemId, photo.itemId), eq(stones.photoId, attachmentId)));
    await tx.delete(attachments).where(and(eq(attachments.laboratoryId, ctx.laboratoryId), eq(attachments.id, attachmentId)));
    await recordAudit({ ...ctx, db: tx }, { action: "photo.removed", subject: { kind: "attachment", id: attachmentId } });
    return photo.fileKey;
  });
  await ctx.services.uploads.remove([fileKey]);
}
