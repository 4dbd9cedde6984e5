import { and, eq } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { clients, custodyEvents, instruments, itemConsents, items, stoneEvents, stones, takeIns } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { addDays, calendarDateIn } from "#app/domain/calendar-date.ts";
import { consentCodes, type ConsentCode } from "#app/domain/consent-code.ts";
import { parseDecimal } from "#app/domain/decimal.ts";
import type { ClientId, InstrumentId, StoneId, TakeInId } from "#app/domain/ids.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import { money } from "#app/domain/money/money.ts";
import { seriesNumber } from "#app/domain/series-number.ts";
import type { Capacity, MountState, ReturnMethod } from "#app/domain/take-in.ts";
import { addWorkingDays } from "#app/domain/working-days.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { ClientDetails } from "#app/features/clients/client-forms.server.ts";
import { custodyStanding } from "#app/features/custody/custody-standing.server.ts";
import { createInvoice } from "#app/features/invoices/create-invoice.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { nextInSeries } from "#app/features/laboratories/next-in-series.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { indexStoneSearch } from "#app/features/stones/index-stone-search.server.ts";
import { examinedCount } from "./examined-count.ts";
import { neutralWordsMessage } from "./neutral-words.ts";
import { servicesOf } from "./services-of.ts";
import { massProblem, mostItems, stoneCountProblem } from "./take-in-limits.ts";

export type TakeInItem = {
  description: string;
  mount: MountState;
  stoneCount: number;
  massText: string;
  massUnit: "ct" | "g";
  balanceId: InstrumentId;
  condition: string;
  /** The client's figure in the laboratory's currency, or null where the client gave none. */
  declaredValue: number | null;
  consents: readonly ConsentCode[];
  seal: string;
};

export type TakeInInput = {
  /** The same one sent twice makes one take-in. */
  requestId: string;
  client: { id: ClientId } | { new: ClientDetails };
  handedOverBy: string;
  capacity: Capacity;
  returnMethod: ReturnMethod;
  clientStatements: string;
  /** Left out: the laboratory's usual working days from now. */
  dueOn?: string;
  place: string;
  isValuationWanted: boolean;
  items: readonly TakeInItem[];
  /** Why goods above the insurer's limit are taken in all the same; counts only from an owner. */
  limitOverrideNote?: string;
};

export type TakenIn = { takeInId: TakeInId; number: string };

const latestDueDays = 730;

/**
 * Takes goods into custody: client, receipt, items, stones, consents, the first hand-over and the invoice, all or
 * nothing. Agreeing the fee is part of it, so a fee never follows from what the stone turns out to be.
 */
export async function takeInItems(ctx: LabContext, input: TakeInInput): Promise<TakenIn> {
  requireRole(ctx, "takeIn.create");
  const made = await findByRequest(ctx, input.requestId);
  if (made) return made;
  const today = calendarDateIn(ctx.now, ctx.laboratory.timeZone);
  const dueOn = input.dueOn ?? addWorkingDays(today, ctx.laboratory.usualDays);
  refuseUnusable(input, { today, dueOn });
  try {
    return await inTransaction(ctx.db, (tx) => write({ ...ctx, db: tx }, input, { today, dueOn }));
  } catch (error) {
    // The same form, sent twice at once: the first one won.
    const first = constraintKind(error) === "duplicate" ? await findByRequest(ctx, input.requestId) : undefined;
    if (first) return first;
    throw error;
  }
}

async function write(ctx: LabContext, input: TakeInInput, { today, dueOn }: { today: string; dueOn: string }): Promise<TakenIn> {
  const { db, laboratoryId, laboratory, now, actorId } = ctx;
  const year = Number(today.slice(0, 4));
  // The first number taken locks the series, so that take-ins of one laboratory follow one another from here on.
  const number = seriesNumber({ prefix: laboratory.prefix, series: "takeIn", year, value: await nextInSeries(ctx, { series: "takeIn", year }) });
  await refuseAboveLimit(ctx, input);
  await refuseUnusableBalances(ctx, input);

  const clientId = "id" in input.client ? await existingClient(ctx, input.client.id) : await newClient(ctx, input.client.new);
  const takeInId = newId<"takeIn">();
  const services = servicesOf({ isSolePractice: laboratory.isSolePractice, isValuationWanted: input.isValuationWanted });
  await db.insert(takeIns).values({
    laboratoryId,
    id: takeInId,
    number,
    clientId,
    handedOverBy: input.handedOverBy,
    capacity: input.capacity,
    receivedAt: now,
    receivedBy: actorId,
    dueOn,
    services,
    returnMethod: input.returnMethod,
    clientStatements: input.clientStatements,
    feeAgreedAt: now,
    requestId: input.requestId,
  });

  const stoneIds: StoneId[] = [];
  for (const [index, item] of input.items.entries()) {
    const itemNumber = seriesNumber({ prefix: laboratory.prefix, series: "item", year, value: await nextInSeries(ctx, { series: "item", year }) });
    const itemId = newId<"item">();
    const mass = { massValue: parseDecimal(item.massText)!, massText: item.massText, massUnit: item.massUnit };
    await db.insert(items).values({
      laboratoryId,
      id: itemId,
      takeInId,
      position: index + 1,
      number: itemNumber,
      description: item.description,
      stoneCount: item.stoneCount,
      mount: item.mount,
      ...mass,
      balanceId: item.balanceId,
      condition: item.condition,
      declaredValueMinor: item.declaredValue,
      declaredCurrency: item.declaredValue === null ? null : laboratory.currency,
    });
    await db.insert(itemConsents).values(
      consentCodes.map((code) => ({ laboratoryId, itemId, code, isGiven: item.consents.includes(code), recordedAt: now, recordedBy: actorId })),
    );
    await db.insert(custodyEvents).values({
      laboratoryId,
      id: newId<"custodyEvent">(),
      itemId,
      sequence: 1,
      purpose: "received",
      fromPlace: "Client",
      toPlace: input.place,
      ...mass,
      seal: item.seal,
      at: now,
      by: actorId,
    });
    const isOneLoose = item.mount === "loose" && item.stoneCount === 1 && item.massUnit === "ct";
    const rows = Array.from({ length: examinedCount(item) }, (_, at) => ({
      laboratoryId,
      id: newId<"stone">(),
      takeInId,
      itemId,
      clientId,
      code: `${itemNumber}-${at + 1}`,
      sequence: at + 1,
      description: item.description,
      examinationState: "received" as const,
      examinationStateAt: now,
      goodsState: "safe" as const,
      place: input.place,
      weightCt: isOneLoose ? mass.massValue : null,
      weightText: isOneLoose ? item.massText : "",
      isMounted: item.mount !== "loose",
      isValuationOrdered: input.isValuationWanted,
      receivedAt: now,
      dueOn,
    }));
    await db.insert(stones).values(rows);
    await db.insert(stoneEvents).values(
      rows.flatMap(({ id: stoneId }) =>
        (["examination", "goods"] as const).map((machine) => ({
          laboratoryId,
          id: newId<"stoneEvent">(),
          stoneId,
          machine,
          fromState: null,
          toState: machine === "goods" ? "safe" : "received",
          why: "Taken in",
          at: now,
          by: actorId,
        })),
      ),
    );
    stoneIds.push(...rows.map((row) => row.id));
  }
  await indexStoneSearch(ctx, stoneIds);
  await createInvoice(ctx, { takeInId, stoneCount: stoneIds.length });
  await recordAudit(ctx, { action: "takeIn.made", subject: { kind: "takeIn", id: takeInId }, detail: { number, items: input.items.length, stones: stoneIds.length } });
  return { takeInId, number };
}

async function findByRequest({ db, laboratoryId }: LabContext, requestId: string): Promise<TakenIn | undefined> {
  const [row] = await db
    .select({ takeInId: takeIns.id, number: takeIns.number })
    .from(takeIns)
    .where(and(eq(takeIns.laboratoryId, laboratoryId), eq(takeIns.requestId, requestId)));
  return row;
}

function refuseUnusable(input: TakeInInput, { today, dueOn }: { today: string; dueOn: string }): void {
  const problems: Record<string, string[]> = {};
  const say = (field: string, problem: string | undefined) => {
    if (problem) problems[field] = [...(problems[field] ?? []), problem];
  };
  if (input.items.length < 1 || input.items.length > mostItems) say("items", `Enter one to ${mostItems} items.`);
  if (dueOn < today) say("dueOn", "The day it is due lies before today.");
  if (dueOn > addDays(today, latestDueDays)) say("dueOn", "The day it is due is more than two years away.");
  for (const [index, item] of input.items.entries()) {
    say(`items[${index}].description`, neutralWordsMessage(item.description));
    say(`items[${index}].condition`, neutralWordsMessage(item.condition));
    say(`items[${index}].stoneCount`, stoneCountProblem(item));
    say(`items[${index}].massText`, massProblem(item));
  }
  const first = Object.values(problems)[0]?.[0];
  if (first) throw new AppError("invalid_input", first, { fieldErrors: problems });
}

async function refuseAboveLimit(ctx: LabContext, input: TakeInInput): Promise<void> {
  const declared = input.items.reduce((sum, item) => sum + (item.declaredValue ?? 0), 0);
  const { heldMinor, limitMinor } = await custodyStanding(ctx);
  if (limitMinor === null || declared === 0 || heldMinor + declared <= limitMinor) return;
  const { currency } = ctx.laboratory;
  const sums = `This brings what is held to ${formatMoney(money(heldMinor + declared, currency))}; the insurer's limit is ${formatMoney(money(limitMinor, currency))}.`;
  const note = (input.limitOverrideNote ?? "").trim();
  if (!ctx.roles.includes("owner")) {
    const message = `${sums} Release or send out something first, or ask an owner to take it in.`;
    throw new AppError("conflict", message, { fieldErrors: { limitOverrideNote: [message] } });
  }
  if (note.length < 10) {
    const message = `${sums} As an owner you can take it in all the same: say here why, and what was arranged with the insurer.`;
    throw new AppError("conflict", message, { fieldErrors: { limitOverrideNote: [message] } });
  }
  await recordAudit(ctx, {
    action: "custodyLimit.overridden",
    subject: { kind: "laboratory", id: ctx.laboratoryId },
    detail: { heldMinor, declaredMinor: declared, limitMinor },
    reason: note,
  });
}

async function refuseUnusableBalances({ db, laboratoryId }: LabContext, input: TakeInInput): Promise<void> {
  const balances = await db
    .select({ id: instruments.id, name: instruments.name, status: instruments.status })
    .from(instruments)
    .where(and(eq(instruments.laboratoryId, laboratoryId), eq(instruments.kind, "balance")));
  const problems: Record<string, string[]> = {};
  for (const [index, item] of input.items.entries()) {
    const balance = balances.find((candidate) => candidate.id === item.balanceId);
    if (!balance) problems[`items[${index}].balanceId`] = ["There is no such balance."];
    else if (balance.status === "outOfService") problems[`items[${index}].balanceId`] = [`${balance.name} is out of service. Weigh on another balance.`];
  }
  const first = Object.values(problems)[0]?.[0];
  if (first) throw new AppError("conflict", first, { fieldErrors: problems });
}

async function existingClient({ db, laboratoryId }: LabContext, clientId: ClientId): Promise<ClientId> {
  const [client] = await db.select({ id: clients.id }).from(clients).where(and(eq(clients.laboratoryId, laboratoryId), eq(clients.id, clientId)));
  if (!client) throw new AppError("not_found", "There is no such client.", { fieldErrors: { clientName: ["There is no such client. Search again, or enter a new one."] } });
  return client.id;
}

async function newClient(ctx: LabContext, details: ClientDetails): Promise<ClientId> {
  requireRole(ctx, "clients.manage");
  const id = newId<"client">();
  await ctx.db.insert(clients).values({ ...details, laboratoryId: ctx.laboratoryId, id, createdAt: ctx.now });
  await recordAudit(ctx, { action: "client.created", subject: { kind: "client", id } });
  return id;
}
