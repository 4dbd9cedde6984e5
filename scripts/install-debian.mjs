import { spawnSync } from "node:child_process";
import { say, Stop } from "./say.mjs";

/** Installs Debian packages as root; @throws Stop with the command to run for anybody else */
export async function installDebian(crew, { what, packages }) {
  const command = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(" ")}`;
  if (spawnSync("apt-get", ["--version"]).status !== 0) throw new Stop(`${what} is missing and this machine has no apt-get. Install what Debian calls ${packages.join(", ")}, then start again.`);
  if (process.getuid() !== 0) throw new Stop(`${what} is missing. Run once as root, then start again:\n\n  ${command}\n`);
  say(`Installing ${packages.join(", ")} …`);
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  await crew.run("apt-get", ["update", "-qq"], { env, isQuiet: true }); // a fresh machine has no lists
  await crew.run("apt-get", ["install", "-y", "-qq", "--no-install-recommends", ...packages], { env, isQuiet: true });
}
