import { foreignKey, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { bytes, exactText, id, instant, measured } from "../columns.ts";
import { users } from "./account.ts";
import { items } from "./take-in.ts";

/** A photograph after re-encoding: no EXIF, no location. The full picture is kept by UploadThing, the thumbnail here. */
export const attachments = mysqlTable(
  "attachments",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"attachment">("id").notNull(),
    itemId: id<"item">("item_id").notNull(),
    stoneId: id<"stone">("stone_id"),
    caption: varchar("caption", { length: 200 }).notNull().default(""),
    fileKey: exactText("file_key", 160).notNull(),
    /** The upload that it was made from: a callback that comes twice makes one attachment. */
    sourceKey: exactText("source_key", 160).notNull(),
    mimeType: exactText("mime_type", 40).notNull(),
    widthPx: int("width_px").notNull(),
    heightPx: int("height_px").notNull(),
    sizeBytes: int("size_bytes").notNull(),
    sha256: bytes("sha256", "binary(32)").notNull(),
    thumbnail: bytes("thumbnail", "mediumblob").notNull(),
    /** Of a photograph through a microscope: its magnification, and what the picture shows from left to right. */
    magnificationX: measured("magnification_x", 7, 2),
    pictureWidthMm: measured("picture_width_mm", 9, 4),
    createdAt: instant("created_at").notNull(),
    createdBy: id<"user">("created_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("attachments_source").on(t.laboratoryId, t.sourceKey),
    index("attachments_item").on(t.laboratoryId, t.itemId, t.createdAt),
    index("attachments_stone").on(t.laboratoryId, t.stoneId, t.createdAt),
    foreignKey({ name: "attachments_item_fk", columns: [t.laboratoryId, t.itemId], foreignColumns: [items.laboratoryId, items.id] }),
  ],
);
