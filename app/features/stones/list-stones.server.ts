import { and, asc, desc, eq, gt, gte, inArray, lt, lte, or, sql, type SQL } from "drizzle-orm";
import { unionAll } from "drizzle-orm/mysql-core";
import { clients, memberships, stoneSearchTokens, stones, users } from "#app/db/schema/index.ts";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import type { AttachmentId, ClientId, StoneId, UserId } from "#app/domain/ids.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import type { ExaminationState, GoodsState } from "#app/domain/stone-state.ts";
import { endOfWeek } from "#app/domain/working-days.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { queryTokens } from "./search-tokens.ts";
import { statesInTheHouse, unfinishedStates, type DueFilter, type StoneSort, type StoneStateFilter } from "./stone-filter.ts";

export type StoneQuery = {
  state?: StoneStateFilter;
  clientId?: ClientId;
  holderId?: UserId;
  due?: DueFilter;
  search?: string;
  sort?: StoneSort;
  /** Received: latest first unless turned; due: earliest first unless turned. */
  isTurned?: boolean;
  after?: StoneCursor;
  before?: StoneCursor;
  pageSize?: number;
};
/** The last row seen: its sorted column, as milliseconds or as a date, and its id. */
export type StoneCursor = { key: string; id: StoneId };

export type StoneListItem = {
  id: StoneId;
  code: string;
  description: string;
  weightText: string;
  isMounted: boolean;
  examinationState: ExaminationState;
  goodsState: GoodsState;
  place: string;
  receivedAt: Date;
  dueOn: string;
  isOverdue: boolean;
  photoRef: string | null;
  clientRef: string;
  client: string;
  holder: string | null;
};
export type StonePage = { stones: StoneListItem[]; members: Array<{ ref: string; name: string }>; clientName: string | null; earlier: StoneCursor | null; later: StoneCursor | null };

type Row = {
  id: StoneId;
  clientId: ClientId;
  holderId: UserId | null;
  code: string;
  description: string;
  weightText: string;
  isMounted: boolean;
  examinationState: ExaminationState;
  goodsState: GoodsState;
  place: string;
  receivedAt: Date;
  dueOn: string;
  photoId: AttachmentId | null;
};

/** One range of one index: what is equal in it, and the index that holds it in the order asked for. */
type Range = { where: SQL | undefined; index: string };

/**
 * A page of the logbook, read from one index range in its own order (a few ranges for "in the house" and "overdue"),
 * so that a page costs the same in a book of a thousand stones and of a million. The optimiser is told the index: with
 * many laboratories it prefers one that it has to sort.
 */
export async function listStones(ctx: LabContext, query: StoneQuery = {}): Promise<StonePage> {
  requireRole(ctx, "stones.read");
  const { after, before, pageSize = 50 } = query;
  const today = calendarDateIn(ctx.now, ctx.laboratory.timeZone);
  const isBackward = before !== undefined;
  const rows = await readRows(ctx, query, { today, limit: pageSize + 1 });
  const hasMore = rows.length > pageSize;
  const page = rows.slice(0, pageSize);
  if (isBackward) page.reverse();
  const { clientNames, members } = await readNames(ctx, [...new Set([...page.map((row) => row.clientId), ...(query.clientId ? [query.clientId] : [])])]);
  const sort = effectiveSort(query);
  const cursor = (row: Row | undefined): StoneCursor | null => (row ? { key: sort === "due" ? row.dueOn : String(row.receivedAt.getTime()), id: row.id } : null);
  return {
    stones: page.map(({ id, clientId, holderId, photoId, ...row }) => ({
      ...row,
      id,
      isOverdue: row.dueOn < today && row.goodsState !== "released" && unfinishedStates.includes(row.examinationState),
      photoRef: photoId && shortRef(photoId),
      clientRef: shortRef(clientId),
      client: clientNames.get(clientId) ?? "",
      holder: (holderId && members.get(holderId)?.name) ?? null,
    })),
    members: [...members].filter(([, member]) => member.isActive).map(([id, { name }]) => ({ ref: shortRef(id), name })),
    clientName: (query.clientId && clientNames.get(query.clientId)) ?? null,
    earlier: (isBackward ? hasMore : after !== undefined) ? cursor(page[0]) : null,
    later: isBackward || hasMore ? cursor(page.at(-1)) : null,
  };
}

/** Filters that only one index serves decide the order: a client's and a person's stones come by their date of receipt. */
export function effectiveSort({ sort = "received", due, clientId, holderId, search, state }: StoneQuery): StoneSort {
  if (clientId || holderId || queryTokens(search ?? "").length > 0) return "received";
  if (due) return "due";
  if (sort === "due" && (state === "house" || state === "released")) return "received";
  return sort;
}

async function readRows(ctx: LabContext, query: StoneQuery, { today, limit }: { today: string; limit: number }): Promise<Row[]> {
  const { db, laboratoryId } = ctx;
  const { after, before, isTurned = false } = query;
  const sort = effectiveSort(query);
  const isDescending = (sort === "received") !== isTurned !== (before !== undefined);
  const direction = isDescending ? desc : asc;
  const edge = before ?? after;
  const tokens = queryTokens(query.search ?? "");
  if (query.search?.trim() && tokens.length === 0) return [];

  const fields = {
    id: stones.id,
    clientId: stones.clientId,
    holderId: stones.holderId,
    code: stones.code,
    description: stones.description,
    weightText: stones.weightText,
    isMounted: stones.isMounted,
    examinationState: stones.examinationState,
    goodsState: stones.goodsState,
    place: stones.place,
    receivedAt: stones.receivedAt,
    dueOn: stones.dueOn,
    photoId: stones.photoId,
  };

  if (tokens.length > 0) {
    const [first, ...others] = tokens as [string, ...string[]];
    const { receivedAt, stoneId } = stoneSearchTokens;
    return db
      .select(fields)
      .from(stoneSearchTokens, { forceIndex: "PRIMARY" })
      .innerJoin(stones, and(eq(stones.laboratoryId, stoneSearchTokens.laboratoryId), eq(stones.id, stoneId)))
      .where(
        and(
          eq(stoneSearchTokens.laboratoryId, laboratoryId),
          eq(stoneSearchTokens.token, first),
          edge && past({ at: receivedAt, value: new Date(Number(edge.key)), id: stoneId, edgeId: edge.id, isDescending }),
          ...others.map(
            (token) =>
              sql`exists (select 1 from ${stoneSearchTokens} also where also.laboratory_id = ${stoneSearchTokens.laboratoryId} and also.token = ${token} and also.received_at = ${receivedAt} and also.stone_id = ${stoneId})`,
          ),
          allFilters(query, today),
        ),
      )
      .orderBy(direction(receivedAt), direction(stoneId))
      .limit(limit);
  }

  const key = sort === "due" ? stones.dueOn : stones.receivedAt;
  const pastEdge = edge && past({ at: key, value: sort === "due" ? edge.key : new Date(Number(edge.key)), id: stones.id, edgeId: edge.id, isDescending });
  const reads = rangesOf(query, { sort, today }).map(({ where, index }) =>
    db
      .select(fields)
      .from(stones, { forceIndex: index })
      .where(and(eq(stones.laboratoryId, laboratoryId), where, pastEdge))
      .orderBy(direction(key), direction(stones.id))
      .limit(limit),
  );
  if (reads.length === 1) return reads[0]!;
  // Joined flat: Drizzle's own union nests, and every level of it reads all rows below once more.
  const all = sql.join(reads.map((read) => sql`(${read.getSQL()})`), sql` union all `);
  const bare = Object.fromEntries(Object.entries(fields).map(([name, column]) => [name, sql`${sql.identifier(column.name)}`.mapWith(column)]));
  const rows = await db
    .select(bare)
    .from(sql`(${all}) as page`)
    .orderBy(direction(sql`${sql.identifier(key.name)}`), direction(sql`id`))
    .limit(limit);
  return rows as Row[];
}

function rangesOf(query: StoneQuery, { sort, today }: { sort: StoneSort; today: string }): Range[] {
  const { state, clientId, holderId, due } = query;
  if (clientId || holderId) return [{ where: allFilters(query, today), index: clientId ? "stones_client_received" : "stones_holder_received" }];
  if (due) {
    const inTime = dueCondition(due, today);
    const examination = state && state !== "house" && state !== "released" ? [state] : unfinishedStates;
    const goods = state === "released" ? eq(stones.goodsState, "released") : state === "house" ? inArray(stones.goodsState, [...statesInTheHouse]) : undefined;
    return examination.map((one) => ({ where: and(eq(stones.examinationState, one), inTime, goods), index: "stones_state_due" }));
  }
  if (state === "house") return statesInTheHouse.map((one) => ({ where: eq(stones.goodsState, one), index: "stones_goods_received" }));
  if (state === "released") return [{ where: eq(stones.goodsState, "released"), index: "stones_goods_received" }];
  if (state) return [{ where: eq(stones.examinationState, state), index: sort === "due" ? "stones_state_due" : "stones_state_received" }];
  return [{ where: undefined, index: sort === "due" ? "stones_due" : "stones_received" }];
}

function allFilters({ state, clientId, holderId, due }: StoneQuery, today: string): SQL | undefined {
  return and(
    clientId && eq(stones.clientId, clientId),
    holderId && eq(stones.holderId, holderId),
    state === "house" ? inArray(stones.goodsState, [...statesInTheHouse]) : state === "released" ? eq(stones.goodsState, "released") : state && eq(stones.examinationState, state),
    due && and(dueCondition(due, today), inArray(stones.examinationState, [...unfinishedStates])),
  );
}

function dueCondition(due: DueFilter, today: string): SQL | undefined {
  return due === "overdue" ? lt(stones.dueOn, today) : and(gte(stones.dueOn, today), lte(stones.dueOn, endOfWeek(today)));
}

type Key = typeof stones.receivedAt | typeof stones.dueOn | typeof stoneSearchTokens.receivedAt;

function past({ at, value, id, edgeId, isDescending }: { at: Key; value: Date | string; id: typeof stones.id | typeof stoneSearchTokens.stoneId; edgeId: StoneId; isDescending: boolean }): SQL | undefined {
  const beyond = isDescending ? lt : gt;
  return or(beyond(at, value), and(eq(at, value), beyond(id, edgeId)));
}

async function readNames(ctx: LabContext, clientIds: ClientId[]) {
  const { db, laboratoryId } = ctx;
  const people = db
    .select({ id: users.id, name: users.name, isActive: sql<number>`${memberships.endedAt} is null` })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(eq(memberships.laboratoryId, laboratoryId));
  const theirs = db
    .select({ id: sql<UserId>`${clients.id}`.mapWith(users.id), name: sql<string>`${clients.name}`, isActive: sql<number>`-1` })
    .from(clients)
    .where(and(eq(clients.laboratoryId, laboratoryId), inArray(clients.id, clientIds)));
  const rows = clientIds.length > 0 ? await unionAll(people, theirs) : await people;
  const clientNames = new Map<ClientId, string>();
  const members = new Map<UserId, { name: string; isActive: boolean }>();
  for (const { id, name, isActive } of rows) {
    if (Number(isActive) === -1) clientNames.set(id as unknown as ClientId, name);
    else members.set(id, { name, isActive: Number(isActive) === 1 });
  }
  return { clientNames, members };
}
