import { int, mysqlTable } from "drizzle-orm/mysql-core";
import { bytes, exactText, instant, jsonOf } from "../columns.ts";

/** Each species table that was ever in use, whole, so that an old ranking can be understood. Shared by all laboratories. */
export const speciesTables = mysqlTable("species_tables", {
  version: exactText("version", 24).primaryKey(),
  sha256: bytes("sha256", "binary(32)").notNull(),
  rowCount: int("row_count").notNull(),
  rows: jsonOf<unknown[]>("rows").notNull(),
  loadedAt: instant("loaded_at").notNull(),
});
