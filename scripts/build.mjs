// Builds the application, and the entries that run in worker threads, when their sources are not what was built last.
import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { createCrew } from "./crew.mjs";
import { say } from "./say.mjs";

const root = fileURLToPath(new URL("..", import.meta.url));
const sources = ["app", "public", "fixtures", "package.json", "package-lock.json", "tsconfig.json", "react-router.config.ts", "vite.config.ts", "vite.workers.config.ts"];
const stamp = path.join(root, "build", ".sources-hash");

/** @returns whether it was needed */
export async function buildIfChanged(crew) {
  const hash = sourcesHash();
  if (fs.existsSync(stamp) && fs.readFileSync(stamp, "utf8") === hash) return false;
  say("Building …");
  fs.rmSync(stamp, { force: true }); // an interrupted build is not taken for a finished one
  const options = { cwd: root, isQuiet: true, env: { ...process.env, NODE_ENV: "production" } };
  await crew.run(process.execPath, ["node_modules/@react-router/dev/bin.js", "build", "--logLevel", "warn"], options);
  // After it: the build above empties the folder.
  if (fs.existsSync(path.join(root, "vite.workers.config.ts"))) {
    await crew.run(process.execPath, ["node_modules/vite/bin/vite.js", "build", "--config", "vite.workers.config.ts", "--logLevel", "warn"], options);
  }
  fs.writeFileSync(stamp, hash);
  return true;
}

/** By content: a fresh clone or another branch changes times, not sources. */
function sourcesHash() {
  const hash = createHash("sha256");
  const add = (relative) => {
    const file = path.join(root, relative);
    if (!fs.existsSync(file)) return;
    if (fs.statSync(file).isDirectory()) {
      for (const name of fs.readdirSync(file).sort()) add(path.join(relative, name));
    } else hash.update(`${relative}\0`).update(fs.readFileSync(file)).update("\0");
  };
  sources.forEach(add);
  return hash.digest("hex");
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const crew = createCrew();
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.once(signal, () => void crew.endAll().then(() => process.exit(1)));
  try {
    if (!(await buildIfChanged(crew))) say("Nothing has changed since the last build.");
  } catch (error) {
    console.error(error.message);
    process.exit(1);
  }
}
