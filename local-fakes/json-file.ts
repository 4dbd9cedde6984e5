import fs from "node:fs";
import path from "node:path";

/** @returns what the file holds, or `initial` where there is no file or no name for one */
export function loadJson<T>(file: string | undefined, initial: T): T {
  if (!file || !fs.existsSync(file)) return initial;
  return JSON.parse(fs.readFileSync(file, "utf8")) as T;
}

/** Written beside and renamed, so that a stop in the middle leaves the old file whole. */
export function saveJson(file: string | undefined, value: unknown): void {
  if (!file) return;
  fs.mkdirSync(path.dirname(file), { recursive: true });
  fs.writeFileSync(`${file}.new`, JSON.stringify(value, null, 1));
  fs.renameSync(`${file}.new`, file);
}
