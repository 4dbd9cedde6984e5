import { eq, or } from "drizzle-orm";
import { laboratories } from "#app/db/schema/index.ts";
import type { NewLaboratory } from "#app/domain/new-laboratory.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { refuseTaken } from "./refuse-taken.ts";

/** @throws AppError invalid_input beside slug or prefix when a laboratory has it already */
export async function requireFreeNames({ db }: Pick<AppContext, "db">, wanted: Pick<NewLaboratory, "slug" | "prefix">): Promise<void> {
  const taken = await db
    .select({ slug: laboratories.slug, prefix: laboratories.prefix })
    .from(laboratories)
    .where(or(eq(laboratories.slug, wanted.slug), eq(laboratories.prefix, wanted.prefix)));
  if (taken.length > 0) refuseTaken(wanted, taken);
}
