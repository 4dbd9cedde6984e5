import { sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { clientUsers } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import { invitedPerson, type Acceptance } from "./invited-person.server.ts";
import { deadLinkSentence, spendEmailToken } from "./spend-email-token.server.ts";

/** Opens one client's own pages to a person, once. */
export async function acceptClientInvitation(app: AppContext, acceptance: Acceptance): Promise<{ userId: UserId; goTo: string }> {
  return inTransaction(app.db, async (tx) => {
    const inTx = { ...app, db: tx };
    const { email, laboratoryId, payload } = await spendEmailToken(inTx, { token: acceptance.token, purpose: "inviteClient" });
    const { clientId } = payload;
    if (!laboratoryId || !clientId) throw new AppError("not_found", deadLinkSentence);
    const userId = await invitedPerson(inTx, { email, acceptance });
    await tx
      .insert(clientUsers)
      .values({ laboratoryId, clientId, userId, joinedAt: app.now })
      .onDuplicateKeyUpdate({ set: { joinedAt: sql`${clientUsers.joinedAt}` } });
    await recordAudit({ ...inTx, laboratoryId, actorId: userId }, { action: "client.joined", subject: { kind: "client", id: clientId } });
    return { userId, goTo: "/my" };
  });
}
