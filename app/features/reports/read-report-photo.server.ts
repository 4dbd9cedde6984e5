import { and, eq } from "drizzle-orm";
import type { Db, Tx } from "#app/db/client.server.ts";
import { registerPhotos } from "#app/db/schema/index.ts";
import type { LaboratoryId, ReportId } from "#app/domain/ids.ts";

/** The photograph that was frozen with a report; undefined where it has none. */
export async function readReportPhoto(app: { db: Db | Tx }, { laboratoryId, reportId }: { laboratoryId: LaboratoryId; reportId: ReportId }): Promise<Buffer | undefined> {
  const [row] = await app.db
    .select({ jpeg: registerPhotos.jpeg })
    .from(registerPhotos)
    .where(and(eq(registerPhotos.laboratoryId, laboratoryId), eq(registerPhotos.reportId, reportId)));
  return row?.jpeg;
}
