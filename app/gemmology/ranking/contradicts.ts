import { verdictAt } from "./defaults.ts";
import type { Score, Term } from "./term.ts";

/** What is seen counts as a contradiction only when it is as good as impossible: eyes err. */
const seenContradictsBelow = 0.004;

export function contradicts(term: Term, score: Score): boolean {
  return !term.cannotContradict && score.tail < (term.measure ? verdictAt.contradicts : seenContradictsBelow);
}

const kinds: Readonly<Record<string, string>> = { birefringence: "ri", opticSign: "opticCharacter", heavyLiquid: "sg" };

/** Observations of one kind may share one mistake: a facet, a liquid's edge, a balance. */
export function independentKind({ property }: Term): string {
  return kinds[property] ?? property;
}
