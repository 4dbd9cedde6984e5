import { and, desc, eq, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { conclusions, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { examinationStateNames } from "#app/domain/stone-state.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { moveExamination } from "#app/features/stones/move-examination.server.ts";
import type { ConclusionInput } from "./conclusion-forms.server.ts";
import { conclusionGate } from "./conclusion-gate.ts";
import { findSpeciesId, rankStone } from "./rank-stone.server.ts";

/**
 * examining → concluded, by a person. Refused while the evidence does not carry it; the ranking that lay before the
 * gemmologist is kept with it as it was. A changed mind is the next version; the request's id becomes the conclusion's.
 */
export async function proposeConclusion(ctx: LabContext, { stoneCode, requestId, version: seenVersion, ...input }: ConclusionInput & { stoneCode: string }): Promise<void> {
  requireRole(ctx, "conclusions.propose");
  const { laboratoryId, actorId, now } = ctx;
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    const [stone] = await tx
      .select({ id: stones.id, state: stones.examinationState, version: stones.version })
      .from(stones)
      .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
      .for("update");
    if (!stone) throw new AppError("not_found", "There is no such stone.");
    const [latest] = await tx
      .select({ id: conclusions.id, version: conclusions.version })
      .from(conclusions)
      .where(and(eq(conclusions.laboratoryId, laboratoryId), eq(conclusions.stoneId, stone.id)))
      .orderBy(desc(conclusions.version))
      .limit(1);
    if (latest?.id === requestId) return;
    if (stone.state !== "examining" && stone.state !== "returned") {
      throw new AppError("conflict", `This stone stands at “${examinationStateNames[stone.state]}”: nothing can be concluded now.`);
    }
    if (stone.version !== seenVersion) throw new AppError("conflict", "The readings of this stone changed since this form was opened. What you wrote is still here: look at them, then send it again.");

    const readings = await listReadings(scope, { stoneCode });
    const examined = readings.filter(({ isOfSecondCheck }) => !isOfSecondCheck);
    const { snapshot, contradictionsOf } = await rankStone(scope, { readings: examined });
    const speciesId = findSpeciesId(input.speciesName);
    const problems = conclusionGate(examined, speciesId && input.confidence !== "notDetermined" ? contradictionsOf(speciesId) : [], input);
    const [first] = Object.values(problems);
    if (first) throw new AppError("invalid_input", first[0] ?? "This conclusion is not carried by the readings.", { fieldErrors: problems });

    const ranked = snapshot();
    if (stone.state === "returned") await moveExamination(scope, { stoneId: stone.id, from: "returned", to: "examining", why: "Examination taken up again after the check returned it" });
    await moveExamination(scope, { stoneId: stone.id, from: "examining", to: "concluded", why: "Conclusion proposed" });
    await tx.update(stones).set({ version: sql`${stones.version} + 1` }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id)));
    await tx.insert(conclusions).values({
      laboratoryId,
      id: requestId,
      stoneId: stone.id,
      version: (latest?.version ?? 0) + 1,
      speciesId,
      ...input,
      ranking: ranked,
      speciesTableVersion: ranked.ranking.tableVersion,
      modelVersion: ranked.ranking.modelVersion,
      concludedAt: now,
      concludedBy: actorId,
    });
    await recordAudit(scope, { action: "conclusion.proposed", subject: { kind: "stone", id: stone.id }, detail: { version: (latest?.version ?? 0) + 1, speciesId, confidence: input.confidence } });
  });
}
