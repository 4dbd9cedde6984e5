import { features, type Meaning } from "./feature.ts";

export type Finding = Readonly<{ feature: string; question: Meaning["question"]; answer: string; process: string | null; strength: Meaning["strength"] }>;
export type NatureEvidence = Readonly<{
  findings: readonly Finding[];
  /** What was seen and is evidence of nothing. */
  silent: ReadonlyArray<Readonly<{ feature: string; saysNothingOf: string }>>;
  /** Findings that cannot both hold. */
  conflicts: readonly string[];
}>;

/**
 * What an observer's words say about nature and treatment of a species: a question of its own, apart from which species
 * it is. Negations ("no bubbles") say nothing.
 *
 * @param speciesId as the species table names it; null while it is open
 * @param texts the observations that stand, as written
 *
 * Source: common practice (feature.ts).
 */
export function natureEvidence({ speciesId, texts }: { speciesId: string | null; texts: readonly string[] }): NatureEvidence {
  const seen = features.filter(({ words }) => texts.some((text) => isSaid(text, words)));
  const findings = seen.flatMap(({ name, meanings }) =>
    meanings.filter(({ species }) => species === "any" || (speciesId !== null && species.includes(speciesId))).map(({ question, answer, process, strength }): Finding => ({ feature: name, question, answer, process, strength })),
  );
  const natures = new Set(findings.filter(({ question, strength }) => question === "nature" && strength === "positive").map(({ answer }) => answer));
  const isBoth = findings.some(({ answer }) => answer === "natural") && natures.has("synthetic");
  return {
    findings: [...findings].sort((a, b) => Number(b.strength === "positive") - Number(a.strength === "positive")),
    silent: seen.flatMap(({ name, saysNothingOf }) => (saysNothingOf ? [{ feature: name, saysNothingOf }] : [])),
    conflicts: [
      ...(natures.size > 1 ? [`Features of ${[...natures].join(" and ")} material were both written down: is it one stone?`] : []),
      ...(isBoth ? ["A feature of natural stones stands beside proof of a synthetic one: look again at both, and at a join between them."] : []),
    ],
  };
}

/** Said, and not denied in the words right before. */
function isSaid(text: string, words: RegExp): boolean {
  const found = words.exec(text);
  if (!found) return false;
  if (/^(no |nothing|clean|inclusion)/i.test(found[0])) return true;
  return !/\b(no|not|without|neither|nor|free of)\s+(\w+\s+){0,2}$/i.test(text.slice(0, found.index));
}
