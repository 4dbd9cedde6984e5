import { compareIds } from "./compare-ids.ts";
import type { Evidence } from "./evidence.ts";
import { birefringenceTerm, indexTerms } from "./index-terms.ts";
import { lookedAtTerms, opticCharacterTerm, opticSignTerm, sgTerm } from "./seen-terms.ts";
import type { Term } from "./term.ts";

/** The observations of a piece of evidence in a fixed order, so that the order they came in cannot matter. */
export function termsOf(evidence: Evidence): Term[] {
  return [
    ...indexTerms(sorted(evidence.ri ?? []), { hasBirefringence: evidence.birefringence !== undefined }),
    ...(evidence.birefringence ? [birefringenceTerm(evidence.birefringence)] : []),
    ...(evidence.opticCharacter ? [opticCharacterTerm(evidence.opticCharacter)] : []),
    ...(evidence.opticSign ? [opticSignTerm(evidence.opticSign)] : []),
    ...(evidence.sg ? [sgTerm(evidence.sg)] : []),
    ...lookedAtTerms(evidence),
  ];
}

function sorted<T>(readings: readonly T[]): T[] {
  return [...readings].sort((a, b) => compareIds(JSON.stringify(a), JSON.stringify(b)));
}
