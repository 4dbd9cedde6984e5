import { newId } from "#app/db/new-id.server.ts";
import { auditEvents } from "#app/db/schema/index.ts";
import type { Id } from "#app/domain/ids.ts";
import type { LabScope } from "#app/features/lab-context.ts";

type AuditEntry = {
  /** "report.issued": a noun and what became of it. */
  action: string;
  subject: { kind: string; id: Id<string> };
  detail?: Record<string, unknown>;
  reason?: string;
};

/** Says who did what, in the transaction that does it. */
export async function recordAudit(scope: LabScope, { action, subject, detail = {}, reason = "" }: AuditEntry): Promise<void> {
  await scope.db.insert(auditEvents).values({
    laboratoryId: scope.laboratoryId,
    id: newId<"auditEvent">(),
    at: scope.now,
    actorId: scope.actorId,
    action,
    subjectKind: subject.kind,
    subjectId: subject.id,
    detail,
    reason,
  });
}
