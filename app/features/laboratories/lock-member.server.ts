import { and, eq, isNull } from "drizzle-orm";
import { laboratories, membershipRoles, memberships } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import { roles, type Role } from "#app/domain/roles.ts";
import type { LabScope } from "#app/features/lab-context.ts";

/**
 * A member as they are now, and whether another owner would stay. Locks the laboratory's row, so that two owners cannot
 * remove each other at once. Belongs in the transaction of the change.
 */
export async function lockMember({ db, laboratoryId }: Pick<LabScope, "db" | "laboratoryId">, userId: UserId): Promise<{ title: string; roles: Role[]; hasOtherOwner: boolean }> {
  await db.select({ id: laboratories.id }).from(laboratories).where(eq(laboratories.id, laboratoryId)).for("update");
  const rows = await db
    .select({ userId: memberships.userId, title: memberships.title, role: membershipRoles.role })
    .from(memberships)
    .leftJoin(membershipRoles, and(eq(membershipRoles.laboratoryId, memberships.laboratoryId), eq(membershipRoles.userId, memberships.userId)))
    .where(and(eq(memberships.laboratoryId, laboratoryId), isNull(memberships.endedAt)));
  const mine = rows.filter((row) => row.userId === userId);
  if (!mine[0]) throw new AppError("not_found", "There is no such person in the team.");
  return {
    title: mine[0].title,
    roles: roles.filter((role) => mine.some((row) => row.role === role)),
    hasOtherOwner: rows.some((row) => row.userId !== userId && row.role === "owner"),
  };
}
