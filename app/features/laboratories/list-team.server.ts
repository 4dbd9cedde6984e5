import { and, asc, eq, gt, isNull, sql } from "drizzle-orm";
import { emailTokens, membershipRoles, memberships, users } from "#app/db/schema/index.ts";
import { roles } from "#app/domain/roles.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

const most = 500;

/** Who works here, and who is invited. An invitation's `id` names it and opens nothing. */
export async function listTeam(ctx: LabContext) {
  requireRole(ctx, "team.manage");
  const [members, invitations] = await Promise.all([
    ctx.db
      .select({
        userId: memberships.userId,
        name: users.name,
        email: users.email,
        title: memberships.title,
        joinedAt: memberships.joinedAt,
        roles: sql<string | null>`(select group_concat(${membershipRoles.role}) from ${membershipRoles}
          where ${membershipRoles.laboratoryId} = ${memberships.laboratoryId} and ${membershipRoles.userId} = ${memberships.userId})`,
      })
      .from(memberships)
      .innerJoin(users, eq(users.id, memberships.userId))
      .where(and(eq(memberships.laboratoryId, ctx.laboratoryId), isNull(memberships.endedAt)))
      .orderBy(asc(users.name), asc(users.id))
      .limit(most),
    ctx.db
      .select({ tokenHash: emailTokens.tokenHash, email: emailTokens.email, payload: emailTokens.payload, createdAt: emailTokens.createdAt, expiresAt: emailTokens.expiresAt })
      .from(emailTokens)
      .where(and(eq(emailTokens.laboratoryId, ctx.laboratoryId), eq(emailTokens.purpose, "inviteStaff"), isNull(emailTokens.usedAt), gt(emailTokens.expiresAt, ctx.now)))
      .orderBy(asc(emailTokens.createdAt))
      .limit(most),
  ]);
  return {
    members: members.map(({ roles: held, ...member }) => ({ ...member, roles: roles.filter((role) => (held ?? "").split(",").includes(role)) })),
    invitations: invitations.map(({ tokenHash, payload, ...invitation }) => ({ ...invitation, id: tokenHash.toString("hex"), name: payload.name ?? "", roles: payload.roles ?? [] })),
  };
}
