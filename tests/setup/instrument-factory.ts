import type { InstrumentId, ReferenceMaterialId } from "#app/domain/ids.ts";
import { recordInstrumentCheck, type InstrumentCheckInput } from "#app/features/instruments/record-instrument-check.server.ts";
import { startCorrection } from "#app/features/instruments/start-correction.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { addReferenceMaterial } from "#app/features/reference-materials/add-reference-material.server.ts";
import type { ReferenceDetails } from "#app/features/reference-materials/reference-forms.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { aBench, aReading, corundum } from "./bench-factory.ts";
import { anInstrument, later } from "./factories.ts";

const typed = (text: string) => ({ value: Number(text), text });

/** A reference read: 1.544 ± 0.002 as 1.5436, unless said otherwise. */
export function aCheck({ nominal = "1.544", reading = "1.5436", limit = "0.002", ...fields }: Partial<Omit<InstrumentCheckInput, "nominal" | "reading" | "limit">> & { nominal?: string; reading?: string; limit?: string } = {}): InstrumentCheckInput {
  return { requestId: newId<"instrumentCheck">(), referenceMaterial: "quartz", nominal: typed(nominal), reading: typed(reading), limit: typed(limit), tempC: 21, nextDueOn: "2026-12-20", note: "", ...fields };
}

/** A refractometer that reads a quartz and a synthetic spinel, and whose correction by both is in force. */
export async function aCorrectedInstrument(ctx: LabContext, { model = "offset" }: { model?: "offset" | "line" } = {}) {
  const instrumentId = await anInstrument(ctx, { kind: "refractometer", resolution: 0.001, upperLimit: 1.81 });
  const checks = [aCheck(), aCheck({ referenceMaterial: "synthetic spinel", nominal: "1.728", reading: "1.7271" })];
  for (const [at, check] of checks.entries()) await recordInstrumentCheck(later(ctx, at * 1000), instrumentId, check);
  const checkIds = checks.map(({ requestId }) => requestId);
  await startCorrection(later(ctx, 5000), instrumentId, { requestId: newId<"instrumentCorrection">(), checkIds, model, reason: "scale is off" });
  return { instrumentId, checkIds };
}

/** A corundum's index, read on a refractometer that failed its check an hour later. */
export async function aRecalledReading(ctx: LabContext) {
  const bench = await aBench(ctx);
  const { sequence } = await recordReading(later(ctx, 60_000), aReading(bench, corundum.refractometer));
  await failCheck(later(ctx, 3_600_000), bench.instruments.refractometer);
  return { ...bench, sequence };
}

export async function failCheck(ctx: LabContext, instrumentId: InstrumentId, fields: Parameters<typeof aCheck>[0] = {}): Promise<void> {
  await recordInstrumentCheck(ctx, instrumentId, aCheck({ reading: "1.549", ...fields }));
}

export function referenceDetails(fields: Partial<ReferenceDetails> = {}): ReferenceDetails {
  return {
    name: "Quartz Q1, ordinary ray", forKind: "refractometer", unit: "n", nominalValue: 1.5442, standardUncertainty: 0.0001, limitValue: 0.002, expectedText: "", source: "literature", condition: "", conditionSeenOn: null, ...fields,
  };
}

export async function aReference(ctx: LabContext, fields: Partial<ReferenceDetails> = {}): Promise<ReferenceMaterialId> {
  return addReferenceMaterial(ctx, { ...referenceDetails(fields), requestId: newId<"referenceMaterial">() });
}
