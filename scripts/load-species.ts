import { openDb } from "#app/db/client.server.ts";
import { recordSpeciesTable } from "#app/features/species/record-species-table.server.ts";

const { db, close } = openDb(process.env.DATABASE_URL ?? "");
await recordSpeciesTable({ db, now: new Date() });
await close();
