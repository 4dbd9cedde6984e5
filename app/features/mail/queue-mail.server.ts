import { sql } from "drizzle-orm";
import type { Db, Tx } from "#app/db/client.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { outgoingMail } from "#app/db/schema/index.ts";
import type { LaboratoryId } from "#app/domain/ids.ts";

export type QueuedMail = {
  laboratoryId: LaboratoryId | null;
  to: { address: string; name: string };
  kind: string;
  /** Mail with the same key is written once, however often its cause repeats. */
  dedupeKey: string;
  message: { subject: string; html: string; text: string };
};

/** Writes mail in the transaction of its cause; it leaves after the commit. */
export async function queueMail({ db, now }: { db: Db | Tx; now: Date }, { laboratoryId, to, kind, dedupeKey, message }: QueuedMail): Promise<void> {
  await db
    .insert(outgoingMail)
    .values({
      id: newId<"mail">(),
      laboratoryId,
      toAddress: to.address,
      toName: to.name,
      kind,
      dedupeKey,
      subject: message.subject,
      htmlBody: message.html,
      textBody: message.text,
      state: "queued",
      nextAttemptAt: now,
      createdAt: now,
    })
    .onDuplicateKeyUpdate({ set: { dedupeKey: sql`${outgoingMail.dedupeKey}` } });
}
