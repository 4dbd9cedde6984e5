import { and, eq, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { laboratories, membershipRoles, memberships } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import { invitedPerson, type Acceptance } from "./invited-person.server.ts";
import { deadLinkSentence, spendEmailToken } from "./spend-email-token.server.ts";

/** Joins a laboratory's team with the roles of the invitation, once. */
export async function acceptStaffInvitation(app: AppContext, acceptance: Acceptance): Promise<{ userId: UserId; goTo: string }> {
  return inTransaction(app.db, async (tx) => {
    const inTx = { ...app, db: tx };
    const { email, laboratoryId, payload } = await spendEmailToken(inTx, { token: acceptance.token, purpose: "inviteStaff" });
    if (!laboratoryId || !payload.roles?.length) throw new AppError("not_found", deadLinkSentence);
    const userId = await invitedPerson(inTx, { email, acceptance });
    const [laboratory] = await tx.select({ slug: laboratories.slug }).from(laboratories).where(eq(laboratories.id, laboratoryId)).for("update");
    await tx
      .insert(memberships)
      .values({ laboratoryId, userId, title: payload.title ?? "", joinedAt: app.now })
      .onDuplicateKeyUpdate({ set: { endedAt: null, title: sql`values(${memberships.title})`, joinedAt: app.now } });
    await tx.delete(membershipRoles).where(and(eq(membershipRoles.laboratoryId, laboratoryId), eq(membershipRoles.userId, userId)));
    await tx.insert(membershipRoles).values(payload.roles.map((role) => ({ laboratoryId, userId, role })));
    await recordAudit({ ...inTx, laboratoryId, actorId: userId }, { action: "member.joined", subject: { kind: "user", id: userId }, detail: { roles: payload.roles } });
    return { userId, goTo: `/lab/${laboratory!.slug}/stones` };
  });
}
