import { parseDecimal } from "#app/domain/decimal.ts";

export type TypedMass = Readonly<{ massText: string; massUnit: "ct" | "g" }>;
const caratsPerGram = 5;
const smallestAlarmCt = 0.01;
/** Standard uncertainty of a weighing in air on a balance that shows 0.001 ct (instruments.md §2.17), where the laboratory has no study of its own. */
const usualUncertaintyCt = 0.0015;

export function massInCt({ massText, massUnit }: TypedMass): number {
  const value = parseDecimal(massText);
  if (value === undefined) throw new RangeError(`not a mass: ${massText}`);
  return massUnit === "g" ? value * caratsPerGram : value;
}

/**
 * Whether goods weigh something else than they did. The alarm is at max(3u, 0.01 ct), u being that of one weighing; a
 * first weighing on a coarser display widens it to one step of that, a second one only where its unit is another: fewer
 * digits typed on the way out are no reason to look away.
 *
 * Source: the trade's rule "weigh out = weigh in" (workflow 1.3, common practice).
 */
export function massDifference({ before, after, standardUncertaintyCt }: { before: TypedMass; after: TypedMass; standardUncertaintyCt: number | null }): {
  differenceCt: number;
  isAlarming: boolean;
} {
  const differenceCt = massInCt(after) - massInCt(before);
  const limitCt = Math.max(3 * (standardUncertaintyCt ?? usualUncertaintyCt), smallestAlarmCt, stepCt(before), before.massUnit === after.massUnit ? 0 : stepCt(after));
  return { differenceCt, isAlarming: Math.abs(differenceCt) > limitCt + 1e-9 };
}

function stepCt({ massText, massUnit }: TypedMass): number {
  const decimals = /[.,](\d*)\s*$/.exec(massText.trim())?.[1]?.length ?? 0;
  return 10 ** -decimals * (massUnit === "g" ? caratsPerGram : 1);
}
