import { and, asc, eq, isNull, sql } from "drizzle-orm";
import { laboratories, membershipRoles, memberships, users } from "#app/db/schema/index.ts";
import { roleNames, roles, type Role } from "#app/domain/roles.ts";
import type { AppContext } from "#app/features/app-context.ts";

/** The invented people of the demonstration, by laboratory, to be offered on the sign-in page. */
export async function listDemonstrationPeople({ db }: Pick<AppContext, "db">) {
  const rows = await db
    .select({
      name: users.name,
      email: users.email,
      laboratoryName: laboratories.name,
      roles: sql<string | null>`group_concat(${membershipRoles.role})`,
    })
    .from(users)
    .leftJoin(memberships, and(eq(memberships.userId, users.id), isNull(memberships.endedAt)))
    .leftJoin(laboratories, eq(laboratories.id, memberships.laboratoryId))
    .leftJoin(membershipRoles, and(eq(membershipRoles.laboratoryId, memberships.laboratoryId), eq(membershipRoles.userId, users.id)))
    .where(eq(users.isDemonstration, true))
    .groupBy(users.id, users.name, users.email, laboratories.id, laboratories.name)
    .orderBy(sql`${laboratories.name} is null`, asc(laboratories.name), asc(users.id))
    .limit(50);
  return rows.map(({ roles: held, ...person }) => ({ ...person, work: workOf((held ?? "").split(",")) }));
}

function workOf(held: readonly string[]): string {
  const mine: readonly Role[] = roles.filter((role) => held.includes(role));
  return mine.length === 0 ? "Client" : mine.map((role) => roleNames[role]).join(", ");
}
