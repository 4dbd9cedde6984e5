import { boolean, date, foreignKey, index, int, mysqlTable, primaryKey, smallint, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { exactText, id, instant, measured } from "../columns.ts";
import type { ExaminationState, GoodsState } from "#app/domain/stone-state.ts";
import { users } from "./account.ts";
import { clients } from "./client.ts";
import { items, takeIns } from "./take-in.ts";

/** One stone to be examined. The list columns are kept here so that the logbook reads one index. */
export const stones = mysqlTable(
  "stones",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"stone">("id").notNull(),
    takeInId: id<"takeIn">("take_in_id").notNull(),
    itemId: id<"item">("item_id").notNull(),
    clientId: id<"client">("client_id").notNull(),
    /** MQ-26-0417-1; shown as "MQ-26-0417 · 1". */
    code: exactText("code", 28).notNull(),
    sequence: smallint("sequence").notNull(),
    description: varchar("description", { length: 300 }).notNull(),
    examinationState: exactText<ExaminationState>("examination_state", 12).notNull(),
    examinationStateAt: instant("examination_state_at").notNull(),
    goodsState: exactText<GoodsState>("goods_state", 12).notNull(),
    place: varchar("place", { length: 120 }).notNull(),
    holderId: id<"user">("holder_id").references(() => users.id),
    /** The first examiner: whoever began the examination; the second check is somebody else's. */
    examinerId: id<"user">("examiner_id").references(() => users.id),
    /** Latest good weighing of the loose stone, carats. */
    weightCt: measured("weight_ct", 10, 4),
    weightText: varchar("weight_text", { length: 24 }).notNull().default(""),
    isMounted: boolean("is_mounted").notNull(),
    isValuationOrdered: boolean("is_valuation_ordered").notNull(),
    receivedAt: instant("received_at").notNull(),
    dueOn: date("due_on", { mode: "string" }).notNull(),
    photoId: id<"attachment">("photo_id"),
    /** Observations so far; the next one takes the number after it. */
    observationCount: int("observation_count").notNull().default(0),
    version: int("version").notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    uniqueIndex("stones_code").on(t.laboratoryId, t.code),
    index("stones_received").on(t.laboratoryId, t.receivedAt, t.id),
    index("stones_due").on(t.laboratoryId, t.dueOn, t.id),
    index("stones_state_received").on(t.laboratoryId, t.examinationState, t.receivedAt, t.id),
    index("stones_state_due").on(t.laboratoryId, t.examinationState, t.dueOn, t.id),
    index("stones_goods_received").on(t.laboratoryId, t.goodsState, t.receivedAt, t.id),
    index("stones_client_received").on(t.laboratoryId, t.clientId, t.receivedAt, t.id),
    index("stones_holder_received").on(t.laboratoryId, t.holderId, t.receivedAt, t.id),
    index("stones_item").on(t.laboratoryId, t.itemId, t.sequence),
    foreignKey({ name: "stones_item_fk", columns: [t.laboratoryId, t.itemId], foreignColumns: [items.laboratoryId, items.id] }),
    foreignKey({ name: "stones_take_in_fk", columns: [t.laboratoryId, t.takeInId], foreignColumns: [takeIns.laboratoryId, takeIns.id] }),
    foreignKey({ name: "stones_client_fk", columns: [t.laboratoryId, t.clientId], foreignColumns: [clients.laboratoryId, clients.id] }),
  ],
);

/** Every transition of either state machine: who, when, from, to and why. */
export const stoneEvents = mysqlTable(
  "stone_events",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    id: id<"stoneEvent">("id").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
    machine: exactText<"examination" | "goods">("machine", 12).notNull(),
    fromState: exactText("from_state", 12),
    toState: exactText("to_state", 12).notNull(),
    why: varchar("why", { length: 500 }).notNull(),
    at: instant("at").notNull(),
    by: id<"user">("by").references(() => users.id),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.id] }),
    index("stone_events_stone").on(t.laboratoryId, t.stoneId, t.at),
    foreignKey({ name: "stone_events_stone_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
  ],
);

/** Words of a stone (code, description, client) for the search box: one index range per word. */
export const stoneSearchTokens = mysqlTable(
  "stone_search_tokens",
  {
    laboratoryId: id<"laboratory">("laboratory_id").notNull(),
    token: exactText("token", 40).notNull(),
    receivedAt: instant("received_at").notNull(),
    stoneId: id<"stone">("stone_id").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.laboratoryId, t.token, t.receivedAt, t.stoneId] }),
    index("stone_search_tokens_stone").on(t.laboratoryId, t.stoneId),
    foreignKey({ name: "stone_search_tokens_fk", columns: [t.laboratoryId, t.stoneId], foreignColumns: [stones.laboratoryId, stones.id] }),
  ],
);
