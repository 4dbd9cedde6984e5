import type { AttachmentId } from "#app/domain/ids.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { addPhoto } from "#app/features/photos/add-photo.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { stoneUnderExamination } from "#app/features/stones/stone-under-examination.server.ts";
import { setPhotoScale } from "./set-photo-scale.server.ts";

export type NewMicroscopePhoto = Readonly<{ stoneCode: string; bytes: Buffer; fileName: string; sourceKey: string; magnificationX: number | null; pictureWidthMm: number | null }>;

/** A photograph of this one stone, with how large it shows things; re-encoded and kept as every photograph is. */
export async function addMicroscopePhoto(ctx: LabContext, { stoneCode, bytes, fileName, sourceKey, magnificationX, pictureWidthMm }: NewMicroscopePhoto): Promise<AttachmentId> {
  requireRole(ctx, "readings.record");
  const stone = await stoneUnderExamination(ctx, stoneCode);
  const photoId = await addPhoto(ctx, { itemId: stone.itemId, stoneId: stone.id, bytes, fileName, sourceKey });
  await setPhotoScale(ctx, { stoneCode, photoId, magnificationX, pictureWidthMm });
  return photoId;
}
