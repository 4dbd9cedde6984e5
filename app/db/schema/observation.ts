import { boolean, foreignKey, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf, measured } from "../columns.ts";
import type { ObservationKind, ReadingDetail, ReadingQuality } from "#app/domain/reading.ts";
import { users } from "./account.ts";
import type { RecallDeed } from "#app/domain/recall.ts";
import { instrumentChecks, instrumentCorrections, instruments } from "./instrument.ts";
import { stones } from "./stone.ts";

/** What an instrument showed, as it was seen. Append-only: never updated, never deleted; see observation_strikes. */
export const observations = mysqlTable(
  "observations",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"observation">("id").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    sequence: int("sequence").notNull(),
    kind: exactText<ObservationKind>("kind", 20).notNull(),
    /** Null: the first examination; else the second check that it was made for. */
    secondCheckId: id<"secondCheck">("second_check_id"),
    instrumentId: id<"instrument">("instrument_id"),
    /** The last passed check of the instrument when the reading was made. */
    instrumentCheckId: id<"instrumentCheck">("instrument_check_id"),
    /** The correction that its numbers were read with; null: none was in force. */
    instrumentCorrectionId: id<"instrumentCorrection">("instrument_correction_id"),
    observerId: id<"user">("observer_id").notNull().references(() => users.id),
    observedAt: instant("observed_at").notNull(),
    recordedAt: instant("recorded_at").notNull(),
    /** What was seen or the conditions, in the vocabulary of the kind; numbers live in observation_values. */
    detail: jsonOf<ReadingDetail>("detail").notNull(),
    quality: exactText<ReadingQuality>("quality", 10).notNull(),
    noResultReason: varchar("no_result_reason", { length: 200 }).notNull().default(""),
    note: varchar("note", { length: 2000 }).notNull().default(""),
    /** Whether the observer had candidates in view; readings made blind weigh more with a colleague. */
    isBlind: boolean("is_blind").notNull(),
    /** Made by the form: the same reading sent twice is kept once. */
    requestId: exactText("request_id", 36).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("observations_sequence").on(t.laboratoryId, t.stoneId, t.sequence),
    uniqueIndex("observations_request").on(t.laboratoryId, t.requestId),
    index("observations_instrument").on(t.laboratoryId, t.instrumentId, t.observedAt),
    foreignKey({ name: "observations_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
    foreignKey({ name: "observations_instrument_fk", columns: [t.laboratoryId, t.instrumentId], foreignColumns: [instruments.laboratoryId, instruments.id] }),
    foreignKey({ name: "observations_correction_fk", columns: [t.laboratoryId, t.instrumentCorrectionId], foreignColumns: [instrumentCorrections.laboratoryId, instrumentCorrections.id] }),
  ],
);

/** One number of an observation: the decimal at the instrument's resolution and the digits as typed, or a derived value with its formula. */
export const observationValues = mysqlTable(
  "observation_values",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    observationId: id<"observation">("observation_id").notNull(),
    name: exactText("name", 24).notNull(),
    value: measured("value", 16, 7).notNull(),
    /** What the instrument showed, where a correction was added to it; null: `value` is what it showed. */
    rawValue: measured("raw_value", 16, 7),
    /** Exactly what was typed ("1,540" is not "1.54"); empty for a derived value. */
    typedText: varchar("typed_text", { length: 24 }).notNull().default(""),
    unit: exactText("unit", 8).notNull(),
    standardUncertainty: measured("standard_uncertainty", 16, 7),
    /** Derived values name their formula and its version; null for what was read. */
    formula: varchar("formula", { length: 60 }),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.observationId, t.name] }),
    foreignKey({ name: "observation_values_fk", columns: [t.laboratoryId, t.observationId], foreignColumns: [observations.laboratoryId, observations.id] }),
  ],
);

/** A reading struck through: it stays legible, with who, when and why. One strike a reading. */
export const observationStrikes = mysqlTable(
  "observation_strikes",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    observationId: id<"observation">("observation_id").notNull(),
    reason: varchar("reason", { length: 500 }).notNull(),
    struckAt: instant("struck_at").notNull(),
    struckBy: id<"user">("struck_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.observationId] }),
    foreignKey({ name: "observation_strikes_fk", columns: [t.laboratoryId, t.observationId], foreignColumns: [observations.laboratoryId, observations.id] }),
  ],
);

/**
 * What was done about a reading whose instrument failed a check after it. It settles every failure up to its own
 * instant; a later one calls the reading back again.
 */
export const recallDeeds = mysqlTable(
  "recall_deeds",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    observationId: id<"observation">("observation_id").notNull(),
    /** The latest failed check that it answers. */
    failedCheckId: id<"instrumentCheck">("failed_check_id").notNull(),
    deed: exactText<RecallDeed>("deed", 16).notNull(),
    reason: varchar("reason", { length: 1000 }).notNull(),
    /** The later reading of the same kind that stands in its place. */
    remeasuredById: id<"observation">("remeasured_by_id"),
    doneAt: instant("done_at").notNull(),
    doneBy: id<"user">("done_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.observationId, t.failedCheckId] }),
    index("recall_deeds_done").on(t.laboratoryId, t.doneAt),
    foreignKey({ name: "recall_deeds_observation_fk", columns: [t.laboratoryId, t.observationId], foreignColumns: [observations.laboratoryId, observations.id] }),
    foreignKey({ name: "recall_deeds_check_fk", columns: [t.laboratoryId, t.failedCheckId], foreignColumns: [instrumentChecks.laboratoryId, instrumentChecks.id] }),
  ],
);
