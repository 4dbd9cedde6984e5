import { eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { stones } from "#app/db/schema/index.ts";
import type { ConclusionInput } from "#app/features/identification/conclusion-forms.server.ts";
import { proposeConclusion } from "#app/features/identification/propose-conclusion.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { aBench, aReading, corundum, type TestBench } from "./bench-factory.ts";

/** A conclusion that the readings of a corundum carry. */
export async function aConclusion(ctx: LabContext, { stoneCode, stoneId }: TestBench, fields: Partial<ConclusionInput> = {}): Promise<ConclusionInput & { stoneCode: string }> {
  const [stone] = await ctx.db.select({ version: stones.version }).from(stones).where(eq(stones.id, stoneId));
  return {
    requestId: newId<"conclusion">(),
    stoneCode,
    version: stone!.version,
    speciesName: "Corundum",
    variety: "ruby",
    nature: "synthetic",
    natureEvidence: "Curved striae and gas bubbles",
    confidence: "identified",
    treatments: [{ code: "heating", status: "notDeterminable", extent: null, evidence: "" }],
    evidence: "Index, density, curved striae",
    limits: ["benchOnly"],
    rejected: [{ name: "Spinel", because: "doubly refractive" }],
    contradictionsExplained: "",
    description: { shape: "oval", cut: "mixed", transparency: "transparent", colour: "purplish red", colourLight: "", phenomenon: "none", condition: "" },
    reasoning: "",
    ...fields,
  };
}

/** Taken in, read and concluded by the context's person. */
export async function aConcludedStone(ctx: LabContext, { alsoReadBy }: { alsoReadBy?: LabContext } = {}): Promise<TestBench> {
  const bench = await aBench(ctx);
  for (const draft of [corundum.refractometer, corundum.weight, corundum.free]) await recordReading(ctx, aReading(bench, draft));
  if (alsoReadBy) await recordReading(alsoReadBy, aReading(bench, corundum.dimensions));
  await proposeConclusion(ctx, await aConclusion(ctx, bench));
  return bench;
}
