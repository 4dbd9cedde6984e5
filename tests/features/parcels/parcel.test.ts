import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { newId } from "#app/db/new-id.server.ts";
import { parcelRows, parcels, stones } from "#app/db/schema/index.ts";
import { getParcel } from "#app/features/parcels/get-parcel.server.ts";
import { listParcels } from "#app/features/parcels/list-parcels.server.ts";
import { nameParcelItem } from "#app/features/parcels/name-parcel-item.server.ts";
import { openParcelStone } from "#app/features/parcels/open-parcel-stone.server.ts";
import { saveParcel } from "#app/features/parcels/save-parcel.server.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { listStones } from "#app/features/stones/list-stones.server.ts";
import { aLab, aMember } from "../../setup/factories.ts";
import { aParcel, aParcelDraft, howRead } from "../../setup/parcel-factory.ts";

test("a parcel is kept as it was typed, ranked on the server, once however often it is sent", async () => {
  const ctx = await aLab();
  const draft = aParcelDraft();
  const { parcelId } = await saveParcel(ctx, draft);
  expect(await saveParcel(ctx, draft)).toEqual({ parcelId });
  const parcel = await getParcel(ctx, parcelId!);
  expect(parcel).toMatchObject({ name: "Lot 12, red ovals", columns: ["mark", "weightCt", "riLow", "riHigh", "sg", "colour"], rowCount: 10, oddCount: 1, mainSpeciesId: "corundum", item: null });
  expect(parcel.rows.map(({ cells }) => cells)).toEqual(draft.rows);
  expect(parcel.rows[1]!.cells).toEqual(["2", "0,151", "1,761", "1,769", "4,00", "purplish red"]);
  expect(parcel.rows[6]!.ranking.odd.length).toBeGreaterThan(0);
  expect((await listParcels(ctx)).parcels).toMatchObject([{ name: "Lot 12, red ovals", rowCount: 10, oddCount: 1, mainName: "Corundum", itemNumber: null }]);
});

test("a bad cell, a column chosen twice, a missing name or item: each at its place, and nothing saved", async () => {
  const ctx = await aLab();
  const rows = [["1", "0.1", "1.762", "1.770", "3.99", "red"], ["2", "x", "1.770", "1.762", "3.99", "red"]];
  const { problems } = await saveParcel(ctx, aParcelDraft({ name: " ", itemNumber: "XX-26-0001", rows }));
  expect(problems).toMatchObject({ fields: { name: expect.any(String), itemNumber: expect.stringContaining("no such item") }, cells: { "1,1": expect.stringContaining("digits"), "1,3": expect.stringContaining("exchanged") } });
  expect((await saveParcel(ctx, aParcelDraft({ columns: ["mark", "sg", "sg", null, null, null] }))).problems!.columns).toEqual({ 2: expect.stringContaining("chosen for another column") });
  expect((await saveParcel(ctx, aParcelDraft({ rows: [] }))).problems!.fields.table).toContain("Paste a table");
  expect((await saveParcel(ctx, aParcelDraft({ waterTempC: "warm" }))).problems!.fields.waterTempC).toContain("degrees");
  await expect(saveParcel(ctx, aParcelDraft({ requestId: "none" }))).rejects.toMatchObject({ code: "invalid_input" });
  expect((await listParcels(ctx)).parcels).toEqual([]);
});

test("a row becomes the item's stone of its mark, with its figures as readings in the digits typed", async () => {
  const ctx = await aLab();
  const parcel = await aParcel(ctx);
  const { stoneCode, isAdded } = await openParcelStone(ctx, parcel.parcelId, { ...howRead(parcel.instruments), position: 2 });
  expect({ stoneCode, isAdded }).toEqual({ stoneCode: `${parcel.itemNumber}-2`, isAdded: false });
  const readings = await listReadings(ctx, { stoneCode });
  expect(readings).toMatchObject([
    { detail: { kind: "weight" }, values: [{ name: "weightCt", typedText: "0,151", value: 0.151 }], note: expect.stringContaining("Parcel “Lot 12, red ovals”, row 2, mark 2") },
    { detail: { kind: "refractometer", edges: "two", isRotated: false, light: "sodium" } },
    { detail: { kind: "free", text: "Density: 4,00\nColour: purplish red" } },
  ]);
  expect(readings[1]!.values).toContainEqual(expect.objectContaining({ name: "low", typedText: "1,761", value: 1.761 }));
  expect((await getParcel(ctx, parcel.parcelId)).rows[1]!.stoneCode).toBe(stoneCode);
  await expect(openParcelStone(ctx, parcel.parcelId, { ...howRead(parcel.instruments), position: 2 })).rejects.toMatchObject({ code: "conflict", userMessage: `Row 2 is ${stoneCode} already.` });
});

test("where the item has no stone left, a further one is opened in it, and the logbook finds it", async () => {
  const ctx = await aLab();
  const parcel = await aParcel(ctx);
  const open = (position: number) => openParcelStone(ctx, parcel.parcelId, { ...howRead(parcel.instruments), position });
  expect((await open(7)).stoneCode).toBe(`${parcel.itemNumber}-1`);
  expect((await open(1)).stoneCode).toBe(`${parcel.itemNumber}-2`);
  expect(await open(3)).toEqual({ stoneCode: `${parcel.itemNumber}-3`, isAdded: true });
  expect((await listStones(ctx, { search: `${parcel.itemNumber}-3` })).stones).toContainEqual(expect.objectContaining({ code: `${parcel.itemNumber}-3`, examinationState: "examining", weightText: "0.139" }));
  // One edge alone is no pair.
  expect((await listReadings(ctx, { stoneCode: `${parcel.itemNumber}-1` }))[1]).toMatchObject({ detail: { kind: "refractometer", edges: "one" } });
});

test("weighings in water and an optic character are carried over as what they are", async () => {
  const ctx = await aLab();
  const draft = { columns: ["mark", "weightCt", "waterCt", "character", "riSpot"] as const, rows: [["1", "2.143", "1.608", "DR", "1.76"]], waterTempC: "21,4" };
  const parcel = await aParcel(ctx, draft);
  const { stoneCode } = await openParcelStone(ctx, parcel.parcelId, { ...howRead(parcel.instruments), position: 1, directionsTried: 3, spotMethod: "blink" });
  expect(await listReadings(ctx, { stoneCode })).toMatchObject([{ detail: { kind: "weight" } }, { detail: { kind: "spot", method: "blink" } }, { detail: { kind: "density", method: "suspended" } }, { detail: { kind: "polariscope", behaviour: "blinks", directionsTried: 3 } }]);
});

test("a reading that is refused leaves nothing behind: no stone, no reading, no link", async () => {
  const ctx = await aLab();
  const parcel = await aParcel(ctx, {}, { consents: ["dryCloth"] });
  const how = howRead(parcel.instruments);
  await expect(openParcelStone(ctx, parcel.parcelId, { ...how, position: 1 })).rejects.toMatchObject({ code: "invalid_input", userMessage: expect.stringMatching(/^Refractometer: .*not agreed/) });
  expect(await listReadings(ctx, { stoneCode: parcel.stoneCode })).toEqual([]);
  expect((await getParcel(ctx, parcel.parcelId)).rows[0]!.stoneCode).toBeNull();
  await expect(openParcelStone(ctx, parcel.parcelId, { ...how, balanceId: null, position: 1 })).rejects.toMatchObject({ fieldErrors: { balance: [expect.stringContaining("Choose the instrument")] } });
});

test("without an item no row becomes a stone; it is named once, by its number", async () => {
  const ctx = await aLab();
  const parcel = await aParcel(ctx, { itemNumber: "" });
  const open = () => openParcelStone(ctx, parcel.parcelId, { ...howRead(parcel.instruments), position: 1 });
  await expect(open()).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("which item") });
  await expect(nameParcelItem(ctx, parcel.parcelId, { itemNumber: "ZZ-26-0001" })).rejects.toMatchObject({ fieldErrors: { itemNumber: [expect.stringContaining("no such item")] } });
  await nameParcelItem(ctx, parcel.parcelId, { itemNumber: parcel.itemNumber.toLowerCase() });
  await expect(nameParcelItem(ctx, parcel.parcelId, { itemNumber: parcel.itemNumber })).rejects.toMatchObject({ code: "conflict" });
  await expect(open()).resolves.toMatchObject({ isAdded: false });
});

test("two people who open one row at once open one stone", async () => {
  const ctx = await aLab();
  const parcel = await aParcel(ctx);
  const colleague = await aMember(ctx, ["gemmologist"]);
  const input = { ...howRead(parcel.instruments), position: 1 };
  const outcomes = await Promise.allSettled([openParcelStone(ctx, parcel.parcelId, input), openParcelStone(colleague, parcel.parcelId, input)]);
  expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  const [linked] = await ctx.db.select({ stoneId: parcelRows.stoneId }).from(parcelRows).where(and(eq(parcelRows.laboratoryId, ctx.laboratoryId), eq(parcelRows.parcelId, parcel.parcelId), eq(parcelRows.position, 1)));
  expect(linked!.stoneId).not.toBeNull();
  expect(await ctx.db.select({ code: stones.code }).from(stones).where(and(eq(stones.laboratoryId, ctx.laboratoryId), eq(stones.examinationState, "examining")))).toHaveLength(1);
});

test("a parcel is its laboratory's own, and so is the item that it names", async () => {
  const [ours, theirs] = [await aLab(), await aLab()];
  const parcel = await aParcel(ours);
  await expect(getParcel(theirs, parcel.parcelId)).rejects.toMatchObject({ code: "not_found" });
  await expect(openParcelStone(theirs, parcel.parcelId, { ...howRead(parcel.instruments), position: 1 })).rejects.toMatchObject({ code: "not_found" });
  expect((await saveParcel(theirs, aParcelDraft({ itemNumber: parcel.itemNumber }))).problems!.fields.itemNumber).toContain("no such item");
  expect((await listParcels(theirs)).parcels).toEqual([]);
  for (const role of ["owner", "appraiser", "desk"] as const) await expect(saveParcel(await aMember(ours, [role]), aParcelDraft())).rejects.toMatchObject({ code: "forbidden" });
  await expect(listParcels(await aMember(ours, ["desk"]))).rejects.toMatchObject({ code: "forbidden" });
});

test("two hundred rows are saved in a few seconds, with other work let in between", async () => {
  const ctx = await aLab();
  const rows = Array.from({ length: 200 }, (_, at) => [String(at + 1), `0.${100 + at}`, `1.7${60 + (at % 5)}`, `1.7${68 + (at % 4)}`, `3.${95 + (at % 5)}`, "red"]);
  let turns = 0;
  const timer = setInterval(() => turns++, 1);
  const { parcelId } = await saveParcel(ctx, aParcelDraft({ requestId: newId<"parcel">(), rows }));
  clearInterval(timer);
  expect(turns).toBeGreaterThan(20);
  const [row] = await ctx.db.select({ rowCount: parcels.rowCount }).from(parcels).where(and(eq(parcels.laboratoryId, ctx.laboratoryId), eq(parcels.id, parcelId!)));
  expect(row!.rowCount).toBe(200);
});
