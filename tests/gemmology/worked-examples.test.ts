import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { expect, test } from "vitest";
import { workedOn } from "./worked-on.ts";
import worked from "#fixtures/worked/worked.json" with { type: "json" };

const topics = [...new Set(worked.map(({ topic }) => topic))];

/** Topics that the tests under this folder ask for, by name. */
function usedTopics(): Set<string> {
  const files = readdirSync(import.meta.dirname, { recursive: true, encoding: "utf8" }).filter((file) => file.endsWith(".test.ts") && !file.startsWith("worked-examples"));
  const lines = files.flatMap((file) => readFileSync(path.join(import.meta.dirname, file), "utf8").split("\n")).filter((line) => line.includes("workedOn("));
  return new Set(topics.filter((topic) => lines.some((line) => line.includes(`"${topic}"`))));
}

test("85 worked examples are there, and every topic of theirs is tested", () => {
  expect(worked).toHaveLength(85);
  const used = usedTopics();
  expect(topics.filter((topic) => !used.has(topic))).toEqual([]);
  expect(worked.filter(({ topic }) => used.has(topic))).toHaveLength(85);
});

// Where a topic's examples ask for different things, its tests part them; none may fall between.
test("each example on Snell's law asks for exactly one thing that a test finds", () => {
  for (const { id, inputs, expected } of workedOn("Snell")) {
    const asks = [expected.n2 !== undefined, inputs.angle_refracted_deg !== undefined, inputs.n2 !== undefined && inputs.angle1_deg !== undefined];
    expect(asks.filter(Boolean), id).toHaveLength(1);
  }
});
