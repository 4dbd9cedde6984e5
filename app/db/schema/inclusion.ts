import { foreignKey, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import type { CutOutlineCode } from "#app/domain/cut-outline/cut-outline.ts";
import type { InclusionAmount, InclusionDepth, InclusionType, PlotSide } from "#app/domain/inclusion.ts";
import { exactText, id, instant, measured } from "../columns.ts";
import { users } from "./account.ts";
import { attachments } from "./attachment.ts";
import { stones } from "./stone.ts";

/** Something seen in a stone, placed on a photograph, on the outline of its cut, or on both. Append-only but for its one strike. */
export const inclusions = mysqlTable(
  "inclusions",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"inclusion">("id").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    sequence: int("sequence").notNull(),
    type: exactText<InclusionType>("type", 20).notNull(),
    /** What it is where no word of the vocabulary fits. */
    otherText: varchar("other_text", { length: 60 }).notNull().default(""),
    photoId: id<"attachment">("photo_id"),
    /** Shares of the picture's width from the left and of its height from the top. */
    photoX: measured("photo_x", 5, 4),
    photoY: measured("photo_y", 5, 4),
    plotSide: exactText<PlotSide>("plot_side", 8),
    plotX: measured("plot_x", 5, 4),
    plotY: measured("plot_y", 5, 4),
    depth: exactText<InclusionDepth>("depth", 12).notNull(),
    amount: exactText<InclusionAmount>("amount", 8).notNull(),
    sizeMm: measured("size_mm", 9, 4),
    /** The digits as typed; empty where no size was given. */
    sizeText: varchar("size_text", { length: 24 }).notNull().default(""),
    note: varchar("note", { length: 500 }).notNull().default(""),
    observerId: id<"user">("observer_id").notNull().references(() => users.id),
    recordedAt: instant("recorded_at").notNull(),
    struckAt: instant("struck_at"),
    struckBy: id<"user">("struck_by").references(() => users.id),
    struckReason: varchar("struck_reason", { length: 500 }).notNull().default(""),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("inclusions_sequence").on(t.laboratoryId, t.stoneId, t.sequence),
    index("inclusions_photo").on(t.laboratoryId, t.photoId),
    foreignKey({ name: "inclusions_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
    foreignKey({ name: "inclusions_photo_fk", columns: [t.laboratoryId, t.photoId], foreignColumns: [attachments.laboratoryId, attachments.id] }),
  ],
);

/** Which drawn outline a stone's inclusions are plotted on. */
export const stonePlots = mysqlTable(
  "stone_plots",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    outline: exactText<CutOutlineCode>("outline", 16).notNull(),
    changedAt: instant("changed_at").notNull(),
    changedBy: id<"user">("changed_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.stoneId] }),
    foreignKey({ name: "stone_plots_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
  ],
);
