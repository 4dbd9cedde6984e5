import { createReadStream } from "node:fs";
import { createInterface } from "node:readline";
import { parseArgs } from "node:util";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { parseEvidence } from "#app/gemmology/ranking/parse-evidence.ts";
import { priors, rankSpecies, type Prior } from "#app/gemmology/ranking/rank-species.ts";

/**
 * `npm run --silent rank -- FILE.jsonl [--prior even]`: one evidence object a line in, one ranking a line out; `-` reads
 * standard input. Species count by how common they are, or with `--prior even` all alike.
 */
const usage = `npm run --silent rank -- FILE.jsonl [--prior ${priors.join("|")}]   (- reads standard input)`;
const { file, prior } = readArguments();
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
  if (parsed.ok) return rankSpecies(parsed.evidence, table, { prior });
  const id = typeof value === "object" && value !== null && "id" in value ? value.id : null;
  return { id, error: parsed.errors.map(({ path, message }) => `${path || "evidence"} ${message}`).join("; ") };
}

function readArguments(): { file: string; prior: Prior } {
  try {
    const { values, positionals } = parseArgs({ allowPositionals: true, options: { prior: { type: "string", default: "prevalence" } } });
    const prior = priors.find((each) => each === values.prior);
    if (positionals.length === 1 && prior) return { file: positionals[0]!, prior };
    console.error(prior ? `Which file? ${usage}` : `There is no prior “${values.prior}”. ${usage}`);
  } catch (error) {
    console.error(`${error instanceof Error ? error.message : error}. ${usage}`);
  }
  process.exit(2);
}
