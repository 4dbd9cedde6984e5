import { and, eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { items, stones } from "#app/db/schema/index.ts";
import type { ParcelId } from "#app/domain/parcel.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import type { OpenParcelStone } from "#app/features/parcels/open-parcel-stone.server.ts";
import { readPasted, type ParcelDraft } from "#app/features/parcels/parcel-draft.ts";
import { saveParcel } from "#app/features/parcels/save-parcel.server.ts";
import type { TakeInItem } from "#app/features/take-ins/take-in-items.server.ts";
import { aBench, type TestBench } from "./bench-factory.ts";

/** Nine corundums by index and density, one spinel among them (row 7), as a spreadsheet gives them. */
export const aPastedParcel = [
  "Mark\tWeight (ct)\tRI low\tRI high\tSG\tColour",
  "1\t0.142\t1.762\t1.770\t3.99\tpurplish red",
  "2\t0,151\t1,761\t1,769\t4,00\tpurplish red",
  "3\t0.139\t1.762\t1.771\t3.98\tred",
  "4\t0.160\t1.763\t1.770\t4.01\tpurplish red",
  "5\t0.148\t1.762\t1.770\t3.99\tpink",
  "6\t0.155\t1.761\t1.770\t4.00\tpurplish red",
  "7\t0.147\t1.718\t\t3.60\tpink",
  "8\t0.150\t1.762\t1.770\t3.99\tred",
  "9\t0.143\t1.762\t1.769\t4.00\tpurplish red",
  "10\t0.149\t1.762\t1.770\t3.99\tpurplish red",
].join("\n");

export function aParcelDraft(fields: Partial<ParcelDraft> = {}): ParcelDraft {
  const { columns, rows } = readPasted(aPastedParcel);
  return { requestId: newId<"parcel">(), name: "Lot 12, red ovals", itemNumber: "", waterTempC: "", columns, rows, ...fields };
}

export type TestParcel = TestBench & { parcelId: ParcelId; itemNumber: string };

/** A parcel of an item of two loose stones, with instruments in check. */
export async function aParcel(ctx: LabContext, fields: Partial<ParcelDraft> = {}, item: Partial<TakeInItem> = {}): Promise<TestParcel> {
  const bench = await aBench(ctx, { stoneCount: 2, ...item });
  const [row] = await ctx.db
    .select({ number: items.number })
    .from(items)
    .innerJoin(stones, eq(stones.itemId, items.id))
    .where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.id, bench.stoneId)));
  const { parcelId, problems } = await saveParcel(ctx, aParcelDraft({ itemNumber: row!.number, ...fields }));
  if (!parcelId) throw new Error(JSON.stringify(problems));
  return { ...bench, parcelId, itemNumber: row!.number };
}

export function howRead({ refractometer, balance, polariscope }: TestBench["instruments"]): Omit<OpenParcelStone, "position"> {
  return { refractometerId: refractometer, balanceId: balance, polariscopeId: polariscope, light: "sodium", spotMethod: "50/50", directionsTried: null };
}
