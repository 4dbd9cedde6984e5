import { foreignKey, index, int, mysqlTable, primaryKey, uniqueIndex, varchar, date } from "drizzle-orm/mysql-core";
import { bytes, exactText, id, instant, jsonOf } from "../columns.ts";
import type { PdfState, ReportState, WithdrawalReason } from "#app/domain/report-state.ts";
import type { RegisterCode } from "#app/domain/register-code.ts";
import type { RegisterView } from "#app/domain/register-view.ts";
import { users } from "./account.ts";
import { clients } from "./client.ts";
import { stones } from "./stone.ts";

export const reports = mysqlTable(
  "reports",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"report">("id").notNull(),
    /** Given when it is authorised, in the same transaction, so that the series has no gap. */
    number: exactText("number", 24),
    kind: exactText<"identification" | "identificationWithValuation">("kind", 30).notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    clientId: id<"client">("client_id").notNull(),
    state: exactText<ReportState>("state", 12).notNull(),
    version: int("version").notNull(),
    code: exactText<RegisterCode>("code", 16),
    /** Everything that the PDF says, frozen when it was authorised. */
    snapshot: jsonOf<unknown>("snapshot"),
    reportOn: date("report_on", { mode: "string" }),
    authorisedBy: id<"user">("authorised_by").references(() => users.id),
    authorisedAt: instant("authorised_at"),
    pdfState: exactText<PdfState>("pdf_state", 8).notNull().default("none"),
    pdfFailure: varchar("pdf_failure", { length: 500 }).notNull().default(""),
    pdfAttempts: int("pdf_attempts").notNull().default(0),
    pdfLeaseUntil: instant("pdf_lease_until"),
    issuedAt: instant("issued_at"),
    /** The report that this one replaces, and why. */
    supersedesId: id<"report">("supersedes_id"),
    amendmentReason: varchar("amendment_reason", { length: 1000 }).notNull().default(""),
    withdrawnAt: instant("withdrawn_at"),
    withdrawnBy: id<"user">("withdrawn_by").references(() => users.id),
    withdrawalReason: exactText<WithdrawalReason>("withdrawal_reason", 16),
    withdrawalNote: varchar("withdrawal_note", { length: 1000 }).notNull().default(""),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("reports_number").on(t.laboratoryId, t.number),
    uniqueIndex("reports_code").on(t.code),
    uniqueIndex("reports_stone_version").on(t.laboratoryId, t.stoneId, t.version),
    index("reports_created").on(t.laboratoryId, t.createdAt, t.id),
    index("reports_state").on(t.laboratoryId, t.state, t.createdAt, t.id),
    index("reports_client").on(t.laboratoryId, t.clientId, t.createdAt, t.id),
    index("reports_supersedes").on(t.laboratoryId, t.supersedesId),
    index("reports_pdf_queue").on(t.pdfState, t.pdfLeaseUntil),
    foreignKey({ name: "reports_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
    foreignKey({ name: "reports_client_fk", columns: [t.laboratoryId, t.clientId], foreignColumns: [clients.laboratoryId, clients.id] }),
  ],
);

/** The bytes of a report's PDF: written once, never again. */
export const reportFiles = mysqlTable(
  "report_files",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    reportId: id<"report">("report_id").notNull(),
    pdf: bytes("pdf", "longblob").notNull(),
    sha256: bytes("sha256", "binary(32)").notNull(),
    sizeBytes: int("size_bytes").notNull(),
    templateVersion: exactText("template_version", 24).notNull(),
    renderedAt: instant("rendered_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.reportId] }),
    index("report_files_sha256").on(t.sha256),
    foreignKey({ name: "report_files_fk", columns: [t.laboratoryId, t.reportId], foreignColumns: [reports.laboratoryId, reports.id] }),
  ],
);

/** What the public sees of a report, in one row found by its code: no client, no value. */
export const registerEntries = mysqlTable(
  "register_entries",
  {
    code: exactText<RegisterCode>("code", 16).primaryKey(),
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    reportId: id<"report">("report_id").notNull(),
    state: exactText<"issued" | "superseded" | "withdrawn">("state", 12).notNull(),
    view: jsonOf<RegisterView>("view").notNull(),
    pdfSha256: bytes("pdf_sha256", "binary(32)").notNull(),
    issuedAt: instant("issued_at").notNull(),
    supersededByNumber: exactText("superseded_by_number", 24),
    supersededByCode: exactText<RegisterCode>("superseded_by_code", 16),
    withdrawnAt: instant("withdrawn_at"),
    withdrawalReason: exactText<WithdrawalReason>("withdrawal_reason", 16),
    /** Moves with every change; part of the page's ETag. */
    version: int("version").notNull().default(1),
  },
  (t) => [
    uniqueIndex("register_entries_report").on(t.laboratoryId, t.reportId),
    foreignKey({ name: "register_entries_fk", columns: [t.laboratoryId, t.reportId], foreignColumns: [reports.laboratoryId, reports.id] }),
  ],
);

/** The photograph of a report as it stood when it was frozen, JPEG; kept apart so that the entry's row stays small. */
export const registerPhotos = mysqlTable(
  "register_photos",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    reportId: id<"report">("report_id").notNull(),
    jpeg: bytes("jpeg", "mediumblob").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.reportId] }),
    foreignKey({ name: "register_photos_fk", columns: [t.laboratoryId, t.reportId], foreignColumns: [reports.laboratoryId, reports.id] }),
  ],
);
