import { and, asc, eq, isNull } from "drizzle-orm";
import { laboratories, memberships } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";

/** The laboratories that a person works in, by name. */
export async function listMyLaboratories(app: Pick<AppContext, "db">, userId: UserId): Promise<Array<{ slug: string; name: string }>> {
  return app.db
    .select({ slug: laboratories.slug, name: laboratories.name })
    .from(memberships)
    .innerJoin(laboratories, eq(laboratories.id, memberships.laboratoryId))
    .where(and(eq(memberships.userId, userId), isNull(memberships.endedAt)))
    .orderBy(asc(laboratories.name));
}
