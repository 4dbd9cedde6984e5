import { and, eq } from "drizzle-orm";
import { registerEntries, registerPhotos } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { RegisterCode } from "#app/domain/register-code.ts";
import type { AppContext } from "#app/features/app-context.ts";

/** The photograph of an issued report, found by its code alone like the page that shows it. */
export async function getRegisterPhoto(app: Pick<AppContext, "db">, code: RegisterCode): Promise<Buffer> {
  const [row] = await app.db
    .select({ jpeg: registerPhotos.jpeg })
    .from(registerEntries)
    .innerJoin(registerPhotos, and(eq(registerPhotos.laboratoryId, registerEntries.laboratoryId), eq(registerPhotos.reportId, registerEntries.reportId)))
    .where(eq(registerEntries.code, code));
  if (!row) throw new AppError("not_found", "There is no photograph for this code.");
  return row.jpeg;
}
