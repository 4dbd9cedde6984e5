import { and, desc, eq } from "drizzle-orm";
import { conclusions, secondChecks, stones, users } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/**
 * The latest conclusion of a stone; undefined while there is none. To whoever is making its check it is not there until
 * they have compared.
 */
export async function getConclusion(ctx: LabContext, { stoneCode }: { stoneCode: string }) {
  requireRole(ctx, "conclusions.read");
  const { db, laboratoryId, actorId } = ctx;
  const [found] = await db
    .select({
      conclusion: {
        id: conclusions.id,
        version: conclusions.version,
        speciesName: conclusions.speciesName,
        variety: conclusions.variety,
        nature: conclusions.nature,
        natureEvidence: conclusions.natureEvidence,
        confidence: conclusions.confidence,
        treatments: conclusions.treatments,
        evidence: conclusions.evidence,
        limits: conclusions.limits,
        rejected: conclusions.rejected,
        contradictionsExplained: conclusions.contradictionsExplained,
        description: conclusions.description,
        reasoning: conclusions.reasoning,
        speciesTableVersion: conclusions.speciesTableVersion,
        modelVersion: conclusions.modelVersion,
        concludedAt: conclusions.concludedAt,
      },
      by: users.name,
      checkerId: secondChecks.checkerId,
      comparedAt: secondChecks.comparedAt,
    })
    .from(stones)
    .innerJoin(conclusions, and(eq(conclusions.laboratoryId, stones.laboratoryId), eq(conclusions.stoneId, stones.id)))
    .innerJoin(users, eq(users.id, conclusions.concludedBy))
    .leftJoin(secondChecks, and(eq(secondChecks.laboratoryId, conclusions.laboratoryId), eq(secondChecks.conclusionId, conclusions.id)))
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
    .orderBy(desc(conclusions.version))
    .limit(1);
  if (!found) return null;
  if (found.checkerId === actorId && found.comparedAt === null) throw new AppError("forbidden", "You are checking this stone: its conclusion is kept from you until you compare.");
  return { ...found.conclusion, by: found.by };
}
export type ConclusionView = NonNullable<Awaited<ReturnType<typeof getConclusion>>>;
