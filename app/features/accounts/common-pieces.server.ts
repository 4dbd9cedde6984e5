import { readFileSync } from "node:fs";
import path from "node:path";

let words: ReadonlySet<string> | undefined;

/** The words and phrases of fixtures/common-passwords; read once, when first asked. */
export function commonWords(): ReadonlySet<string> {
  words ??= new Set(["words.txt", "phrases.txt"].flatMap((name) => readFileSync(path.resolve("fixtures/common-passwords", name), "utf8").split("\n").filter(Boolean)));
  return words;
}
