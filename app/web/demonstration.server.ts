import { readFileSync } from "node:fs";
import path from "node:path";
import { runtimeEnv } from "./runtime.server.ts";

let password: string | null | undefined;

/** The password that all demonstration people share and the terminal prints; null where the demonstration is off. */
export function demonstrationPassword(): string | null {
  if (runtimeEnv().ISOGYRE_DEMO !== "1") return null;
  if (password === undefined) {
    try {
      password = (JSON.parse(readFileSync(path.resolve("scripts/demo-people.json"), "utf8")) as { password: string }).password;
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== "ENOENT") throw error;
      password = null;
    }
  }
  return password;
}
