import { eq } from "drizzle-orm";
import sharp from "sharp";
import { parseWithZod } from "@conform-to/zod/v4";
import { expect, test } from "vitest";
import { newId } from "#app/db/new-id.server.ts";
import { auditEvents, items, stones } from "#app/db/schema/index.ts";
import { addMicroscopePhoto } from "#app/features/inclusions/add-microscope-photo.server.ts";
import { getInclusions } from "#app/features/inclusions/get-inclusions.server.ts";
import { inclusionForms } from "#app/features/inclusions/inclusion-forms.server.ts";
import { recordInclusion, type RecordInclusion } from "#app/features/inclusions/record-inclusion.server.ts";
import { setPhotoScale } from "#app/features/inclusions/set-photo-scale.server.ts";
import { setStoneOutline } from "#app/features/inclusions/set-stone-outline.server.ts";
import { strikeInclusion } from "#app/features/inclusions/strike-inclusion.server.ts";
import { addPhoto } from "#app/features/photos/add-photo.server.ts";
import { startSecondCheck } from "#app/features/second-checks/start-second-check.server.ts";
import { getStoneHead } from "#app/features/stones/get-bench.server.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { aBench } from "../../setup/bench-factory.ts";
import { aConcludedStone } from "../../setup/conclusion-factory.ts";
import { aLab, aMember } from "../../setup/factories.ts";
import { aTakenInItem } from "../../setup/take-in-factory.ts";
import { testServices } from "../../setup/test-services.ts";

const aPicture = () => sharp({ create: { width: 400, height: 300, channels: 3, background: "#7a1030" } }).jpeg().toBuffer();

async function aPlot() {
  const services = testServices();
  const ctx = await aLab({ services });
  const bench = await aBench(ctx);
  const input = (more: Partial<RecordInclusion> = {}): RecordInclusion => ({
    requestId: newId<"inclusion">(),
    stoneCode: bench.stoneCode,
    type: "crystal",
    otherText: "",
    onPhoto: null,
    onPlot: { side: "crown", at: { x: 0.62346, y: 0.31 } },
    depth: "middle",
    amount: "few",
    size: { value: 0.12, text: "0,12" },
    note: "rounded",
    ...more,
  });
  const photo = async (more = {}) => addMicroscopePhoto(ctx, { stoneCode: bench.stoneCode, bytes: await aPicture(), fileName: "a.jpg", sourceKey: `form:${newId()}`, magnificationX: 40, pictureWidthMm: 4.2, ...more });
  return { ctx, bench, input, photo, files: services.files };
}

test("an inclusion is kept with its word, its places, its depth and its size as typed, and begins the examination", async () => {
  const { ctx, bench, input, photo } = await aPlot();
  const photoId = await photo();
  expect(await recordInclusion(ctx, input({ onPhoto: { photoId, at: { x: 0.25, y: 0.75 } } }))).toEqual({ sequence: 1 });
  const plotted = await getInclusions(ctx, bench);
  expect(plotted).toMatchObject({ outline: "oval", isOutlineChosen: false, photos: [{ widthPx: 400, heightPx: 300, magnificationX: 40, pictureWidthMm: 4.2 }] });
  expect(plotted.inclusions).toMatchObject([{ sequence: 1, type: "crystal", depth: "middle", amount: "few", sizeText: "0,12", note: "rounded", onPlot: { side: "crown", at: { x: 0.6235, y: 0.31 } }, onPhoto: { at: { x: 0.25, y: 0.75 } }, observer: ctx.person.name, isOwn: true, strike: null }]);
  expect(idFromShortRef(plotted.inclusions[0]!.onPhoto!.photoRef)).toBe(photoId);
  const [stone] = await ctx.db.select({ state: stones.examinationState, examinerId: stones.examinerId }).from(stones).where(eq(stones.id, bench.stoneId));
  expect(stone).toEqual({ state: "examining", examinerId: ctx.actorId });
  const audit = await ctx.db.select({ action: auditEvents.action }).from(auditEvents).where(eq(auditEvents.subjectId, bench.stoneId));
  expect(audit.map(({ action }) => action)).toContain("inclusion.recorded");
});

test("the same form sent twice, and twice at once, keeps one inclusion", async () => {
  const { ctx, bench, input } = await aPlot();
  const once = input();
  const kept = await Promise.all([recordInclusion(ctx, once), recordInclusion(ctx, once)]);
  expect(kept).toEqual([{ sequence: 1 }, { sequence: 1 }]);
  expect((await getInclusions(ctx, bench)).inclusions).toHaveLength(1);
  await expect(recordInclusion(await aMember(ctx, ["gemmologist"]), once)).rejects.toMatchObject({ code: "conflict" });
});

test("a photograph of another stone, or of another laboratory, is not placed on", async () => {
  const { ctx, input } = await aPlot();
  const other = await aTakenInItem(ctx);
  const [item] = await ctx.db.select({ id: items.id }).from(items).where(eq(items.id, other.itemId));
  const theirPhoto = await addPhoto(ctx, { itemId: item!.id, bytes: await aPicture(), fileName: "a.jpg", sourceKey: "other" });
  await expect(recordInclusion(ctx, input({ onPhoto: { photoId: theirPhoto, at: { x: 0, y: 0 } } }))).rejects.toMatchObject({ code: "invalid_input", fieldErrors: { photo: [expect.any(String)] } });
  const { photo } = await aPlot();
  await expect(recordInclusion(ctx, input({ onPhoto: { photoId: await photo(), at: { x: 0, y: 0 } } }))).rejects.toMatchObject({ code: "invalid_input" });
});

test("an inclusion is struck once, by the examiner or whoever recorded it, and stays in its place", async () => {
  const { ctx, bench, input } = await aPlot();
  await recordInclusion(ctx, input());
  const helper = await aMember(ctx, ["gemmologist"]);
  await recordInclusion(helper, input());
  await expect(strikeInclusion(helper, { ...bench, sequence: 1, reason: "dust" })).rejects.toMatchObject({ code: "forbidden" });
  await strikeInclusion(ctx, { ...bench, sequence: 2, reason: "dust on the table" });
  await expect(strikeInclusion(ctx, { ...bench, sequence: 2, reason: "again" })).rejects.toMatchObject({ code: "conflict" });
  await expect(strikeInclusion(ctx, { ...bench, sequence: 9, reason: "none" })).rejects.toMatchObject({ code: "not_found" });
  expect((await getInclusions(ctx, bench)).inclusions.map(({ sequence, strike }) => [sequence, strike?.reason])).toEqual([[1, undefined], [2, "dust on the table"]]);
});

test("the outline is taken from the description until it is chosen, and what was placed keeps its place", async () => {
  const { ctx, bench, input } = await aPlot();
  await recordInclusion(ctx, input());
  await setStoneOutline(ctx, { ...bench, outline: "pear" });
  await setStoneOutline(ctx, { ...bench, outline: "cushion" });
  const plotted = await getInclusions(ctx, bench);
  expect(plotted).toMatchObject({ outline: "cushion", isOutlineChosen: true });
  expect(plotted.inclusions[0]!.onPlot!.at).toEqual({ x: 0.6235, y: 0.31 });
});

test("a photograph's scale is set and set right; of another stone's photograph it is not", async () => {
  const { ctx, bench, photo } = await aPlot();
  const photoId = await photo({ magnificationX: null, pictureWidthMm: null });
  await setPhotoScale(ctx, { ...bench, photoId, magnificationX: 63, pictureWidthMm: 2.1 });
  expect((await getInclusions(ctx, bench)).photos).toMatchObject([{ magnificationX: 63, pictureWidthMm: 2.1 }]);
  const other = await aPlot();
  await expect(setPhotoScale(ctx, { ...bench, photoId: await other.photo(), magnificationX: 1, pictureWidthMm: 1 })).rejects.toMatchObject({ code: "not_found" });
});

test("another laboratory sees and does nothing here", async () => {
  const { ctx, bench, input, photo } = await aPlot();
  await recordInclusion(ctx, input());
  const photoId = await photo();
  const theirs = await aLab({ services: testServices() });
  await expect(getInclusions(theirs, bench)).rejects.toMatchObject({ code: "not_found" });
  await expect(recordInclusion(theirs, input())).rejects.toMatchObject({ code: "not_found" });
  await expect(strikeInclusion(theirs, { ...bench, sequence: 1, reason: "x" })).rejects.toMatchObject({ code: "not_found" });
  await expect(setStoneOutline(theirs, { ...bench, outline: "round" })).rejects.toMatchObject({ code: "not_found" });
  await expect(setPhotoScale(theirs, { ...bench, photoId, magnificationX: 1, pictureWidthMm: 1 })).rejects.toMatchObject({ code: "not_found" });
});

test("a concluded or released stone takes nothing more, and an open check sees nothing", async () => {
  const { ctx, input, files } = await aPlot();
  const { stoneCode } = await aConcludedStone(ctx);
  await expect(recordInclusion(ctx, input({ stoneCode }))).rejects.toMatchObject({ code: "conflict" });
  await expect(addMicroscopePhoto(ctx, { stoneCode, bytes: await aPicture(), fileName: "a.jpg", sourceKey: "k", magnificationX: null, pictureWidthMm: null })).rejects.toMatchObject({ code: "conflict" });
  expect(files.size).toBe(0);
  const checker = await aMember(ctx, ["gemmologist"]);
  await startSecondCheck(checker, { stoneCode, requestId: newId<"secondCheck">() });
  await expect(getInclusions(checker, { stoneCode })).rejects.toMatchObject({ code: "not_found" });
});

test("whoever plotted an inclusion had a hand in the examination and does not do the second check", async () => {
  const { ctx, input } = await aPlot();
  const { stoneCode } = await aConcludedStone(ctx);
  const helper = await aMember(ctx, ["gemmologist"]);
  await ctx.db.update(stones).set({ examinationState: "examining" }).where(eq(stones.code, stoneCode));
  await recordInclusion(helper, input({ stoneCode }));
  await ctx.db.update(stones).set({ examinationState: "concluded" }).where(eq(stones.code, stoneCode));
  expect((await getStoneHead(helper, { stoneCode })).isInvolved).toBe(true);
  await expect(startSecondCheck(helper, { stoneCode, requestId: newId<"secondCheck">() })).rejects.toMatchObject({ code: "forbidden" });
  const another = await aMember(ctx, ["gemmologist"]);
  expect((await getStoneHead(another, { stoneCode })).isInvolved).toBe(false);
  await startSecondCheck(another, { stoneCode, requestId: newId<"secondCheck">() });
});

const form = (fields: Record<string, string>) => {
  const sent = new FormData();
  for (const [name, value] of Object.entries({ intent: "place", requestId: newId(), type: "needle", plotSide: "crown", depth: "surface", amount: "many", ...fields })) sent.set(name, value);
  return parseWithZod(sent, { schema: inclusionForms.place });
};
const problems = (fields: Record<string, string>) => Object.fromEntries(Object.entries(form(fields).reply().error ?? {}).map(([field, messages]) => [field, messages?.[0]]));

test("a place is read from per cent, with a decimal comma too, and a size with its digits", () => {
  const read = form({ plotX: "12,5", plotY: "80", size: "0,120" });
  expect(read.status === "success" && read.value).toMatchObject({ onPlot: { side: "crown", at: { x: 0.125, y: 0.8 } }, onPhoto: null, size: { value: 0.12, text: "0,120" } });
});

test.each([
  ["no place at all", {}, { plotX: "Place it: on the outline, or on a photograph." }],
  ["half a place", { plotX: "12" }, { plotY: "A place on the outline needs both numbers." }],
  ["a place beyond the picture", { plotX: "101", plotY: "-1" }, { plotX: "Per cent of the picture, from 0 to 100.", plotY: "Per cent of the picture, from 0 to 100." }],
  ["a place on no photograph", { photoX: "1", photoY: "2" }, { photo: "Choose the photograph that it is placed on." }],
  ["a photograph that is none", { photo: "nonsense", photoX: "1", photoY: "2" }, { photo: "Choose a photograph of this stone." }],
  ["another thing without its words", { type: "other", plotX: "1", plotY: "2" }, { otherText: "Say what it is." }],
  ["a word and other words", { otherText: "fly", plotX: "1", plotY: "2" }, { otherText: "A word from the list is chosen already: choose “Other”, or leave this empty." }],
  ["no such word", { type: "<script>", plotX: "1", plotY: "2" }, { type: "Choose what it is." }],
  ["a size that is none", { size: "1e9", plotX: "1", plotY: "2" }, { size: "Write it in digits: for example 0.12." }],
  ["a size of nothing", { size: "0", plotX: "1", plotY: "2" }, { size: "From 0.001 to 100 mm." }],
])("%s is refused at its field", (_, fields, expected) => {
  expect(problems(fields as Record<string, string>)).toMatchObject(expected);
});
