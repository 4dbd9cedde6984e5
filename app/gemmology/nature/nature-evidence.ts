import { features, type Feature, type Meaning } from "./feature.ts";

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
 * it is. What a clause denies ("no striae, bubbles") says nothing.
 *
 * @param speciesId as the species table names it; null while it is open
 * @param texts the observations that stand, as written
 *
 * Source: common practice (feature.ts).
 */
export function natureEvidence({ speciesId, texts }: { speciesId: string | null; texts: readonly string[] }): NatureEvidence {
  const seen = features.filter((feature) => texts.some((text) => isSaid(text, feature)));
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

const ofNothing = /^(no |nothing|clean|inclusion)/i;
/** A denial reaches to the end of its clause ("no curved striae, bubbles" denies both), or stands right behind ("bubbles: none"). */
const denialBefore = /\b(no|not|without|neither|nor|none|free of)\b/i;
const denialBehind = /^\s*[:–(-]?\s*(none|absent|not (seen|found|present|visible))\b/i;
const clauseEnd = /[;:]|\.(?!\d)|\bbut\b/i;
const phraseEnd = /[,;:]|\.(?!\d)|\bbut\b/i;

/** How a feature is written: in observers' words, or by its own name, as a list to tick has it. */
const sayings = new Map(features.map(({ name, words }) => [name, new RegExp(`${words.source}|\\b${name}\\b`, "gi")]));

/** Said at least once where its clause does not deny it and its phrase does not give it another sense. */
function isSaid(text: string, { name, unlessWith }: Feature): boolean {
  return [...text.matchAll(sayings.get(name)!)].some((found) => {
    if (ofNothing.test(found[0])) return true;
    const [before, behind] = [text.slice(0, found.index), text.slice(found.index + found[0].length)];
    if (denialBefore.test(before.split(clauseEnd).at(-1)!) || denialBehind.test(behind)) return false;
    const phrase = before.split(phraseEnd).at(-1)! + found[0] + behind.split(phraseEnd)[0]!;
    return !unlessWith?.test(phrase);
  });
}
