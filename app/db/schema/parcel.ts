import { foreignKey, index, int, mysqlTable, primaryKey, smallint, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf, measured } from "../columns.ts";
import type { ParcelColumn, ParcelRanking } from "#app/domain/parcel.ts";
import { users } from "./account.ts";
import { laboratories } from "./laboratory.ts";
import { stones } from "./stone.ts";
import { items } from "./take-in.ts";

/** Many small stones read together, a row a stone. What was typed is never edited: the next table is a parcel of its own. */
export const parcels = mysqlTable(
  "parcels",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    id: id<"parcel">("id").notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    /** What they were handed over in; null: not said yet, and no row can become a stone of its own. */
    itemId: id<"item">("item_id"),
    columns: jsonOf<Array<ParcelColumn | null>>("columns").notNull(),
    /** Of the water that they were weighed in. */
    waterTempC: measured("water_temp_c", 5, 2),
    rowCount: smallint("row_count").notNull(),
    oddCount: smallint("odd_count").notNull(),
    /** What most of the rows ranked as; null where none says anything of identity. */
    mainSpeciesId: exactText("main_species_id", 60),
    mainName: varchar("main_name", { length: 120 }).notNull(),
    speciesTableVersion: exactText("species_table_version", 24).notNull(),
    modelVersion: exactText("model_version", 24).notNull(),
    savedAt: instant("saved_at").notNull(),
    savedBy: id<"user">("saved_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    index("parcels_saved").on(t.laboratoryId, t.savedAt, t.id),
    index("parcels_item").on(t.laboratoryId, t.itemId, t.savedAt),
    foreignKey({ name: "parcels_item_fk", columns: [t.laboratoryId, t.itemId], foreignColumns: [items.laboratoryId, items.id] }),
  ],
);

export const parcelRows = mysqlTable(
  "parcel_rows",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    parcelId: id<"parcel">("parcel_id").notNull(),
    position: int("position").notNull(),
    /** As typed, one text for each of the parcel's columns. */
    cells: jsonOf<string[]>("cells").notNull(),
    ranking: jsonOf<ParcelRanking>("ranking").notNull(),
    /** The stone that it became. */
    stoneId: id<"stone">("stone_id"),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.parcelId, t.position] }),
    uniqueIndex("parcel_rows_stone").on(t.laboratoryId, t.stoneId),
    foreignKey({ name: "parcel_rows_fk", columns: [t.laboratoryId, t.parcelId], foreignColumns: [parcels.laboratoryId, parcels.id] }),
    foreignKey({ name: "parcel_rows_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
  ],
);
