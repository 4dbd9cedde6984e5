import { bigint, boolean, date, foreignKey, int, mysqlTable, primaryKey, text, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf, measured } from "../columns.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";
import type { CertificationPoint, ComparableKind, MarketLevel, ValueType } from "#app/domain/valuation.ts";
import { users } from "./account.ts";
import { conclusions } from "./conclusion.ts";
import { stones } from "./stone.ts";

export const valuations = mysqlTable(
  "valuations",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"valuation">("id").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    /** The checked identity that is valued. */
    conclusionId: id<"conclusion">("conclusion_id").notNull(),
    version: int("version").notNull(),
    state: exactText<"draft" | "signed">("state", 8).notNull(),
    purpose: varchar("purpose", { length: 200 }).notNull(),
    intendedUse: varchar("intended_use", { length: 300 }).notNull(),
    intendedUsers: varchar("intended_users", { length: 300 }).notNull(),
    valueType: exactText<ValueType>("value_type", 32).notNull(),
    valueDefinition: text("value_definition").notNull(),
    valueDefinitionSource: varchar("value_definition_source", { length: 300 }).notNull(),
    marketLevel: exactText<MarketLevel>("market_level", 32).notNull(),
    marketPlace: varchar("market_place", { length: 120 }).notNull(),
    inspection: varchar("inspection", { length: 300 }).notNull(),
    inspectedOn: date("inspected_on", { mode: "string" }),
    effectiveOn: date("effective_on", { mode: "string" }).notNull(),
    currency: exactText<CurrencyCode>("currency", 3).notNull(),
    amountMinor: bigint("amount_minor", { mode: "number" }),
    isTaxIncluded: boolean("is_tax_included").notNull(),
    approachReasoning: text("approach_reasoning").notNull(),
    otherApproachesWhyNot: text("other_approaches_why_not").notNull(),
    limitingConditions: jsonOf<string[]>("limiting_conditions").notNull(),
    certification: jsonOf<CertificationPoint[]>("certification").notNull(),
    priorServices: varchar("prior_services", { length: 500 }).notNull(),
    writtenBy: id<"user">("written_by").notNull().references(() => users.id),
    writtenAt: instant("written_at").notNull(),
    signedBy: id<"user">("signed_by").references(() => users.id),
    signedAt: instant("signed_at"),
    rowVersion: int("row_version").notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("valuations_version").on(t.laboratoryId, t.stoneId, t.version),
    foreignKey({ name: "valuations_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
    foreignKey({ name: "valuations_conclusion_fk", columns: [t.laboratoryId, t.conclusionId], foreignColumns: [conclusions.laboratoryId, conclusions.id] }),
  ],
);

export const valuationComparables = mysqlTable(
  "valuation_comparables",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    valuationId: id<"valuation">("valuation_id").notNull(),
    position: int("position").notNull(),
    kind: exactText<ComparableKind>("kind", 20).notNull(),
    reference: varchar("reference", { length: 300 }).notNull(),
    onDate: date("on_date", { mode: "string" }).notNull(),
    place: varchar("place", { length: 120 }).notNull(),
    description: varchar("description", { length: 300 }).notNull(),
    amountMinor: bigint("amount_minor", { mode: "number" }).notNull(),
    currency: exactText<CurrencyCode>("currency", 3).notNull(),
    /** Units of the valuation's currency for one of this currency, as the appraiser entered it. */
    exchangeRate: measured("exchange_rate", 16, 8).notNull(),
    isPremiumIncluded: boolean("is_premium_included").notNull(),
    isTaxIncluded: boolean("is_tax_included").notNull(),
    /** Sold, or only asked for. */
    isSold: boolean("is_sold").notNull(),
    adjustmentFactor: measured("adjustment_factor", 8, 4).notNull(),
    adjustmentReason: varchar("adjustment_reason", { length: 300 }).notNull(),
    adjustedMinor: bigint("adjusted_minor", { mode: "number" }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.valuationId, t.position] }),
    foreignKey({ name: "valuation_comparables_fk", columns: [t.laboratoryId, t.valuationId], foreignColumns: [valuations.laboratoryId, valuations.id] }),
  ],
);
