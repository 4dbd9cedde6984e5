import { eq } from "drizzle-orm";
import { randomUUID } from "node:crypto";
import { newId } from "#app/db/new-id.server.ts";
import { items, stones } from "#app/db/schema/index.ts";
import type { InstrumentId, ItemId } from "#app/domain/ids.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { takeInItems, type TakeInInput, type TakeInItem } from "#app/features/take-ins/take-in-items.server.ts";
import { aClient, anInstrument } from "./factories.ts";

/** One red oval, loose, as the desk would enter it. */
export function itemInput(balanceId: InstrumentId, fields: Partial<TakeInItem> = {}): TakeInItem {
  return {
    description: "Purplish red oval, transparent",
    mount: "loose",
    stoneCount: 1,
    massText: "2.143",
    massUnit: "ct",
    balanceId,
    condition: "None seen with 10×",
    declaredValue: 650_000,
    consents: ["dryCloth", "contactLiquid", "photography"],
    seal: "",
    ...fields,
  };
}

export async function takeInInput(ctx: LabContext, fields: Partial<TakeInInput> = {}): Promise<TakeInInput> {
  return {
    requestId: randomUUID(),
    client: { id: await aClient(ctx) },
    handedOverBy: "L. Ardenne",
    capacity: "executor",
    returnMethod: "collect",
    clientStatements: "",
    place: "Safe 1",
    isValuationWanted: false,
    items: [itemInput(await anInstrument(ctx, { standardUncertainty: 0.0015 }))],
    ...fields,
  };
}

/** Takes one item in and says where to find it. */
export async function aTakenInItem(ctx: LabContext, fields: Partial<TakeInItem> = {}): Promise<{ takeInNumber: string; itemId: ItemId; itemNumber: string; stoneCodes: string[] }> {
  const input = await takeInInput(ctx);
  const { takeInId, number } = await takeInItems(ctx, { ...input, items: [{ ...input.items[0]!, ...fields }] });
  const [item] = await ctx.db.select({ id: items.id, number: items.number }).from(items).where(eq(items.takeInId, takeInId));
  const rows = await ctx.db.select({ code: stones.code }).from(stones).where(eq(stones.itemId, item!.id)).orderBy(stones.sequence);
  return { takeInNumber: number, itemId: item!.id, itemNumber: item!.number, stoneCodes: rows.map((row) => row.code) };
}

export function aRequestId<Noun extends string>() {
  return newId<Noun>();
}
