import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { auditEvents, conclusions, stones } from "#app/db/schema/index.ts";
import { conclusionGate, evidenceClasses } from "#app/features/identification/conclusion-gate.ts";
import { getConclusion } from "#app/features/identification/get-conclusion.server.ts";
import { proposeConclusion } from "#app/features/identification/propose-conclusion.server.ts";
import { findSpeciesId } from "#app/features/identification/rank-stone.server.ts";
import type { ReadingDraft } from "#app/features/readings/reading-draft.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { aBench, aReading, corundum } from "../../setup/bench-factory.ts";
import { aConclusion } from "../../setup/conclusion-factory.ts";
import { aLab, aMember } from "../../setup/factories.ts";

const stoneRead = async (...drafts: ReadingDraft[]) => {
  const ctx = await aLab({ roles: ["owner", "gemmologist", "desk"] });
  const bench = await aBench(ctx);
  for (const draft of drafts) await recordReading(ctx, aReading(bench, draft));
  return { ctx, bench };
};

test("a conclusion that the evidence carries moves the stone on and keeps the ranking as it was", async () => {
  const { ctx, bench } = await stoneRead(corundum.refractometer, corundum.density, corundum.free);
  await proposeConclusion(ctx, await aConclusion(ctx, bench));
  expect(await ctx.db.select().from(stones).where(eq(stones.id, bench.stoneId))).toMatchObject([{ examinationState: "concluded" }]);
  const [row] = await ctx.db.select().from(conclusions).where(eq(conclusions.stoneId, bench.stoneId));
  expect(row).toMatchObject({ version: 1, speciesId: "corundum", speciesName: "Corundum", nature: "synthetic", concludedBy: ctx.actorId });
  expect(row!.ranking).toMatchObject({ evidence: { sg: expect.anything() }, ranking: { tableVersion: row!.speciesTableVersion, modelVersion: row!.modelVersion, candidates: expect.arrayContaining([expect.objectContaining({ speciesId: "corundum" })]) } });
  expect(await ctx.db.select().from(auditEvents).where(and(eq(auditEvents.laboratoryId, ctx.laboratoryId), eq(auditEvents.action, "conclusion.proposed")))).toHaveLength(1);
});

test("one kind of evidence is not enough, however often it was read", async () => {
  const { ctx, bench } = await stoneRead(corundum.refractometer, corundum.refractometer, corundum.weight);
  await expect(proposeConclusion(ctx, await aConclusion(ctx, bench))).rejects.toMatchObject({ code: "invalid_input", fieldErrors: { evidence: [expect.stringContaining("the refractive index alone")] } });
  await recordReading(ctx, aReading(bench, corundum.polariscope));
  await proposeConclusion(ctx, await aConclusion(ctx, bench));
});

test("struck and poor readings and ones without result are no evidence", async () => {
  const { ctx, bench } = await stoneRead(corundum.refractometer, corundum.density, { ...corundum.polariscope, quality: "poor" }, { ...corundum.polariscope, behaviour: "cannotTell", figure: "none" });
  await strikeReading(ctx, { ...bench, sequence: 2, reason: "bubble on the wire" });
  await recordReading(ctx, aReading(bench, { ...corundum.density, quality: "noResult" }, { noResultReason: "too small" }));
  await expect(proposeConclusion(ctx, await aConclusion(ctx, bench))).rejects.toMatchObject({ fieldErrors: { evidence: [expect.stringContaining("two independent kinds")] } });
});

test("a good reading that contradicts the conclusion is struck or explained first", async () => {
  const { ctx, bench } = await stoneRead(corundum.refractometer, corundum.density, { ...corundum.refractometer, edges: "one", low: "1.544", high: "" });
  await expect(proposeConclusion(ctx, await aConclusion(ctx, bench))).rejects.toMatchObject({ fieldErrors: { contradictionsExplained: [expect.stringMatching(/contradicts Corundum: reading 3 \(/)] } });
  await proposeConclusion(ctx, await aConclusion(ctx, bench, { contradictionsExplained: "Reading 3 is of the base of an assembled stone" }));
  expect(await getConclusion(ctx, bench)).toMatchObject({ contradictionsExplained: expect.stringContaining("assembled") });
});

test("striking the contradicting reading removes what stands against the conclusion", async () => {
  const { ctx, bench } = await stoneRead(corundum.refractometer, corundum.density, { ...corundum.refractometer, edges: "one", low: "1.544", high: "" });
  await strikeReading(ctx, { ...bench, sequence: 3, reason: "Read off the neighbouring stone" });
  await proposeConclusion(ctx, await aConclusion(ctx, bench));
});

const good = { speciesName: "Corundum", nature: "natural", natureEvidence: "Silk", confidence: "identified", treatments: [{ code: "heating", status: "notDetected", extent: null, evidence: "" }], rejected: [{ name: "Spinel", because: "doubly refractive" }], contradictionsExplained: "" } as const;
const standing = [
  { sequence: 1, quality: "good", strike: null, detail: { kind: "polariscope", behaviour: "blinks", directionsTried: 3, figure: "none", sign: null } },
  { sequence: 2, quality: "good", strike: null, detail: { kind: "free", text: "silk" } },
] as const;
const measured = [...standing, { sequence: 3, quality: "good", strike: null, detail: { kind: "density", method: "suspended" } }] as const;

test("nothing is called identified before anything was measured", () => {
  expect(conclusionGate(standing, [], good)).toMatchObject({ confidence: [expect.stringContaining("Nothing was measured")] });
  expect(conclusionGate(standing, [], { ...good, confidence: "consistentWith" })).toEqual({});
  expect(conclusionGate(measured, [], good)).toEqual({});
  expect(evidenceClasses(measured)).toEqual(new Set(["character", "seen", "density"]));
});

test.each([
  ["natural without its evidence", { natureEvidence: " " }, "natureEvidence"],
  ["synthetic without its evidence", { nature: "synthetic", natureEvidence: "" }, "natureEvidence"],
  ["no alternative ruled out", { rejected: [] }, "rejected"],
  ["natural and silent on treatments", { treatments: [] }, "treatments"],
] as const)("%s is refused beside its field", (_, fields, field) => {
  expect(Object.keys(conclusionGate(measured, [], { ...good, ...fields }))).toEqual([field]);
});

test("what is not determined needs neither alternatives nor treatments", () => {
  expect(conclusionGate(measured, [], { ...good, confidence: "notDetermined", nature: "undetermined", natureEvidence: "", treatments: [], rejected: [] })).toEqual({});
});

test("a conclusion sent twice is drawn once; one from an older view of the readings is refused", async () => {
  const { ctx, bench } = await stoneRead(corundum.refractometer, corundum.density);
  const stale = await aConclusion(ctx, bench);
  await recordReading(ctx, aReading(bench, corundum.free));
  await expect(proposeConclusion(ctx, stale)).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("changed since this form was opened") });
  const once = await aConclusion(ctx, bench);
  await Promise.all([proposeConclusion(ctx, once), proposeConclusion(ctx, once)]);
  await proposeConclusion(ctx, once);
  expect(await ctx.db.select().from(conclusions).where(eq(conclusions.stoneId, bench.stoneId))).toHaveLength(1);
  await expect(proposeConclusion(ctx, await aConclusion(ctx, bench))).rejects.toMatchObject({ code: "conflict", userMessage: expect.stringContaining("nothing can be concluded now") });
});

test("only a gemmologist of the laboratory concludes, and the desk reads no conclusion", async () => {
  const { ctx, bench } = await stoneRead(corundum.refractometer, corundum.density);
  const input = await aConclusion(ctx, bench);
  for (const role of ["owner", "appraiser", "desk"] as const) await expect(proposeConclusion(await aMember(ctx, [role]), input)).rejects.toMatchObject({ code: "forbidden" });
  await expect(proposeConclusion(await aLab(), input)).rejects.toMatchObject({ code: "not_found" });
  await expect(getConclusion(await aMember(ctx, ["desk"]), bench)).rejects.toMatchObject({ code: "forbidden" });
});

test("words that name a species of the table find it, others find none", () => {
  expect([findSpeciesId(" corundum "), findSpeciesId("Quartz"), findSpeciesId("unobtainium")]).toEqual(["corundum", "quartz", null]);
});
