import { readFileSync } from "node:fs";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { evidenceOf, trueSpeciesIds, type PublishedStone } from "./accuracy/published-stone.ts";
import { summarise, type Judged } from "./accuracy/summarise.ts";

/**
 * `npm run accuracy [-- FILE.jsonl]`: ranks published readings of real stones and says how often the truth stood where.
 * The stones took no part in the making of the species table.
 */
const file = process.argv[2] ?? "tests/accuracy/stones.jsonl";
const { table } = loadSpeciesTable();
const stones = readFileSync(file, "utf8").split("\n").filter((line) => line.trim() !== "").map((line) => JSON.parse(line) as PublishedStone);

const judged: Judged[] = stones.map((stone) => {
  const parsed = parseEvidence(evidenceOf(stone));
  if (!parsed.ok) throw new Error(`${stone.id}: ${parsed.errors.map(({ path, message }) => `${path} ${message}`).join("; ")}`);
  const ranking = rankSpecies(parsed.evidence, table);
  const truth = trueSpeciesIds(stone, table);
  const place = ranking.candidates.findIndex(({ speciesId }) => truth.includes(speciesId));
  return {
    stone,
    truth,
    place: place < 0 ? null : place + 1,
    probability: ranking.candidates.filter(({ speciesId }) => truth.includes(speciesId)).reduce((sum, { probability }) => sum + probability, 0),
    first: ranking.candidates[0] ? { speciesId: ranking.candidates[0].speciesId, probability: ranking.candidates[0].probability } : null,
    because: ranking.contradicted.find(({ speciesId }) => truth.includes(speciesId))?.because ?? "",
    stated: ranking.candidates.map(({ speciesId, probability }) => ({ probability, isTrue: truth.includes(speciesId) })),
  };
});
console.log(summarise(judged));
