import { createReadStream } from "node:fs";
import { createInterface } from "node:readline";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";

/** `npm run --silent rank -- FILE.jsonl`: one evidence object a line in, one ranking a line out; `-` reads standard input. */
const [file] = process.argv.slice(2);
if (!file) {
  console.error("Which file? npm run --silent rank -- FILE.jsonl   (- reads standard input)");
  process.exit(2);
}
const { table } = loadSpeciesTable();
let hasBadLine = false;

try {
  const input = file === "-" ? process.stdin : createReadStream(file, "utf8");
  for await (const line of createInterface({ input, crlfDelay: Infinity })) {
    if (line.trim() === "") continue;
    const answer = rankLine(line);
    hasBadLine ||= "error" in answer;
    if (!process.stdout.write(`${JSON.stringify(answer)}\n`)) await new Promise((resolve) => process.stdout.once("drain", resolve));
  }
} catch (error) {
  console.error(`${file} could not be read: ${error instanceof Error ? error.message : error}`);
  process.exit(2);
}
process.exitCode = hasBadLine ? 1 : 0;

function rankLine(line: string) {
  let value: unknown;
  try {
    value = JSON.parse(line);
  } catch {
    return { id: null, error: "not JSON" };
  }
  const parsed = parseEvidence(value);
  if (parsed.ok) return rankSpecies(parsed.evidence, table);
  const id = typeof value === "object" && value !== null && "id" in value ? value.id : null;
  return { id, error: parsed.errors.map(({ path, message }) => `${path || "evidence"} ${message}`).join("; ") };
}
