import { execFile } from "node:child_process";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { promisify } from "node:util";
import { expect, inject, test } from "vitest";

const { url } = inject("journey");
const post = (name: string, body: unknown) => fetch(`${url}/api/v1/${name}`, { method: "POST", headers: { "Content-Type": "application/json" }, body: typeof body === "string" ? body : JSON.stringify(body) });
const corundum = { id: "one", ri: [{ kind: "edges", low: 1.762, high: 1.77, rotated: true }], sg: { value: 3.997, u: 0.021 } };
const tourmaline = { facets: [{ label: "table", readings: [0, 30, 60, 90, 120, 150].map((angleDeg, at) => ({ angleDeg, upper: 1.64, lower: [1.635, 1.6312, 1.6237, 1.62, 1.6237, 1.6312][at], u: 0.0005 })) }] };

async function onCommandLine(script: string, content: string): Promise<string> {
  const folder = await mkdtemp(path.join(tmpdir(), "isogyre-cli-"));
  try {
    await writeFile(path.join(folder, "in"), content);
    return (await promisify(execFile)("npm", ["run", "--silent", script, "--", path.join(folder, "in")])).stdout;
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

test("the same evidence gets the same ranking over HTTP and on the command line", async () => {
  const answer = await post("rank", corundum);
  expect(answer.status).toBe(200);
  const ranking = (await answer.json()) as { candidates: { speciesId: string; probability: number }[]; unlisted: number };
  expect(ranking.candidates[0]!.speciesId).toBe("corundum");
  expect(ranking.candidates.reduce((sum, { probability }) => sum + probability, ranking.unlisted)).toBeCloseTo(1, 9);
  expect(JSON.parse(await onCommandLine("rank", JSON.stringify(corundum)))).toEqual(ranking);
});

test("the same rotation run gets the same fit over HTTP and on the command line", async () => {
  const answer = await post("rotation-fit", tourmaline);
  expect(answer.status).toBe(200);
  const fit = (await answer.json()) as { solutions: { character: string }[]; decided: boolean };
  expect(fit.solutions.map(({ character }) => character)).toEqual(["uniaxial", "biaxial"]);
  expect(JSON.parse(await onCommandLine("rotation", JSON.stringify(tourmaline)))).toEqual(fit);
});

test.each([
  ["rank", { hue: "red" }, "hue"],
  ["rank", "{", ""],
  ["rotation-fit", { facets: [{ readings: [{ angleDeg: 0, upper: 1.6, sheen: 1 }] }] }, "facets[0].readings[0].sheen"],
  ["rotation-fit", { facets: [{ readings: [{ angleDeg: 0, upper: 1.6 }] }] }, "at least three"],
  ["density", { massAirCt: -1 }, ""],
])("%s answers a bad body with problem details: %j", async (name, body, named) => {
  const answer = await post(name, body);
  expect([400, 422]).toContain(answer.status);
  expect(answer.headers.get("content-type")).toContain("application/problem+json");
  expect(JSON.stringify(await answer.json())).toContain(named);
});

test("asked otherwise than by POST, each says so", async () => {
  for (const name of ["rank", "rotation-fit", "density"]) expect((await fetch(`${url}/api/v1/${name}`)).status).toBe(405);
});
