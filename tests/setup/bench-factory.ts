import { eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { instrumentChecks, stones } from "#app/db/schema/index.ts";
import type { ConsentCode } from "#app/domain/consent-code.ts";
import type { InstrumentId, StoneId } from "#app/domain/ids.ts";
import { instrumentKindFor } from "#app/domain/reading.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import type { ReadingDraft } from "#app/features/readings/reading-draft.ts";
import type { RecordReading } from "#app/features/readings/record-reading.server.ts";
import type { TakeInItem } from "#app/features/take-ins/take-in-items.server.ts";
import { anInstrument } from "./factories.ts";
import { aTakenInItem } from "./take-in-factory.ts";

export type TestBench = { stoneCode: string; stoneId: StoneId; instruments: Record<"refractometer" | "angleRefractometer" | "polariscope" | "balance" | "gauge", InstrumentId> };

/** A loose red oval of 2.143 ct, and instruments that passed their checks today. */
export async function aBench(ctx: LabContext, fields: Partial<TakeInItem> = {}): Promise<TestBench> {
  const consents: ConsentCode[] = ["dryCloth", "contactLiquid", "hydrostatic"];
  const { stoneCodes } = await aTakenInItem(ctx, { consents, ...fields });
  const stoneCode = stoneCodes[0]!;
  const [stone] = await ctx.db.select({ id: stones.id }).from(stones).where(eq(stones.code, stoneCode));
  const make = async (kind: keyof TestBench["instruments"], more: object) => {
    const instrumentId = await anInstrument(ctx, { kind, ...more });
    await ctx.db.insert(instrumentChecks).values({
      laboratoryId: ctx.laboratoryId, id: newId<"instrumentCheck">(), instrumentId, referenceMaterial: "quartz", nominalValue: 1.544, readingValue: 1.543, readingText: "1.543",
      limitValue: 0.002, isPassed: true, nextDueOn: "2026-12-08", checkedAt: ctx.now, checkedBy: ctx.actorId,
    });
    return instrumentId;
  };
  return {
    stoneCode,
    stoneId: stone!.id,
    instruments: {
      refractometer: await make("refractometer", { resolution: 0.001, upperLimit: 1.81 }),
      angleRefractometer: await make("angleRefractometer", { resolution: 0.01, prismIndex: 1.88 }),
      polariscope: await make("polariscope", { resolution: null }),
      balance: await make("balance", { resolution: 0.001 }),
      gauge: await make("gauge", { resolution: 0.01 }),
    },
  };
}

/** Those that the bench has one of; for other tests an instrument is added by the test itself. */
function instrumentOf({ instruments }: TestBench, { kind, quality }: ReadingDraft): InstrumentId | null {
  const needed = instrumentKindFor[kind];
  if (needed === null || (quality === "noResult" && !(needed in instruments))) return null;
  return instruments[needed as keyof TestBench["instruments"]] ?? null;
}

/** What a form sends, a text a name; a list for boxes that share one. */
export function aForm(fields: Readonly<Record<string, string | readonly string[]>>): FormData {
  const form = new FormData();
  for (const [name, value] of Object.entries(fields)) for (const one of typeof value === "string" ? [value] : value) form.append(name, one);
  return form;
}

/** One reading as the form would send it. */
export function aReading(bench: TestBench, draft: ReadingDraft, fields: Partial<RecordReading> = {}): RecordReading {
  return { requestId: newId<"observation">(), stoneCode: bench.stoneCode, instrumentId: instrumentOf(bench, draft), noResultReason: "", note: "", areCandidatesHidden: false, draft, ...fields };
}

/** What a corundum shows. */
export const corundum = {
  refractometer: { kind: "refractometer", quality: "good", edges: "two", low: "1.762", high: "1.770", isRotated: true, facet: "table", light: "sodium" },
  polariscope: { kind: "polariscope", quality: "good", behaviour: "blinks", directionsTried: "3", figure: "uniaxial", sign: null },
  density: { kind: "density", quality: "good", method: "suspended", massAirCt: "2.143", massLiquidCt: "1.608", tempC: "21.4" },
  weight: { kind: "weight", quality: "good", weightCt: "2.143" },
  dimensions: { kind: "dimensions", quality: "good", shape: "other", lengthMm: "8.41", widthMm: "6.90", depthMm: "4.52" },
  free: { kind: "free", quality: "good", text: "Curved striae under 40×" },
} as const satisfies Record<string, ReadingDraft>;
