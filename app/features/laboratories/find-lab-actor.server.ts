import { and, eq, gt, isNull, sql } from "drizzle-orm";
import { laboratories, membershipRoles, memberships, sessions, users } from "#app/db/schema/index.ts";
import type { LaboratoryId } from "#app/domain/ids.ts";
import { roles as allRoles, type Role } from "#app/domain/roles.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { sessionIdleMs } from "#app/features/accounts/session-lifetime.ts";
import type { SignedIn } from "#app/features/accounts/find-signed-in.server.ts";
import { touchSession } from "#app/features/accounts/touch-session.server.ts";
import { hashToken } from "#app/features/accounts/token.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";

export type LabActor = Readonly<{
  signedIn: SignedIn;
  /** Undefined to anybody who is not in the laboratory, and where there is none. */
  membership: { laboratoryId: LaboratoryId; roles: Role[]; title: string; laboratory: LabContext["laboratory"] } | undefined;
}>;

/** Who asks, and as what in the laboratory with this slug: one query, since every page of a laboratory asks it. */
export async function findLabActor(app: AppContext, { token, labSlug }: { token: string; labSlug: string }): Promise<LabActor | undefined> {
  const [row] = await app.db
    .select({
      userId: users.id,
      name: users.name,
      email: users.email,
      emailConfirmedAt: users.emailConfirmedAt,
      lastSeenAt: sessions.lastSeenAt,
      laboratoryId: laboratories.id,
      memberId: memberships.userId,
      title: memberships.title,
      laboratory: {
        slug: laboratories.slug,
        name: laboratories.name,
        prefix: laboratories.prefix,
        isSolePractice: laboratories.isSolePractice,
        timeZone: laboratories.timeZone,
        currency: laboratories.currency,
        taxShareE4: laboratories.taxShareE4,
        taxLabel: laboratories.taxLabel,
        usualDays: laboratories.usualDays,
        selfCheckDelayHours: laboratories.selfCheckDelayHours,
      },
      roles: sql<string | null>`(select group_concat(${membershipRoles.role}) from ${membershipRoles}
        where ${membershipRoles.laboratoryId} = ${memberships.laboratoryId} and ${membershipRoles.userId} = ${memberships.userId})`,
    })
    .from(sessions)
    .innerJoin(users, eq(users.id, sessions.userId))
    .leftJoin(laboratories, eq(laboratories.slug, labSlug))
    .leftJoin(memberships, and(eq(memberships.laboratoryId, laboratories.id), eq(memberships.userId, users.id), isNull(memberships.endedAt)))
    .where(
      and(
        eq(sessions.tokenHash, hashToken(token)),
        gt(sessions.expiresAt, app.now),
        gt(sessions.lastSeenAt, new Date(app.now.getTime() - sessionIdleMs)),
      ),
    );
  if (!row) return undefined;
  await touchSession(app, { token, lastSeenAt: row.lastSeenAt });
  const held = new Set((row.roles ?? "").split(","));
  return {
    signedIn: { userId: row.userId, name: row.name, email: row.email, isEmailConfirmed: row.emailConfirmedAt !== null, sessionToken: token },
    membership:
      row.memberId && row.laboratory && row.laboratoryId
        ? { laboratoryId: row.laboratoryId, roles: allRoles.filter((role) => held.has(role)), title: row.title ?? "", laboratory: row.laboratory }
        : undefined,
  };
}
