import { readFileSync } from "node:fs";
import { fitRotation } from "#app/gemmology/rotation/fit-rotation.ts";
import { parseRotationRun } from "#app/gemmology/rotation/parse-rotation-run.ts";

/** `npm run --silent rotation -- FILE.json`: one rotation run in, the fit out; `-` reads standard input. */
const [file] = process.argv.slice(2);
if (!file) {
  console.error("Which file? npm run --silent rotation -- FILE.json   (- reads standard input)");
  process.exit(2);
}

let value: unknown;
try {
  value = JSON.parse(readFileSync(file === "-" ? 0 : file, "utf8"));
} catch (error) {
  console.error(error instanceof SyntaxError ? `${file} is not JSON: ${error.message}` : `${file} could not be read: ${error instanceof Error ? error.message : error}`);
  process.exit(2);
}
const parsed = parseRotationRun(value);
if (!parsed.ok) {
  console.log(JSON.stringify({ error: parsed.errors.map(({ path, message }) => `${path || "run"} ${message}`).join("; ") }));
  process.exit(1);
}
try {
  console.log(JSON.stringify(fitRotation(parsed.run)));
} catch (error) {
  if (!(error instanceof RangeError)) throw error;
  console.log(JSON.stringify({ error: error.message }));
  process.exit(1);
}
