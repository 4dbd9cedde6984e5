import { gzipSync } from "node:zlib";
import { beforeAll, expect, inject, test } from "vitest";
import { rows } from "./world.ts";

const { url } = inject("journey");
let codes: Record<"issued" | "superseded" | "withdrawn", string>;
beforeAll(async () => {
  const found = await rows<{ state: keyof typeof codes; code: string }>("select state, code from reports where state <> 'authorised'");
  codes = Object.fromEntries(found.map(({ state, code }) => [state, code])) as typeof codes;
});

// quality.md P3
test.each(["issued", "superseded", "withdrawn"] as const)("the page of a report that is %s ships no script and is small", async (state) => {
  const answer = await fetch(`${url}/v/${codes[state]}`);
  const html = await answer.text();
  expect(html).not.toMatch(/<script|modulepreload|\son\w+=/i);
  expect(gzipSync(html).byteLength).toBeLessThanOrEqual(6 * 1024);
  expect(answer.headers.get("content-security-policy")).toContain("script-src 'none'");
  const etag = answer.headers.get("etag");
  expect(etag).toBeTruthy();
  const again = await fetch(`${url}/v/${codes[state]}`, { headers: { "if-none-match": etag! } });
  expect(again.status).toBe(304);
  expect((await again.arrayBuffer()).byteLength).toBe(0);
});

test("the code is read in any case, with or without dashes, and O, I and L are forgiven", async () => {
  const code = codes.issued;
  const mistyped = code.toLowerCase().replaceAll("0", "o").replaceAll("1", "l").match(/.{4}/g)!.join("-");
  expect(await (await fetch(`${url}/v/${mistyped}`)).text()).toContain("genuine and current");
});
