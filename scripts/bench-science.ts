import { readFileSync } from "node:fs";
import { runInThisContext } from "node:vm";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { benchTestIds, type BenchTestId } from "#app/gemmology/next-test/bench-test.ts";
import { nextTests } from "#app/gemmology/next-test/next-tests.ts";
import rotation from "#fixtures/worked/rotation-examples.json" with { type: "json" };
import { evidenceOf, type PublishedStone } from "./accuracy/published-stone.ts";
import { bundleTiming } from "./science/bundle.ts";
import { timeInChromium } from "./science/in-chromium.ts";
import type { RankingTimes, timeRanking } from "./science/time-ranking.ts";

/** `npm run bench:science`: how long the science takes, the ranking in Node.js and in Chromium, and how it grows with the table. */
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

const code = await bundleTiming();
const { timeRanking: timeHere } = runInThisContext(`${code};scienceBench`) as { timeRanking: typeof timeRanking };
sayRanking("Node.js", timeHere(table, stones));
const inChromium = await timeInChromium(code, table, stones);
if (inChromium) sayRanking("Chromium", inChromium);
else console.log("Chromium: none found (CHROMIUM_PATH names one)");

const openBench = { massCt: 3, uAirCt: 0.0015, uWaterCt: 0.004, isPolished: true, offered: new Set(benchTestIds), done: new Set<BenchTestId>(), poor: new Set<BenchTestId>(), barred: new Map<BenchTestId, string>() };
const ranked = stones.map((evidence) => rankSpecies(evidence, table).candidates);
say("what to test next", times(ranked, (candidates) => nextTests(candidates, table, openBench), { rounds: 5 }), "under 15 ms");
say("one rotation run of 12 positions", times(runs, fitRotation, { rounds: 10 }), "under 20 ms");

function sayRanking(where: string, { median, most, worst, slowestStone, stonesASecond, fourfoldTable }: RankingTimes): void {
  console.log(`one stone against ${table.nodes.length} species, ${where}`);
  console.log(`  median ${median.toFixed(3)} ms (aim: under 1)   slowest stone ${slowestStone.toFixed(3)} ms (aim: under 3)   99 % ${most.toFixed(3)} ms   worst run of ${stones.length * 25} ${worst.toFixed(3)} ms`);
  console.log(`  ${stonesASecond.toFixed(0)} stones a second, over 10,000   four times the table takes ${fourfoldTable.toFixed(2)} times as long (aim: at most linear, 4)`);
}
