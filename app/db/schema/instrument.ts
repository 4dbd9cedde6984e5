import { boolean, date, foreignKey, index, int, mysqlTable, primaryKey, smallint, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf, measured } from "../columns.ts";
import type { InstrumentKind } from "#app/domain/instrument-kind.ts";
import type { ScaleUnit } from "#app/domain/instrument-scale.ts";
import type { Correction } from "#app/gemmology/calibration/correction.ts";
import { users } from "./account.ts";
import { laboratories } from "./laboratory.ts";

export type { InstrumentKind } from "#app/domain/instrument-kind.ts";

export const instruments = mysqlTable(
  "instruments",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    id: id<"instrument">("id").notNull(),
    kind: exactText<InstrumentKind>("kind", 20).notNull(),
    /** The laboratory's own short name, as on its label: R2, B1. */
    name: varchar("name", { length: 40 }).notNull(),
    description: varchar("description", { length: 200 }).notNull().default(""),
    serial: varchar("serial", { length: 80 }).notNull().default(""),
    location: varchar("location", { length: 80 }).notNull().default(""),
    status: exactText<"inService" | "restricted" | "outOfService">("status", 12).notNull().default("inService"),
    statusReason: varchar("status_reason", { length: 300 }).notNull().default(""),
    /** In what its scale is read; null: the kind's usual unit, or no scale. */
    scaleUnit: exactText<ScaleUnit>("scale_unit", 4),
    /** Days from one check to the next; null: what is usual for the kind. */
    checkDays: smallint("check_days"),
    /** Smallest step that is read, in the instrument's own unit. */
    resolution: measured("resolution", 12, 6),
    /** Standard uncertainty of one reading in the laboratory's own study; null: the default for the kind. */
    standardUncertainty: measured("standard_uncertainty", 12, 6),
    /** Refractometers: the highest index that the contact liquid lets be read. */
    upperLimit: measured("upper_limit", 12, 6),
    /** Angle refractometers: index of the prism at 589.3 nm. */
    prismIndex: measured("prism_index", 12, 6),
    createdAt: instant("created_at").notNull(),
    version: int("version").notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("instruments_name").on(t.laboratoryId, t.name),
  ],
);

/** A piece whose value or look is known: quartz of known index, a check weight, a lamp's line. */
export const referenceMaterials = mysqlTable(
  "reference_materials",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    id: id<"referenceMaterial">("id").notNull(),
    /** As on its label, with which of its values it is: "Quartz Q1, ordinary ray". */
    name: varchar("name", { length: 120 }).notNull(),
    forKind: exactText<InstrumentKind>("for_kind", 20).notNull(),
    unit: exactText<ScaleUnit>("unit", 4),
    /** Null where it is judged by the eye: then `expectedText` says how it looks. */
    nominalValue: measured("nominal_value", 14, 6),
    standardUncertainty: measured("standard_uncertainty", 14, 6),
    limitValue: measured("limit_value", 14, 6),
    expectedText: varchar("expected_text", { length: 200 }).notNull().default(""),
    /** Certificate, or the literature that its value is taken from. */
    source: varchar("source", { length: 300 }).notNull(),
    condition: varchar("condition", { length: 300 }).notNull().default(""),
    conditionSeenOn: date("condition_seen_on", { mode: "string" }),
    isRetired: boolean("is_retired").notNull().default(false),
    createdAt: instant("created_at").notNull(),
    version: int("version").notNull().default(1),
  },
  (t) => [primaryKey({ columns: [t.laboratoryId, t.id] }), uniqueIndex("reference_materials_name").on(t.laboratoryId, t.name)],
);

/** What is added to every reading of an instrument from one instant on, worked out from its checks. Never edited: the next one follows. */
export const instrumentCorrections = mysqlTable(
  "instrument_corrections",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"instrumentCorrection">("id").notNull(),
    instrumentId: id<"instrument">("instrument_id").notNull(),
    correction: jsonOf<Correction>("correction").notNull(),
    /** The checks that it was worked out from. */
    checkIds: jsonOf<string[]>("check_ids").notNull(),
    reason: varchar("reason", { length: 300 }).notNull(),
    fromAt: instant("from_at").notNull(),
    madeBy: id<"user">("made_by").notNull().references(() => users.id),
    endedAt: instant("ended_at"),
    endedBy: id<"user">("ended_by").references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    index("instrument_corrections_instrument").on(t.laboratoryId, t.instrumentId, t.fromAt),
    foreignKey({ name: "instrument_corrections_fk", columns: [t.laboratoryId, t.instrumentId], foreignColumns: [instruments.laboratoryId, instruments.id] }),
  ],
);

export const instrumentChecks = mysqlTable(
  "instrument_checks",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"instrumentCheck">("id").notNull(),
    instrumentId: id<"instrument">("instrument_id").notNull(),
    /** Its name when it was read; the row may be renamed since. */
    referenceMaterial: varchar("reference_material", { length: 120 }).notNull(),
    /** Null: named by hand, not from the laboratory's list. */
    referenceMaterialId: id<"referenceMaterial">("reference_material_id"),
    /** Null, with the reading's and the limit's, where the eye judges. */
    nominalValue: measured("nominal_value", 14, 6),
    nominalUncertainty: measured("nominal_uncertainty", 14, 6),
    /** As the instrument showed it; the correction in force then is in `correctedValue`. */
    readingValue: measured("reading_value", 14, 6),
    readingText: varchar("reading_text", { length: 200 }).notNull(),
    correctionId: id<"instrumentCorrection">("correction_id"),
    /** Null where no correction was in force. */
    correctedValue: measured("corrected_value", 14, 6),
    limitValue: measured("limit_value", 14, 6),
    isPassed: boolean("is_passed").notNull(),
    /** Of a failed check: readings after this instant are in doubt; null: all there were. */
    recallSince: instant("recall_since"),
    tempC: measured("temp_c", 5, 1),
    note: varchar("note", { length: 500 }).notNull().default(""),
    nextDueOn: date("next_due_on", { mode: "string" }).notNull(),
    checkedAt: instant("checked_at").notNull(),
    checkedBy: id<"user">("checked_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    index("instrument_checks_instrument").on(t.laboratoryId, t.instrumentId, t.checkedAt),
    foreignKey({ name: "instrument_checks_fk", columns: [t.laboratoryId, t.instrumentId], foreignColumns: [instruments.laboratoryId, instruments.id] }),
    foreignKey({ name: "instrument_checks_reference_fk", columns: [t.laboratoryId, t.referenceMaterialId], foreignColumns: [referenceMaterials.laboratoryId, referenceMaterials.id] }),
    foreignKey({ name: "instrument_checks_correction_fk", columns: [t.laboratoryId, t.correctionId], foreignColumns: [instrumentCorrections.laboratoryId, instrumentCorrections.id] }),
  ],
);
