import { sql } from "drizzle-orm";
import { speciesTables } from "#app/db/schema/index.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { loadSpeciesTable } from "./load-species-table.server.ts";

/** Keeps the table that is in use, whole and under its version, so that an old ranking can be understood. */
export async function recordSpeciesTable({ db, now }: Pick<AppContext, "db" | "now">): Promise<string> {
  const { table, rows, sha256 } = loadSpeciesTable();
  await db
    .insert(speciesTables)
    .values({ version: table.version, sha256, rowCount: rows.length, rows: [...rows], loadedAt: now })
    .onDuplicateKeyUpdate({ set: { version: sql`${speciesTables.version}` } });
  return table.version;
}
