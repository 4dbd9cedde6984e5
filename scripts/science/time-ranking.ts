import type { Evidence } from "#app/gemmology/ranking/evidence.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";

/** Milliseconds a stone, over every stone and round; `slowestStone`: the median of the stone that takes longest. */
export type RankingTimes = Readonly<{ median: number; most: number; worst: number; slowestStone: number; stonesASecond: number; fourfoldTable: number }>;

/** Times the ranking in whatever runs it; loaded into Node.js and into Chromium as one and the same bundle. */
export function timeRanking(table: SpeciesTable, stones: readonly Evidence[]): RankingTimes {
  const all: number[] = [];
  const medians: number[] = [];
  for (let round = 0; round < 15; round++) for (const stone of stones) rankSpecies(stone, table);
  for (const stone of stones) {
    const ofStone = times(stone, table, 25);
    all.push(...ofStone);
    medians.push(middle(ofStone));
  }
  const startedAt = performance.now();
  for (let at = 0; at < 10_000; at++) rankSpecies(stones[at % stones.length]!, table);
  const stonesASecond = 10_000 / ((performance.now() - startedAt) / 1000);
  all.sort((a, b) => a - b);
  return { median: middle(all), most: all[Math.floor(all.length * 0.99)]!, worst: all.at(-1)!, slowestStone: Math.max(...medians), stonesASecond, fourfoldTable: growth(table, stones) };
}

/**
 * How many times as long a table takes that is four times as long, of the same species under other ids: of each stone the
 * best of several, by turns, so that what else the machine does falls on both.
 */
function growth(table: SpeciesTable, stones: readonly Evidence[]): number {
  const longer = { ...table, nodes: [0, 1, 2, 3].flatMap((copy) => table.nodes.map((node) => ({ ...node, id: `${node.id}-${copy}` }))) };
  for (const stone of stones) rankSpecies(stone, longer);
  let [short, long] = [0, 0];
  for (const stone of stones) {
    const turns = Array.from({ length: 8 }, () => [times(stone, table, 1)[0]!, times(stone, longer, 1)[0]!] as const);
    short += Math.min(...turns.map(([each]) => each));
    long += Math.min(...turns.map(([, each]) => each));
  }
  return long / short;
}

function times(stone: Evidence, table: SpeciesTable, rounds: number): number[] {
  return Array.from({ length: rounds }, () => {
    const startedAt = performance.now();
    rankSpecies(stone, table);
    return performance.now() - startedAt;
  });
}

const middle = (values: readonly number[]) => [...values].sort((a, b) => a - b)[values.length >> 1]!;
