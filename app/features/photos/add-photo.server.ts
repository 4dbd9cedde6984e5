import { createHash } from "node:crypto";
import { and, eq, isNull } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { attachments, items, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { AttachmentId, ItemId, StoneId, UserId } from "#app/domain/ids.ts";
import type { Role } from "#app/domain/roles.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { reencodePhoto } from "./reencode-photo.server.ts";

/** An upload's callback has no page around it, only who sent it, as what and where. */
export type PhotoScope = LabScope & Readonly<{ actorId: UserId; roles: readonly Role[] }>;
export type NewPhoto = {
  itemId: ItemId;
  stoneId?: StoneId;
  bytes: Buffer;
  fileName: string;
  /** What it was made from; the same one again makes no second photograph. */
  sourceKey: string;
};

const mostPerItem = 40;

/** Keeps a photograph of an item: re-encoded, stripped, with a thumbnail; the first one becomes its stones' picture. */
export async function addPhoto(scope: PhotoScope, { itemId, stoneId, bytes, fileName, sourceKey }: NewPhoto): Promise<AttachmentId> {
  requireRole(scope, "photos.add");
  const { db, laboratoryId, services } = scope;
  const [item] = await db.select({ number: items.number }).from(items).where(and(eq(items.laboratoryId, laboratoryId), eq(items.id, itemId)));
  if (!item) throw new AppError("not_found", "There is no such item.");
  const theirs = await db.select({ id: attachments.id, sourceKey: attachments.sourceKey }).from(attachments).where(and(eq(attachments.laboratoryId, laboratoryId), eq(attachments.itemId, itemId)));
  const made = theirs.find((photo) => photo.sourceKey === sourceKey);
  if (made) return made.id;
  if (theirs.length >= mostPerItem) {
    const message = `This item has ${mostPerItem} photographs already.`;
    throw new AppError("conflict", message, { fieldErrors: { photo: [message] } });
  }
  if (stoneId) {
    const [stone] = await db.select({ id: stones.id }).from(stones).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stoneId), eq(stones.itemId, itemId)));
    if (!stone) throw new AppError("not_found", "There is no such stone.");
  }

  const photo = await reencodePhoto({ bytes, fileName });
  const id = newId<"attachment">();
  const { fileKey } = await services.uploads.put({ name: `${item.number}.jpg`, mimeType: "image/jpeg", bytes: photo.bytes });
  try {
    await inTransaction(db, async (tx) => {
      await tx.insert(attachments).values({
        laboratoryId,
        id,
        itemId,
        stoneId: stoneId ?? null,
        fileKey,
        sourceKey,
        mimeType: "image/jpeg",
        widthPx: photo.widthPx,
        heightPx: photo.heightPx,
        sizeBytes: photo.bytes.length,
        sha256: createHash("sha256").update(photo.bytes).digest(),
        thumbnail: photo.thumbnail,
        createdAt: scope.now,
        createdBy: scope.actorId,
      });
      await tx
        .update(stones)
        .set({ photoId: id })
        .where(and(eq(stones.laboratoryId, laboratoryId), stoneId ? eq(stones.id, stoneId) : eq(stones.itemId, itemId), isNull(stones.photoId)));
      await recordAudit({ ...scope, db: tx }, { action: "photo.added", subject: { kind: "attachment", id }, detail: { item: item.number } });
    });
    return id;
  } catch (error) {
    // The first failure is the one to tell of.
    await services.uploads.remove([fileKey]).catch(() => undefined);
    if (constraintKind(error) !== "duplicate") throw error;
    const [first] = await db.select({ id: attachments.id }).from(attachments).where(and(eq(attachments.laboratoryId, laboratoryId), eq(attachments.sourceKey, sourceKey)));
    if (!first) throw error;
    return first.id;
  }
}
