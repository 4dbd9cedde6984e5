import { and, asc, eq, isNull, or, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { attachments, inclusions, stonePlots, stones, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { outlineNamed, type CutOutlineCode } from "#app/domain/cut-outline/cut-outline.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { hasOwnOpenCheck } from "#app/features/second-checks/own-open-check.ts";

const strikers = alias(users, "strikers");

/** What was plotted of a stone, struck ones in their places, and what it can be placed on; nothing of it to somebody whose check is open. */
export async function getInclusions(ctx: LabContext, { stoneCode }: { stoneCode: string }) {
  requireRole(ctx, "readings.read");
  const { db, laboratoryId, actorId } = ctx;
  const theStone = and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode), sql`not ${hasOwnOpenCheck(actorId)}`);
  const [[stone], marks, photos] = await Promise.all([
    db
      .select({ description: stones.description, outline: stonePlots.outline })
      .from(stones)
      .leftJoin(stonePlots, and(eq(stonePlots.laboratoryId, stones.laboratoryId), eq(stonePlots.stoneId, stones.id)))
      .where(theStone),
    db
      .select({
        sequence: inclusions.sequence,
        type: inclusions.type,
        otherText: inclusions.otherText,
        photoId: inclusions.photoId,
        photoX: inclusions.photoX,
        photoY: inclusions.photoY,
        plotSide: inclusions.plotSide,
        plotX: inclusions.plotX,
        plotY: inclusions.plotY,
        depth: inclusions.depth,
        amount: inclusions.amount,
        sizeText: inclusions.sizeText,
        note: inclusions.note,
        observer: users.name,
        isOwn: sql<number>`${inclusions.observerId} = ${sql.param(actorId, inclusions.observerId)}`,
        recordedAt: inclusions.recordedAt,
        struckAt: inclusions.struckAt,
        struckBy: strikers.name,
        struckReason: inclusions.struckReason,
      })
      .from(stones)
      .innerJoin(inclusions, and(eq(inclusions.laboratoryId, stones.laboratoryId), eq(inclusions.stoneId, stones.id)))
      .innerJoin(users, eq(users.id, inclusions.observerId))
      .leftJoin(strikers, eq(strikers.id, inclusions.struckBy))
      .where(theStone)
      .orderBy(asc(inclusions.sequence)),
    db
      .select({ id: attachments.id, widthPx: attachments.widthPx, heightPx: attachments.heightPx, magnificationX: attachments.magnificationX, pictureWidthMm: attachments.pictureWidthMm })
      .from(stones)
      .innerJoin(attachments, and(eq(attachments.laboratoryId, stones.laboratoryId), eq(attachments.itemId, stones.itemId), or(isNull(attachments.stoneId), eq(attachments.stoneId, stones.id))))
      .where(theStone)
      .orderBy(asc(attachments.createdAt), asc(attachments.id)),
  ]);
  if (!stone) throw new AppError("not_found", "There is no such stone.");
  const outline: CutOutlineCode = stone.outline ?? outlineNamed(stone.description) ?? "oval";
  return {
    outline,
    isOutlineChosen: stone.outline !== null,
    photos: photos.map(({ id, ...photo }) => ({ ...photo, ref: shortRef(id) })),
    inclusions: marks.map(({ photoId, photoX, photoY, plotSide, plotX, plotY, isOwn, struckAt, struckBy, struckReason, ...mark }) => ({
      ...mark,
      isOwn: Boolean(Number(isOwn)),
      onPhoto: photoId && photoX !== null && photoY !== null ? { photoRef: shortRef(photoId), at: { x: photoX, y: photoY } } : null,
      onPlot: plotSide && plotX !== null && plotY !== null ? { side: plotSide, at: { x: plotX, y: plotY } } : null,
      strike: struckAt && { at: struckAt, by: struckBy ?? "", reason: struckReason },
    })),
  };
}
export type PlottedInclusion = Awaited<ReturnType<typeof getInclusions>>["inclusions"][number];
export type PlotPhoto = Awaited<ReturnType<typeof getInclusions>>["photos"][number];
