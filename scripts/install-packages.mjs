import { createHash } from "node:crypto";
import fs from "node:fs";
import { say } from "./say.mjs";

const stamp = "node_modules/.lock-hash";

/** `npm ci`, when there are no packages yet or the lock file is another one. @returns whether it was needed */
export async function installPackages(crew) {
  const lockHash = createHash("sha256").update(fs.readFileSync("package-lock.json")).digest("hex");
  if (fs.existsSync(stamp) && fs.readFileSync(stamp, "utf8") === lockHash) return false;
  say("Installing packages (half a minute or so) …");
  // NODE_ENV=production in the environment would leave out what builds and tests.
  const env = { ...process.env };
  delete env.NODE_ENV;
  await crew.run("npm", ["ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"], { env });
  fs.writeFileSync(stamp, lockHash);
  return true;
}
