import { foreignKey, index, int, mysqlTable, primaryKey, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf } from "../columns.ts";
import type { Confidence, ConclusionDescription, Nature, RejectedAlternative, TreatmentFinding } from "#app/domain/conclusion.ts";
import { users } from "./account.ts";
import { stones } from "./stone.ts";

/** A gemmologist's conclusion. Never edited: a changed mind is the next version. */
export const conclusions = mysqlTable(
  "conclusions",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"conclusion">("id").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    version: int("version").notNull(),
    speciesId: exactText("species_id", 60),
    speciesName: varchar("species_name", { length: 120 }).notNull(),
    variety: varchar("variety", { length: 120 }).notNull(),
    nature: exactText<Nature>("nature", 20).notNull(),
    natureEvidence: varchar("nature_evidence", { length: 1000 }).notNull(),
    confidence: exactText<Confidence>("confidence", 20).notNull(),
    treatments: jsonOf<TreatmentFinding[]>("treatments").notNull(),
    evidence: varchar("evidence", { length: 2000 }).notNull(),
    limits: jsonOf<string[]>("limits").notNull(),
    rejected: jsonOf<RejectedAlternative[]>("rejected").notNull(),
    /** Why a good reading that contradicts the species does not stand against it; empty where none does. */
    contradictionsExplained: varchar("contradictions_explained", { length: 2000 }).notNull().default(""),
    description: jsonOf<ConclusionDescription>("description").notNull(),
    reasoning: text("reasoning").notNull(),
    /** The ranking that the examiner had before them, kept as it was. Internal: never printed. */
    ranking: jsonOf<unknown>("ranking").notNull(),
    speciesTableVersion: exactText("species_table_version", 24).notNull(),
    modelVersion: exactText("model_version", 24).notNull(),
    concludedAt: instant("concluded_at").notNull(),
    concludedBy: id<"user">("concluded_by").notNull().references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("conclusions_version").on(t.laboratoryId, t.stoneId, t.version),
    foreignKey({ name: "conclusions_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
  ],
);

/** A second gemmologist's check, or a sole practitioner's delayed self-check, which is never called a second check. */
export const secondChecks = mysqlTable(
  "second_checks",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"secondCheck">("id").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    conclusionId: id<"conclusion">("conclusion_id").notNull(),
    kind: exactText<"secondCheck" | "selfCheck">("kind", 12).notNull(),
    checkerId: id<"user">("checker_id").notNull().references(() => users.id),
    startedAt: instant("started_at").notNull(),
    /** From here on the first examination is visible to the checker; before it, it is not. */
    comparedAt: instant("compared_at"),
    ownSpecies: varchar("own_species", { length: 120 }).notNull().default(""),
    ownNature: exactText<Nature>("own_nature", 20),
    outcome: exactText<"agreed" | "returned">("outcome", 10),
    reason: varchar("reason", { length: 1000 }).notNull().default(""),
    decidedAt: instant("decided_at"),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("second_checks_conclusion").on(t.laboratoryId, t.conclusionId),
    index("second_checks_stone").on(t.laboratoryId, t.stoneId, t.startedAt),
    foreignKey({ name: "second_checks_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
    foreignKey({ name: "second_checks_conclusion_fk", columns: [t.laboratoryId, t.conclusionId], foreignColumns: [conclusions.laboratoryId, conclusions.id] }),
  ],
);
