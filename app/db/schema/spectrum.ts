import { boolean, double, foreignKey, int, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import type { MeasuredSpectrum, XUnit, YUnit } from "#app/gemmology/spectrum/measured-spectrum.ts";
import type { SpectrumPeak } from "#app/gemmology/spectrum/spectrum-peaks.ts";
import { bytes, exactText, id, instant, jsonOf } from "../columns.ts";
import { users } from "./account.ts";
import { stones } from "./stone.ts";

/** A measured spectrum of a stone. The file as it came is kept by UploadThing; here is what is shown of it. Withdrawn ones stay. */
export const spectra = mysqlTable(
  "spectra",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"spectrum">("id").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    sequence: int("sequence").notNull(),
    /** What was measured and how, in the words of whoever attached it. */
    note: varchar("note", { length: 500 }).notNull().default(""),
    fileKey: exactText("file_key", 160).notNull(),
    fileName: varchar("file_name", { length: 160 }).notNull(),
    sizeBytes: int("size_bytes").notNull(),
    sha256: bytes("sha256", "binary(32)").notNull(),
    format: exactText<MeasuredSpectrum["format"]>("format", 12).notNull(),
    title: varchar("title", { length: 200 }).notNull().default(""),
    kind: exactText<MeasuredSpectrum["kind"]>("kind", 12).notNull(),
    xUnit: exactText<XUnit>("x_unit", 8).notNull(),
    yUnit: exactText<YUnit>("y_unit", 16).notNull(),
    /** The file did not say its units: a person did. */
    isUnitAssumed: boolean("is_unit_assumed").notNull(),
    pointCount: int("point_count").notNull(),
    firstX: double("first_x").notNull(),
    lastX: double("last_x").notNull(),
    /** The curve thinned to what a screen shows, in the file's units. */
    curve: jsonOf<ReadonlyArray<readonly [x: number, y: number]>>("curve").notNull(),
    peaks: jsonOf<readonly SpectrumPeak[]>("peaks").notNull(),
    notes: jsonOf<readonly string[]>("notes").notNull(),
    /** Made by the form: the same file sent twice is kept once. */
    requestId: exactText("request_id", 36).notNull(),
    createdAt: instant("created_at").notNull(),
    createdBy: id<"user">("created_by").notNull().references(() => users.id),
    withdrawnAt: instant("withdrawn_at"),
    withdrawnBy: id<"user">("withdrawn_by").references(() => users.id),
    withdrawnReason: varchar("withdrawn_reason", { length: 500 }).notNull().default(""),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("spectra_sequence").on(t.laboratoryId, t.stoneId, t.sequence),
    uniqueIndex("spectra_request").on(t.laboratoryId, t.requestId),
    foreignKey({ name: "spectra_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
  ],
);
