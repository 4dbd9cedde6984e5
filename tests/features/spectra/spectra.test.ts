import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { newId } from "#app/db/new-id.server.ts";
import { auditEvents, spectra, stones } from "#app/db/schema/index.ts";
import { startSecondCheck } from "#app/features/second-checks/start-second-check.server.ts";
import { addSpectrum, type NewSpectrum } from "#app/features/spectra/add-spectrum.server.ts";
import { decodeTextFile } from "#app/features/spectra/decode-text-file.ts";
import { listSpectra } from "#app/features/spectra/list-spectra.server.ts";
import { readSpectrumSource } from "#app/features/spectra/read-spectrum-source.server.ts";
import { withdrawSpectrum } from "#app/features/spectra/withdraw-spectrum.server.ts";
import { aBench } from "../../setup/bench-factory.ts";
import { aConcludedStone } from "../../setup/conclusion-factory.ts";
import { aLab, aMember } from "../../setup/factories.ts";
import { testServices } from "../../setup/test-services.ts";
import { jcampDxOf } from "../../gemmology/spectrum/write-jcamp-dx.ts";

const nms = Array.from({ length: 301 }, (_, at) => 400 + at);
const bump = (nm: number, at: number, widthNm: number) => Math.exp(-4 * Math.LN2 * ((nm - at) / widthNm) ** 2);
const ordinates = nms.map((nm) => Math.round(10_000 * (0.2 + 0.6 * bump(nm, 550, 60) + 0.3 * bump(nm, 668, 3))));
const jcamp = Buffer.from(jcampDxOf({ ordinates, form: "DIFDUP", firstX: 400, step: 1, yFactor: 0.0001 }));

async function aSpectrumLab() {
  const services = testServices();
  const ctx = await aLab({ services });
  const bench = await aBench(ctx);
  const input = (more: Partial<NewSpectrum> = {}): NewSpectrum => ({ requestId: newId<"spectrum">(), stoneCode: bench.stoneCode, bytes: jcamp, fileName: "table.jdx", note: "Through the table", assumed: { xUnit: "nm", yUnit: "absorbance" }, ...more });
  return { ctx, bench, input, files: services.files };
}
const refusedWith = (part: string) => ({ code: "invalid_input", fieldErrors: { file: [expect.stringContaining(part)] } });

test("a measured spectrum is kept with its stone: its curve, its peaks, and the file as it came", async () => {
  const { ctx, bench, input } = await aSpectrumLab();
  expect(await addSpectrum(ctx, input({ fileName: "C:\\spectra\\table\u0007.jdx" }))).toEqual({ sequence: 1, peakCount: 2 });
  const [kept, ...others] = await listSpectra(ctx, bench);
  expect(others).toEqual([]);
  expect(kept).toMatchObject({ sequence: 1, fileName: "table.jdx", format: "jcampDx", title: "An invented spectrum", xUnit: "nm", yUnit: "absorbance", pointCount: 301, firstX: 400, lastX: 700, note: "Through the table", createdBy: ctx.person.name, isOwn: true, withdrawal: null });
  expect(kept!.peaks.map(({ nm, kind }) => [Math.round(nm), kind])).toEqual([[550, "band"], [668, "line"]]);
  expect(kept!.curve.length).toBeLessThanOrEqual(800);
  const source = await readSpectrumSource(ctx, { stoneCode: bench.stoneCode, sequence: 1 });
  expect(source.bytes.equals(jcamp)).toBe(true);
  const audit = await ctx.db.select({ action: auditEvents.action }).from(auditEvents).where(eq(auditEvents.subjectId, bench.stoneId));
  expect(audit.map(({ action }) => action)).toContain("spectrum.added");
});

test("a bad file is refused with its line, and nothing of it is kept", async () => {
  const { ctx, bench, input, files } = await aSpectrumLab();
  const text = jcamp.toString();
  await expect(addSpectrum(ctx, input({ bytes: Buffer.alloc(0) }))).rejects.toMatchObject(refusedWith("empty"));
  await expect(addSpectrum(ctx, input({ bytes: Buffer.alloc(4_000_001, "9") }))).rejects.toMatchObject(refusedWith("up to 4 MB"));
  await expect(addSpectrum(ctx, input({ bytes: Buffer.from(text.slice(0, text.length - 60)) }))).rejects.toMatchObject(refusedWith("announces 301 points"));
  await expect(addSpectrum(ctx, input({ bytes: Buffer.from(text.replace("NANOMETERS", "SECONDS")) }))).rejects.toMatchObject(refusedWith("Line 6: The axis counts “SECONDS”"));
  await expect(addSpectrum(ctx, input({ bytes: Buffer.from("\x89PNG\r\n\x1a\n\0\0\0\0") }))).rejects.toMatchObject(refusedWith("no text file"));
  expect(files.size).toBe(0);
  expect(await listSpectra(ctx, bench)).toEqual([]);
});

test("a table of two columns says that a person named its units", async () => {
  const { ctx, bench, input } = await aSpectrumLab();
  const bytes = Buffer.from(nms.map((nm, at) => `${nm};${String(10 ** (-ordinates[at]! / 10_000)).slice(0, 8).replace(".", ",")}`).join("\r\n"));
  await addSpectrum(ctx, input({ bytes, fileName: "t.csv", assumed: { xUnit: "nm", yUnit: "transmittance" } }));
  const [kept] = await listSpectra(ctx, bench);
  expect(kept).toMatchObject({ format: "twoColumns", yUnit: "transmittance", isUnitAssumed: true });
  expect(kept!.peaks.map(({ nm }) => Math.round(nm))).toEqual([550, 668]);
});

test("the same form sent twice, and twice at once, keeps one spectrum and one file", async () => {
  const { ctx, bench, input, files } = await aSpectrumLab();
  const once = input();
  const [first, second] = await Promise.all([addSpectrum(ctx, once), addSpectrum(ctx, once)]);
  expect(second).toEqual(first);
  expect(await addSpectrum(ctx, once)).toEqual(first);
  expect(files.size).toBe(1);
  expect(await listSpectra(ctx, bench)).toHaveLength(1);
});

test("a spectrum that does not belong is withdrawn with a reason, stays in its place, and once is enough", async () => {
  const { ctx, bench, input } = await aSpectrumLab();
  await addSpectrum(ctx, input());
  await addSpectrum(ctx, input());
  await withdrawSpectrum(ctx, { stoneCode: bench.stoneCode, sequence: 1, reason: "of another stone" });
  await expect(withdrawSpectrum(ctx, { stoneCode: bench.stoneCode, sequence: 1, reason: "again" })).rejects.toMatchObject({ code: "conflict" });
  await expect(withdrawSpectrum(ctx, { stoneCode: bench.stoneCode, sequence: 9, reason: "none" })).rejects.toMatchObject({ code: "not_found" });
  expect((await listSpectra(ctx, bench)).map(({ sequence, withdrawal }) => [sequence, withdrawal?.reason])).toEqual([[1, "of another stone"], [2, undefined]]);
  expect(await addSpectrum(ctx, input())).toMatchObject({ sequence: 3 });
});

test("another laboratory neither adds, sees, fetches nor withdraws", async () => {
  const { ctx, bench, input } = await aSpectrumLab();
  const theirs = await aLab();
  await addSpectrum(ctx, input());
  await expect(addSpectrum(theirs, input())).rejects.toMatchObject({ code: "not_found" });
  expect(await listSpectra(theirs, bench)).toEqual([]);
  await expect(readSpectrumSource(theirs, { stoneCode: bench.stoneCode, sequence: 1 })).rejects.toMatchObject({ code: "not_found" });
  await expect(withdrawSpectrum(theirs, { stoneCode: bench.stoneCode, sequence: 1, reason: "x" })).rejects.toMatchObject({ code: "not_found" });
});

test("what was released or concluded takes no more spectra", async () => {
  const { ctx, bench, input, files } = await aSpectrumLab();
  await ctx.db.update(stones).set({ goodsState: "released" }).where(eq(stones.id, bench.stoneId));
  await expect(addSpectrum(ctx, input())).rejects.toMatchObject({ code: "conflict" });
  await ctx.db.update(stones).set({ goodsState: "safe", examinationState: "concluded" }).where(eq(stones.id, bench.stoneId));
  await expect(addSpectrum(ctx, input())).rejects.toMatchObject({ code: "conflict" });
  expect(files.size).toBe(0);
});

test("somebody whose check is open sees none of the examination's spectra, nor their files", async () => {
  const { ctx, input } = await aSpectrumLab();
  const { stoneCode } = await aConcludedStone(ctx);
  // Attached while the stone was examined.
  await ctx.db.update(stones).set({ examinationState: "examining" }).where(eq(stones.code, stoneCode));
  await addSpectrum(ctx, input({ stoneCode }));
  await ctx.db.update(stones).set({ examinationState: "concluded" }).where(eq(stones.code, stoneCode));
  const checker = await aMember(ctx, ["gemmologist"]);
  expect(await listSpectra(checker, { stoneCode })).toHaveLength(1);
  await startSecondCheck(checker, { stoneCode, requestId: newId<"secondCheck">() });
  expect(await listSpectra(checker, { stoneCode })).toEqual([]);
  await expect(readSpectrumSource(checker, { stoneCode, sequence: 1 })).rejects.toMatchObject({ code: "not_found" });
  expect(await listSpectra(ctx, { stoneCode })).toHaveLength(1);
});

test("no more than twelve spectra stand on one stone", async () => {
  const { ctx, bench, input } = await aSpectrumLab();
  const row = { laboratoryId: ctx.laboratoryId, stoneId: bench.stoneId, fileKey: "k", fileName: "f", sizeBytes: 1, sha256: Buffer.alloc(32), format: "jcampDx", kind: "curve", xUnit: "nm", yUnit: "absorbance", isUnitAssumed: false, pointCount: 5, firstX: 400, lastX: 700, curve: [], peaks: [], notes: [], createdAt: ctx.now, createdBy: ctx.actorId } as const;
  await ctx.db.insert(spectra).values(Array.from({ length: 12 }, (_, at) => ({ ...row, id: newId<"spectrum">(), sequence: at + 1, requestId: newId() })));
  await expect(addSpectrum(ctx, input())).rejects.toMatchObject(refusedWith("12 spectra already"));
  await withdrawSpectrum(ctx, { stoneCode: bench.stoneCode, sequence: 4, reason: "twice" });
  expect(await addSpectrum(ctx, input())).toMatchObject({ sequence: 13 });
});

test.each([
  ["UTF-8", Buffer.from("Größe µm")],
  ["UTF-8 with its mark", Buffer.from("\uFEFFGröße µm")],
  ["UTF-16", Buffer.from("\uFEFFGröße µm", "utf16le")],
  ["the Western set", Buffer.from("Größe µm", "latin1")],
])("a file in %s is read", (_, bytes) => {
  expect(decodeTextFile(bytes).replace(/^\uFEFF/, "")).toBe("Größe µm");
});
