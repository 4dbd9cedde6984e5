import { isAllowed } from "#app/domain/permissions.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import type { Measured } from "./bench-ranking.ts";
import { rankStone } from "./rank-stone.server.ts";

/** Where a stone's readings put it among the species; null where its readings are not this person's to see now. */
export type StonePlace = Readonly<{
  code: string;
  description: string;
  seen: Readonly<{ index: Measured | null; density: Measured | null; /** Best first. */ candidateIds: readonly string[]; contradictedIds: readonly string[] }> | null;
}>;

const mostCandidates = 4;
const negligible = 0.001;

/**
 * A stone's index and density with what the ranking makes of all its readings. Whoever checks it, or might, does not see
 * what was read before.
 *
 * @param isExaminationAsked they chose to see the examination and so not to check it
 */
export async function getStonePlace(ctx: LabContext, { stoneCode, isExaminationAsked = false }: { stoneCode: string; isExaminationAsked?: boolean }): Promise<StonePlace> {
  requireRole(ctx, "readings.read");
  const { stone, readings, check, isCheckerBlind, isInvolved } = await getBench(ctx, { stoneCode });
  const mightCheck = isAllowed(ctx.roles, "secondChecks.do") && stone.state === "concluded" && !check && !isInvolved;
  if (isCheckerBlind || (mightCheck && !isExaminationAsked) || !readings) return { code: stone.code, description: stone.description, seen: null };
  const { bench, snapshot } = await rankStone(ctx, { readings: readings.filter(({ isOfSecondCheck }) => !isOfSecondCheck) });
  const { ranking } = snapshot();
  return {
    code: stone.code,
    description: stone.description,
    seen: {
      index: bench.index,
      density: bench.density,
      candidateIds: bench.hasEvidence ? ranking.candidates.filter(({ probability }, at) => at < mostCandidates && probability >= negligible).map(({ speciesId }) => speciesId) : [],
      contradictedIds: ranking.contradicted.map(({ speciesId }) => speciesId),
    },
  };
}
