import { and, desc, eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { custodyEvents, instruments, items, stoneEvents, stones, type CustodyPurpose } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { parseDecimal } from "#app/domain/decimal.ts";
import type { Id, ItemId, UserId } from "#app/domain/ids.ts";
import { canMoveGoods, goodsStateNames, type GoodsState } from "#app/domain/stone-state.ts";
import { typedDecimal } from "#app/domain/typed-decimal.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { massDifference, massInCt } from "./mass-difference.ts";

const goodsAfter = { toBench: "bench", toSafe: "safe", toOutside: "away", fromOutside: "safe", release: "released" } as const satisfies Record<Exclude<CustodyPurpose, "received">, GoodsState>;
/** Goods that leave or come back are weighed, whatever else (workflow 1.3). */
const alwaysWeighed: ReadonlySet<CustodyPurpose> = new Set(["toOutside", "fromOutside", "release"]);

export type GoodsMove = {
  requestId: Id<"custodyEvent">;
  itemNumber: string;
  purpose: keyof typeof goodsAfter;
  toPlace: string;
  holderId: UserId | null;
  massText: string;
  massUnit: "ct" | "g";
  seal: string;
  remark: string;
  /** What explains a difference in mass; the remark itself where left out. */
  explanation?: string;
};

/**
 * One hand-over of an item and of all its stones, in the transaction given. The request's id becomes the event's, so
 * that a form sent twice records one; a move that no longer fits where the goods are is refused.
 */
export async function moveGoods(ctx: LabContext, move: GoodsMove): Promise<{ itemId: ItemId; isRepeat: boolean }> {
  const { db, laboratoryId, now, actorId } = ctx;
  const [item] = await db
    .select({ id: items.id, takeInId: items.takeInId, standardUncertainty: instruments.standardUncertainty, weighedIn: items.massUnit })
    .from(items)
    .innerJoin(instruments, and(eq(instruments.laboratoryId, items.laboratoryId), eq(instruments.id, items.balanceId)))
    .where(and(eq(items.laboratoryId, laboratoryId), eq(items.number, move.itemNumber)))
    .for("update");
  if (!item) throw new AppError("not_found", "There is no such item.");
  const events = await db
    .select({ id: custodyEvents.id, purpose: custodyEvents.purpose, toPlace: custodyEvents.toPlace, sequence: custodyEvents.sequence, massText: custodyEvents.massText, massUnit: custodyEvents.massUnit })
    .from(custodyEvents)
    .where(and(eq(custodyEvents.laboratoryId, laboratoryId), eq(custodyEvents.itemId, item.id)))
    .orderBy(desc(custodyEvents.sequence));
  if (events.some((event) => event.id === move.requestId)) return { itemId: item.id, isRepeat: true };

  const theirs = await db
    .select({ id: stones.id, goodsState: stones.goodsState })
    .from(stones)
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.itemId, item.id)));
  const to = goodsAfter[move.purpose];
  const from = theirs[0]?.goodsState ?? "safe";
  if (!canMoveGoods(from, to) || (move.purpose === "fromOutside" && from !== "away") || (move.purpose !== "fromOutside" && from === "away")) {
    throw new AppError("conflict", refusal(from, move.purpose));
  }
  const isFirstOpening = move.purpose === "toBench" && !events.some((event) => event.purpose === "toBench");
  if (move.massText === "" && (alwaysWeighed.has(move.purpose) || isFirstOpening)) {
    const message = isFirstOpening ? "Weigh it before it is opened at the bench for the first time." : "Weigh it: goods that leave or come back are weighed.";
    throw new AppError("invalid_input", message, { fieldErrors: { massText: [message] } });
  }
  await refuseUnexplainedDifference(ctx, { item, events, move });

  const [moved] = await db
    .update(stones)
    .set({ goodsState: to, place: move.toPlace, holderId: to === "bench" ? move.holderId : null })
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.itemId, item.id), eq(stones.goodsState, from)));
  // The driver counts rows found, so a move from safe to safe counts too.
  if (moved.affectedRows !== theirs.length) throw new AppError("conflict", "The goods were moved meanwhile. Open the page anew and look where they are.");
  await db.insert(custodyEvents).values({
    laboratoryId,
    id: move.requestId,
    itemId: item.id,
    sequence: (events[0]?.sequence ?? 0) + 1,
    purpose: move.purpose,
    fromPlace: events[0]?.toPlace ?? "",
    toPlace: move.toPlace,
    holderId: move.holderId,
    massValue: move.massText === "" ? null : parseDecimal(move.massText)!,
    massText: typedDecimal(move.massText),
    massUnit: move.massText === "" ? null : move.massUnit,
    seal: move.seal,
    remark: move.remark,
    at: now,
    by: actorId,
  });
  if (from !== to) {
    await db.insert(stoneEvents).values(
      theirs.map((stone) => ({
        laboratoryId,
        id: newId<"stoneEvent">(),
        stoneId: stone.id,
        machine: "goods" as const,
        fromState: from,
        toState: to,
        why: move.purpose === "release" ? "Released" : `Handed over to ${move.toPlace}`.slice(0, 500),
        at: now,
        by: actorId,
      })),
    );
  }
  await recordAudit(ctx, { action: move.purpose === "release" ? "custody.released" : "custody.handedOver", subject: { kind: "item", id: item.id }, detail: { from, to } });
  return { itemId: item.id, isRepeat: false };
}

async function refuseUnexplainedDifference(
  ctx: LabContext,
  { item, events, move }: {
    item: { id: ItemId; standardUncertainty: number | null; weighedIn: "ct" | "g" };
    events: ReadonlyArray<{ massText: string; massUnit: "ct" | "g" | null }>;
    move: GoodsMove;
  },
): Promise<void> {
  const before = events.find((event) => event.massText !== "" && event.massUnit !== null);
  if (!before || move.massText === "") return;
  const last = { massText: before.massText, massUnit: before.massUnit! };
  const standardUncertaintyCt = item.standardUncertainty === null ? null : item.standardUncertainty * (item.weighedIn === "g" ? 5 : 1);
  const { differenceCt, isAlarming } = massDifference({ before: last, after: move, standardUncertaintyCt });
  if (!isAlarming) return;
  if ((move.explanation ?? move.remark).trim().length < 10) {
    const side = differenceCt < 0 ? "less" : "more";
    const message = `${Math.abs(differenceCt).toFixed(3)} ct ${side} than the ${last.massText} ${last.massUnit} of the last weighing. Weigh again; if it is so, explain it in the remark.`;
    throw new AppError("conflict", message, { fieldErrors: { massText: [message] } });
  }
  await recordAudit(ctx, {
    action: "custody.massDiffers",
    subject: { kind: "item", id: item.id },
    detail: { beforeCt: massInCt(last), afterCt: massInCt(move), purpose: move.purpose },
  });
}

function refusal(from: GoodsState, purpose: keyof typeof goodsAfter): string {
  if (from === "released") return "This item was released and is no longer in our custody.";
  if (purpose === "release" && from === "bench") return "This item is at the bench. Bring it back to the safe, then release it.";
  if (purpose === "release") return "This item is away. Enter its return first, then release it.";
  if (from === "away") return "This item is away: the next entry is its return.";
  if (purpose === "fromOutside") return `This item is not away (${goodsStateNames[from].toLowerCase()}), so it cannot come back.`;
  return `From here (${goodsStateNames[from].toLowerCase()}) the item cannot go there.`;
}
