import { and, asc, eq, isNull, lte, or } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import type { Db } from "#app/db/client.server.ts";
import { outgoingMail } from "#app/db/schema/index.ts";
import type { Services } from "#app/features/services.ts";

const leaseMs = 60_000;
const mostAttempts = 8;

/**
 * Sends mail that is due, at most `limit`. Each row is leased by a conditional UPDATE first, so that processes share the
 * queue; a crash after sending may send one message twice, never lose one.
 * @returns how many were sent
 */
export async function deliverDueMail(app: { db: Db; services: Pick<Services, "mailer">; now: Date }, { limit = 20 } = {}): Promise<number> {
  const isFree = or(isNull(outgoingMail.leaseUntil), lte(outgoingMail.leaseUntil, app.now));
  const due = await app.db
    .select()
    .from(outgoingMail)
    .where(and(eq(outgoingMail.state, "queued"), lte(outgoingMail.nextAttemptAt, app.now), isFree))
    .orderBy(asc(outgoingMail.nextAttemptAt))
    .limit(limit);
  let sent = 0;
  for (const mail of due) {
    // In a transaction for its retries: claims of several processes may deadlock on the queue's index.
    const [claim] = await inTransaction(app.db, (tx) =>
      tx
        .update(outgoingMail)
        .set({ leaseUntil: new Date(app.now.getTime() + leaseMs), attempts: mail.attempts + 1 })
        .where(and(eq(outgoingMail.id, mail.id), eq(outgoingMail.state, "queued"), eq(outgoingMail.attempts, mail.attempts), isFree)),
    );
    if (claim.affectedRows !== 1) continue;
    try {
      await app.services.mailer.send({
        to: { address: mail.toAddress, name: mail.toName },
        subject: mail.subject,
        html: mail.htmlBody,
        text: mail.textBody,
      });
      await app.db.update(outgoingMail).set({ state: "sent", sentAt: app.now, leaseUntil: null }).where(eq(outgoingMail.id, mail.id));
      sent++;
    } catch (error) {
      const attempts = mail.attempts + 1;
      await app.db
        .update(outgoingMail)
        .set({
          state: attempts >= mostAttempts ? "failed" : "queued",
          leaseUntil: null,
          lastError: String(error instanceof Error ? error.message : error).slice(0, 500),
          nextAttemptAt: new Date(app.now.getTime() + 15_000 * 2 ** attempts),
        })
        .where(eq(outgoingMail.id, mail.id));
    }
  }
  return sent;
}
