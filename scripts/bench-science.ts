import { readFileSync } from "node:fs";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { benchTestIds, type BenchTestId } from "#app/gemmology/next-test/bench-test.ts";
import { nextTests } from "#app/gemmology/next-test/next-tests.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";
import rotation from "#fixtures/worked/rotation-examples.json" with { type: "json" };
import { evidenceOf, type PublishedStone } from "./accuracy/published-stone.ts";

/** `npm run bench:science`: how long the science takes in Node.js, and how the ranking grows with the table. */
const { table } = loadSpeciesTable();
const stones = readFileSync("tests/accuracy/stones.jsonl", "utf8").trim().split("\n").map((line) => {
  const parsed = parseEvidence(evidenceOf(JSON.parse(line) as PublishedStone));
  if (!parsed.ok) throw new Error("a published stone is not evidence");
  return parsed.evidence;
});
const runs = rotation.examples.map(({ readings }) => ({ facets: [{ label: "table", readings: readings.map(({ angleDeg, upper, lower }) => ({ angleDeg, upper, lower, u: 0.0005, polariserDeg: null })) }] }));

function times<Input>(inputs: readonly Input[], work: (input: Input) => unknown, { rounds, warm = 3 }: { rounds: number; warm?: number }): number[] {
  for (let round = 0; round < warm; round++) for (const input of inputs) work(input);
  const found: number[] = [];
  for (let round = 0; round < rounds; round++)
    for (const input of inputs) {
      const startedAt = performance.now();
      work(input);
      found.push(performance.now() - startedAt);
    }
  return found.sort((a, b) => a - b);
}
const say = (what: string, sorted: readonly number[], aim: string) =>
  console.log(`${what.padEnd(44)} median ${sorted[sorted.length >> 1]!.toFixed(3)} ms  99 % ${sorted[Math.floor(sorted.length * 0.99)]!.toFixed(3)} ms  worst ${sorted.at(-1)!.toFixed(3)} ms  (aim: ${aim})`);

const ranking = times(stones, (evidence) => rankSpecies(evidence, table), { rounds: 20, warm: 10 });
say(`one stone against ${table.nodes.length} species`, ranking, "median under 1 ms");
const openBench = { massCt: 3, uAirCt: 0.0015, uWaterCt: 0.004, isPolished: true, offered: new Set(benchTestIds), done: new Set<BenchTestId>(), poor: new Set<BenchTestId>(), barred: new Map<BenchTestId, string>() };
const ranked = stones.map((evidence) => rankSpecies(evidence, table).candidates);
say("what to test next", times(ranked, (candidates) => nextTests(candidates, table, openBench), { rounds: 5 }), "under 15 ms");
say("one rotation run of 12 positions", times(runs, fitRotation, { rounds: 10 }), "under 20 ms");

const startedAt = performance.now();
for (let at = 0; at < 10_000; at++) rankSpecies(stones[at % stones.length]!, table);
console.log(`10,000 stones ranked anew                     ${(10_000 / ((performance.now() - startedAt) / 1000)).toFixed(0)} a second`);

/** A table so many times as long, of the same species under other ids. */
const longer = (by: number): SpeciesTable => ({ ...table, nodes: Array.from({ length: by }, (_, copy) => table.nodes.map((node) => ({ ...node, id: `${node.id}-${copy}` }))).flat() });
const [single, fourfold] = [1, 4].map((by) => {
  const long = longer(by);
  const sorted = times(stones, (evidence) => rankSpecies(evidence, long), { rounds: 6, warm: 2 });
  return sorted[sorted.length >> 1]!;
}) as [number, number];
console.log(`four times the table takes                    ${(fourfold / single).toFixed(2)} times as long  (aim: at most linear, 4)`);
