import type { PublishedStone } from "./published-stone.ts";

export type Judged = {
  stone: PublishedStone;
  truth: readonly string[];
  /** Among the candidates, from 1; null where it was contradicted or is not in the table. */
  place: number | null;
  probability: number;
  first: { speciesId: string; probability: number } | null;
  because: string;
  stated: ReadonlyArray<{ probability: number; isTrue: boolean }>;
};

const percent = (count: number, of: number) => (of === 0 ? "–" : `${((100 * count) / of).toFixed(1)} % (${count} of ${of})`);

/** The figures as text: all stones whose species the table has, then those with two independent kinds of evidence. */
export function summarise(judged: readonly Judged[]): string {
  const known = judged.filter(({ truth }) => truth.length > 0);
  const ranked = known.filter(({ stone }) => stone.score_as === "rank");
  const lines: string[] = [];
  const group = (title: string, of: readonly Judged[]) => {
    const contradicted = of.filter(({ place }) => place === null);
    lines.push(
      title,
      `  first                 ${percent(of.filter(({ place }) => place === 1).length, of.length)}`,
      `  among the first three ${percent(of.filter(({ place }) => place !== null && place <= 3).length, of.length)}`,
      `  contradicted          ${percent(contradicted.length, of.length)}`,
      `  log loss              ${(of.reduce((sum, { probability }) => sum - Math.log(Math.max(probability, 1e-6)), 0) / Math.max(1, of.length)).toFixed(3)}`,
      `  Brier score           ${(of.reduce((sum, { stated, probability }) => sum + stated.reduce((inner, each) => inner + (each.probability - (each.isTrue ? 1 : 0)) ** 2, 0) + (probability === 0 ? 1 : 0), 0) / Math.max(1, of.length)).toFixed(3)}`,
      "",
    );
  };
  lines.push(`${judged.length} stones, ${judged.length - known.length} of species that the table lacks`, "");
  group("All whose species is in the table", known);
  group("With two independent kinds of evidence", ranked);
  lines.push("Reliability: what was stated of every candidate, and how often it was so");
  for (let low = 0; low < 10; low++) {
    const bin = known.flatMap(({ stated }) => stated).filter(({ probability }) => probability >= low / 10 && (probability < (low + 1) / 10 || (low === 9 && probability <= 1)) && probability >= 0.01);
    if (bin.length === 0) continue;
    const [stated, was] = [bin.reduce((sum, { probability }) => sum + probability, 0) / bin.length, bin.filter(({ isTrue }) => isTrue).length / bin.length];
    lines.push(`  ${(low / 10).toFixed(1)}–${((low + 1) / 10).toFixed(1)}  stated ${(100 * stated).toFixed(1).padStart(5)} %  was ${(100 * was).toFixed(1).padStart(5)} %  of ${bin.length}`);
  }
  const lacking = judged.filter(({ truth, first }) => truth.length === 0 && (first?.probability ?? 0) > 0.9);
  lines.push("", `Confident of a species where the true one is not in the table: ${percent(lacking.length, judged.length - known.length)}`, "");
  for (const { stone, place, probability, first, because } of known.filter((each) => each.place === null || (each.stone.score_as === "rank" && each.place > 1))) {
    lines.push(`${stone.id} ${stone.truth.species}: ${place === null ? `contradicted, ${because}` : `place ${place} at ${(100 * probability).toFixed(1)} %`}; first ${first ? `${first.speciesId} ${(100 * first.probability).toFixed(1)} %` : "none"}`);
  }
  return lines.join("\n");
}
