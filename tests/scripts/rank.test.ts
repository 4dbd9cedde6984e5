import { spawnSync } from "node:child_process";
import { expect, test } from "vitest";

/** The command as a person runs it. */
function rank(lines: readonly string[], ...args: readonly string[]) {
  const { status, stdout, stderr } = spawnSync(process.execPath, ["--import", "tsx", "scripts/rank.ts", "-", ...args], { input: lines.join("\n"), encoding: "utf8" });
  return { status, stderr, answers: stdout.split("\n").filter(Boolean).map((line) => JSON.parse(line) as { id: string; error?: string; candidates?: Array<{ speciesId: string; probability: number }> }) };
}
const amber = JSON.stringify({ id: "a", ri: [{ kind: "single", n: 1.54 }] });

test("a bad line gives a line with its error and an exit status of 1; the others are ranked", () => {
  const { status, answers } = rank([amber, "{", JSON.stringify({ id: "b", weight: 3 }), "", JSON.stringify({ id: "c" })]);
  expect(status).toBe(1);
  expect(answers.map(({ id, error }) => [id, error])).toEqual([["a", undefined], [null, "not JSON"], ["b", "weight is not a field of evidence, version 1"], ["c", undefined]]);
  expect(answers[0]!.candidates!.length).toBeGreaterThan(10);
});

test("with an even prior no species counts for being common", () => {
  const of = (...args: string[]) => new Set(rank([JSON.stringify({ id: "a" })], ...args).answers[0]!.candidates!.map(({ probability }) => probability.toFixed(12)));
  expect(of("--prior", "even").size).toBe(1);
  expect(of().size).toBeGreaterThan(5);
  const { status, stderr } = rank([amber], "--prior", "odd");
  expect([status, stderr]).toEqual([2, expect.stringMatching(/no prior “odd”/)]);
});
