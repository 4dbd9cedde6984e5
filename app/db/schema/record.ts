import { index, int, mysqlTable, text, mediumtext, varchar, primaryKey } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf } from "../columns.ts";
import { users } from "./account.ts";
import { laboratories } from "./laboratory.ts";

/** Mail to be sent, written in the transaction of its cause and delivered after it. */
export const outgoingMail = mysqlTable(
  "outgoing_mail",
  {
    id: id<"mail">("id").primaryKey(),
    /** Null: about an account, not about a laboratory's work. */
    laboratoryId: id<"laboratory">("laboratory_id").references(() => laboratories.id),
    toAddress: varchar("to_address", { length: 254 }).notNull(),
    toName: varchar("to_name", { length: 120 }).notNull().default(""),
    kind: exactText("kind", 32).notNull(),
    /** What it is about: the same mail about the same thing is written once. */
    dedupeKey: exactText("dedupe_key", 120).notNull().unique("outgoing_mail_dedupe"),
    subject: varchar("subject", { length: 255 }).notNull(),
    htmlBody: mediumtext("html_body").notNull(),
    textBody: mediumtext("text_body").notNull(),
    state: exactText<"queued" | "sent" | "failed">("state", 8).notNull(),
    attempts: int("attempts").notNull().default(0),
    nextAttemptAt: instant("next_attempt_at").notNull(),
    leaseUntil: instant("lease_until"),
    lastError: varchar("last_error", { length: 500 }).notNull().default(""),
    createdAt: instant("created_at").notNull(),
    sentAt: instant("sent_at"),
  },
  (t) => [index("outgoing_mail_queue").on(t.state, t.nextAttemptAt), index("outgoing_mail_laboratory").on(t.laboratoryId, t.createdAt)],
);

/** Who did what to what, append-only. Holds no free text about people. */
export const auditEvents = mysqlTable(
  "audit_events",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    id: id<"auditEvent">("id").notNull(),
    at: instant("at").notNull(),
    actorId: id<"user">("actor_id").references(() => users.id),
    action: exactText("action", 48).notNull(),
    subjectKind: exactText("subject_kind", 24).notNull(),
    subjectId: id<string>("subject_id").notNull(),
    detail: jsonOf<Record<string, unknown>>("detail").notNull(),
    reason: text("reason").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    index("audit_events_subject").on(t.laboratoryId, t.subjectKind, t.subjectId, t.at),
    index("audit_events_at").on(t.laboratoryId, t.at, t.id),
  ],
);
