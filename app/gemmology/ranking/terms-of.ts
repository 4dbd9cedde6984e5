import { birefringenceTerm } from "./birefringence-term.ts";
import { opticCharacterTerm, opticSignTerm } from "./character-terms.ts";
import { compareIds } from "./compare-ids.ts";
import { heavyLiquidTerm, sgTerm } from "./density-terms.ts";
import type { Evidence } from "./evidence.ts";
import { indexTerms } from "./index-terms.ts";
import { lookedAtTerms } from "./seen-terms.ts";
import type { Term } from "./term.ts";

/** The observations of a piece of evidence in a fixed order, so that the order they came in cannot matter. */
export function termsOf(evidence: Evidence): Term[] {
  return [
    ...indexTerms(sorted(evidence.ri ?? []), { hasBirefringence: evidence.birefringence !== undefined }),
    ...(evidence.birefringence ? [birefringenceTerm(evidence.birefringence)] : []),
    ...(evidence.opticCharacter ? [opticCharacterTerm(evidence.opticCharacter)] : []),
    ...(evidence.opticSign ? [opticSignTerm(evidence.opticSign)] : []),
    ...(evidence.sg ? [sgTerm(evidence.sg)] : []),
    ...sorted(evidence.heavyLiquids ?? []).map(heavyLiquidTerm),
    ...lookedAtTerms({ ...evidence, ...(evidence.absorption && { absorption: sorted(evidence.absorption) }), ...(evidence.phenomena && { phenomena: sorted(evidence.phenomena) }), ...(evidence.colour && { colour: sorted(evidence.colour) }) }),
  ];
}

function sorted<T>(readings: readonly T[]): T[] {
  return readings.length < 2 ? [...readings] : [...readings].sort((a, b) => compareIds(JSON.stringify(a), JSON.stringify(b)));
}
