import { and, asc, eq, isNull } from "drizzle-orm";
import { memberships, users } from "#app/db/schema/index.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Who of the laboratory can hold goods, by name. */
export async function listHolders(ctx: LabContext): Promise<Array<{ ref: string; name: string }>> {
  requireRole(ctx, "takeIn.read");
  const rows = await ctx.db
    .select({ id: users.id, name: users.name })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.laboratoryId, ctx.laboratoryId), isNull(memberships.endedAt)))
    .orderBy(asc(users.name));
  return rows.map(({ id, name }) => ({ ref: shortRef(id), name }));
}
