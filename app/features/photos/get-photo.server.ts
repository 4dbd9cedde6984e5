import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { attachments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { AttachmentId } from "#app/domain/ids.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** A photograph's bytes, or its thumbnail's; the full one is what was put away, or an error. */
export async function getPhoto(ctx: LabContext, attachmentId: AttachmentId, size: "full" | "thumbnail"): Promise<{ bytes: Buffer; mimeType: string }> {
  requireRole(ctx, "stones.read");
  const mine = and(eq(attachments.laboratoryId, ctx.laboratoryId), eq(attachments.id, attachmentId));
  if (size === "thumbnail") {
    const [photo] = await ctx.db.select({ thumbnail: attachments.thumbnail }).from(attachments).where(mine);
    if (!photo) throw new AppError("not_found", "There is no such photograph.");
    return { bytes: photo.thumbnail, mimeType: "image/jpeg" };
  }
  const [photo] = await ctx.db.select({ fileKey: attachments.fileKey, mimeType: attachments.mimeType, sha256: attachments.sha256 }).from(attachments).where(mine);
  if (!photo) throw new AppError("not_found", "There is no such photograph.");
  const bytes = await ctx.services.uploads.get(photo.fileKey).catch((error: unknown) => {
    throw new AppError("unavailable", "The photograph cannot be fetched just now. Try again in a minute.", { cause: error });
  });
  if (!createHash("sha256").update(bytes).digest().equals(photo.sha256)) throw new Error(`photograph ${attachmentId} is not what was put away`);
  return { bytes, mimeType: photo.mimeType };
}
