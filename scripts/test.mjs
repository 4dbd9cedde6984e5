// `npm test`: whatever is missing on this machine, then every check. `npm test -- PATH …` runs the tests there and nothing else.
import fs from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { buildIfChanged } from "./build.mjs";
import { createCrew } from "./crew.mjs";
import { debianPackages, findMariadb } from "./db.mjs";
import { installDebian } from "./install-debian.mjs";
import { installPackages } from "./install-packages.mjs";
import { say, seconds, Stop } from "./say.mjs";

process.chdir(fileURLToPath(new URL("..", import.meta.url)));
const crew = createCrew();
const reportsFolder = ".test";
const filters = process.argv.slice(2);
const results = [];

for (const [signal, code] of Object.entries({ SIGINT: 130, SIGTERM: 143, SIGHUP: 129 })) {
  process.on(signal, () => void crew.endAll().then(() => process.exit(code)));
}

try {
  await prepare();
  const ok = filters.length > 0 ? await runFiltered() : await runAll();
  report();
  process.exit(ok ? 0 : 1);
} catch (error) {
  console.error(`\n${error instanceof Stop ? error.message : error.stack}`);
  process.exit(1);
}

async function prepare() {
  const missing = [
    ...(findMariadb().isComplete ? [] : debianPackages),
    ...(isOnPath("chromium") ? [] : ["chromium"]),
    ...(isOnPath("pdftotext") ? [] : ["poppler-utils"]),
    ...(isOnPath("qpdf") ? [] : ["qpdf"]),
  ];
  if (missing.length > 0) await step("Debian packages", () => installDebian(crew, { what: "Something that the tests need", packages: missing }));
  await installPackages(crew);
  fs.rmSync(reportsFolder, { recursive: true, force: true });
  fs.mkdirSync(reportsFolder);
}

async function runAll() {
  const node = (...args) => crew.run(process.execPath, args, { env: plainEnv() });
  const areChecksOk = [
    await step("types", async () => {
      await node("node_modules/@react-router/dev/bin.js", "typegen");
      await node("node_modules/typescript/bin/tsc", "--noEmit");
    }),
    await step("lint", () => node("node_modules/eslint/bin/eslint.js", ".")),
    await step("tests", () => vitest("tests", [])),
  ].every(Boolean);
  const isBuilt = await step("build", () => buildIfChanged(crew));
  const areJourneysOk = isBuilt && (await step("journeys", () => vitest("journeys", ["--config", "vitest.journeys.config.ts"])));
  return areChecksOk && areJourneysOk;
}

async function runFiltered() {
  const isJourney = (filter) => path.normalize(filter).startsWith(path.join("tests", "journeys"));
  const [journeys, others] = [filters.filter(isJourney), filters.filter((filter) => !isJourney(filter))];
  let isOk = true;
  if (others.length > 0) isOk = await step("tests", () => vitest("tests", others));
  if (journeys.length > 0) isOk = (await step("journeys", () => vitest("journeys", ["--config", "vitest.journeys.config.ts", ...journeys]))) && isOk;
  return isOk;
}

function vitest(name, args) {
  const reporters = ["--reporter=default", "--reporter=json", `--outputFile.json=${reportsFolder}/${name}.json`];
  return crew.run(process.execPath, ["node_modules/vitest/vitest.mjs", "run", ...reporters, ...args], { env: plainEnv() });
}

/** Runs one step, whatever became of those before it. */
async function step(name, run) {
  const startedAt = performance.now();
  say(`\n== ${name}`);
  let isOk = true;
  try {
    await run();
  } catch (error) {
    if (name === "Debian packages") throw error;
    isOk = false;
    console.error(error.message);
  }
  results.push({ name, isOk, took: seconds(startedAt) });
  return isOk;
}

function report() {
  say("");
  for (const { name, isOk, took } of results) say(`${isOk ? "ok    " : "FAILED"}  ${took.padStart(8)}  ${name}`);
  const counts = { passed: 0, failed: 0, skipped: 0 };
  for (const name of ["tests", "journeys"]) {
    const file = path.join(reportsFolder, `${name}.json`);
    if (!fs.existsSync(file)) continue;
    const { numPassedTests, numFailedTests, numPendingTests, testResults } = JSON.parse(fs.readFileSync(file, "utf8"));
    // A file that could not be loaded has failed, though no test of it has.
    const brokenFiles = testResults.filter(({ status, assertionResults }) => status === "failed" && assertionResults.length === 0).length;
    counts.passed += numPassedTests;
    counts.failed += numFailedTests + brokenFiles;
    counts.skipped += numPendingTests;
  }
  say(`\n${counts.passed} passed, ${counts.failed} failed${counts.skipped > 0 ? `, ${counts.skipped} skipped` : ""}`);
}

function plainEnv() {
  const env = { ...process.env, NO_COLOR: "1" };
  delete env.FORCE_COLOR;
  delete env.NODE_ENV; // each tool has its own idea, and a leftover "production" is never it
  return env;
}

function isOnPath(name) {
  return [...(process.env.PATH ?? "").split(":"), "/usr/bin"].some((folder) => fs.existsSync(path.join(folder, name)));
}
