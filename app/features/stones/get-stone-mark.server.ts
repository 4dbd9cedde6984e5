import { and, eq } from "drizzle-orm";
import { stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** A number that moves with every reading, strike and step of a stone: whether a page of it is still current. */
export async function getStoneMark(ctx: LabContext, { stoneCode }: { stoneCode: string }): Promise<number> {
  requireRole(ctx, "stones.read");
  const [row] = await ctx.db
    .select({ version: stones.version })
    .from(stones)
    .where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.code, stoneCode)));
  if (!row) throw new AppError("not_found", "There is no such stone.");
  return row.version;
}
