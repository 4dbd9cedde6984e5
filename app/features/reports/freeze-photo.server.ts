import { and, asc, eq } from "drizzle-orm";
import sharp from "sharp";
import { attachments, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { StoneId } from "#app/domain/ids.ts";
import type { LabScope } from "#app/features/lab-context.ts";

const longestSidePx = 1000;

/** The stone's photograph as a report will show it, JPEG; undefined where there is none. */
export async function freezePhoto(scope: LabScope, { stoneId }: { stoneId: StoneId }): Promise<Buffer | undefined> {
  const { db, laboratoryId } = scope;
  const [stone] = await db
    .select({ photoId: stones.photoId, itemId: stones.itemId })
    .from(stones)
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stoneId)));
  if (!stone) return undefined;
  const [photo] = await db
    .select({ fileKey: attachments.fileKey })
    .from(attachments)
    .where(and(eq(attachments.laboratoryId, laboratoryId), stone.photoId ? eq(attachments.id, stone.photoId) : eq(attachments.itemId, stone.itemId)))
    .orderBy(asc(attachments.createdAt))
    .limit(1);
  if (!photo) return undefined;
  try {
    return await sharp(await scope.services.uploads.get(photo.fileKey)).resize({ width: longestSidePx, height: longestSidePx, fit: "inside", withoutEnlargement: true }).jpeg({ quality: 84 }).toBuffer();
  } catch (error) {
    throw new AppError("unavailable", "The photograph could not be fetched from the file store, so nothing was authorised. Try again in a minute.", { cause: error, retryAfterS: 60 });
  }
}
