// The processes that this one started: run to their end, or kept running until told to stop.
import { spawn } from "node:child_process";
import path from "node:path";
import { Stop } from "./say.mjs";

const hasEnded = (child) => child.exitCode !== null || child.signalCode !== null;

export function createCrew() {
  const running = new Set();
  let isStopping = false;

  /** In a process group of its own, so that a terminal's Ctrl-C reaches this process alone, and all of it can be ended. */
  function start(command, args, options) {
    if (isStopping) throw new Error("stopping");
    const child = spawn(command, args, { detached: true, ...options });
    running.add(child);
    child.once("exit", () => running.delete(child));
    child.once("error", () => running.delete(child));
    return child;
  }

  return {
    start,
    isBusy: () => running.size > 0,

    /** @param isQuiet its output is shown only when it fails. @throws when it ends otherwise than with 0 */
    run(command, args, { isQuiet = false, ...options } = {}) {
      return new Promise((resolve, reject) => {
        const output = isQuiet ? "pipe" : "inherit";
        const child = start(command, args, { stdio: ["ignore", output, output], ...options });
        const said = [];
        for (const stream of [child.stdout, child.stderr]) stream?.on("data", (chunk) => said.push(chunk));
        child.once("error", reject);
        child.once("close", (code, signal) => {
          if (code === 0) return resolve();
          process.stderr.write(Buffer.concat(said));
          reject(new Stop(`${path.basename(command)} ${args.join(" ")} ended with ${code ?? signal}; what it said stands above.`));
        });
      });
    },

    /** Ends one, politely and then not. */
    async end(child, { withinMs = 12_000 } = {}) {
      if (hasEnded(child) || !child.pid) return;
      const ended = new Promise((resolve) => child.once("exit", resolve));
      signalGroup(child.pid, "SIGTERM");
      const timer = setTimeout(() => signalGroup(child.pid, "SIGKILL"), withinMs);
      await ended;
      clearTimeout(timer);
    },

    /** Newest first: the server before the stand-ins that it talks to. */
    async endAll(options) {
      isStopping = true;
      for (const child of [...running].reverse()) await this.end(child, options);
    },
  };
}

function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch (error) {
    if (error.code !== "ESRCH") throw error;
  }
}
