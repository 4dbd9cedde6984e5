import { boolean, int, mysqlTable, smallint, uniqueIndex, varchar, bigint, primaryKey } from "drizzle-orm/mysql-core";
import { exactText, id, instant, jsonOf } from "../columns.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";

/** A tenant: a laboratory or a sole valuer. Everything else with a `laboratory_id` belongs to one of these. */
export const laboratories = mysqlTable(
  "laboratories",
  {
    id: id<"laboratory">("id").primaryKey(),
    slug: exactText("slug", 60).notNull(),
    name: varchar("name", { length: 120 }).notNull(),
    /** Leads every number that people see: MQ-26-0417. */
    prefix: exactText("prefix", 6).notNull(),
    isSolePractice: boolean("is_sole_practice").notNull(),
    timeZone: exactText("time_zone", 64).notNull(),
    currency: exactText<CurrencyCode>("currency", 3).notNull(),
    addressLines: jsonOf<string[]>("address_lines").notNull(),
    phone: varchar("phone", { length: 40 }).notNull().default(""),
    email: varchar("email", { length: 254 }).notNull().default(""),
    /** Tax on fees in ten-thousandths: 2000 is 20 %. */
    taxShareE4: int("tax_share_e4").notNull().default(0),
    taxLabel: varchar("tax_label", { length: 40 }).notNull().default("Tax"),
    usualDays: smallint("usual_days").notNull().default(5),
    selfCheckDelayHours: smallint("self_check_delay_hours").notNull().default(24),
    /** What the insurer lets lie in the safe at once; null where no limit was entered. */
    custodyLimitMinor: bigint("custody_limit_minor", { mode: "number" }),
    createdAt: instant("created_at").notNull(),
    version: int("version").notNull().default(1),
  },
  (t) => [uniqueIndex("laboratories_slug").on(t.slug), uniqueIndex("laboratories_prefix").on(t.prefix)],
);

/** The next number of a series (stones, take-ins, reports, invoices) in one year; moved inside the transaction that uses it. */
export const seriesCounters = mysqlTable(
  "series_counters",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull().references(() => laboratories.id),
    series: exactText<"item" | "takeIn" | "report" | "invoice">("series", 12).notNull(),
    year: smallint("year").notNull(),
    lastValue: int("last_value").notNull(),
  },
  (t) => [primaryKey({ columns: [t.laboratoryId, t.series, t.year] })],
);
