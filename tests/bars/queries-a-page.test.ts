import { expect, inject, test } from "vitest";
import { markOf, statementsSince } from "./query-log.ts";
import { cookieOf } from "./sign-in.ts";
import { rows } from "./world.ts";

const { url, queryLog } = inject("journey");

/** The fewest of some tries: what works in the background only ever adds to them. */
async function queryCount(path: string, cookie = ""): Promise<number> {
  let fewest = Number.POSITIVE_INFINITY;
  for (let tries = 0; tries < 4; tries++) {
    const mark = markOf(queryLog);
    const answer = await fetch(url + path, { headers: { cookie } });
    await answer.arrayBuffer();
    expect(answer.status, path).toBe(200);
    if (tries > 0) fewest = Math.min(fewest, statementsSince(queryLog, mark).length);
    await new Promise((resolve) => setTimeout(resolve, 40));
  }
  return fewest;
}

// quality.md P5: lists and details at most 3, dashboards and forms with several sources at most 5; who asks is one of them.
test.each([
  ["/stones", 3],
  ["/stones?state=house", 3],
  ["/stones?q=oval", 3],
  ["/clients", 3],
  ["/instruments", 3],
  ["/instruments/recall", 3],
  ["/instruments/references", 3],
  ["/parcels", 3],
  ["/invoices", 3],
  ["/reports", 3],
  ["/stones/MQ-26-0015-1", 3],
  ["/stones/MQ-26-0008-1/valuation", 5],
  ["/stones/MQ-26-0015-1/conclusion", 4],
  ["/stones/MQ-26-0013-1/spectra", 3],
  ["/stones/MQ-26-0013-1/inclusions", 5],
  ["/take-ins/MQ-T-26-0008", 3],
  ["/invoices/MQ-I-26-00008", 3],
  ["/reports/MQ-R-26-00005", 3],
  ["/take-ins/new", 5],
  ["/settings", 3],
  ["/settings/team", 3],
  ["/settings/prices", 3],
])("%s asks the database at most %i times", async (path, most) => {
  expect(await queryCount(`/lab/marram-quay${path}`, await owner())).toBeLessThanOrEqual(most);
});

let cookie: string | undefined;
const owner = async () => (cookie ??= await cookieOf(url, "rosalind@marramquay.example"));

test("a list asks as often for a few rows as for many", async () => {
  const corwen = await cookieOf(url, "corwen@tarnandvale.example");
  for (const list of ["stones", "invoices", "reports", "clients"]) expect(await queryCount(`/lab/tarn-and-vale/${list}`, corwen), list).toBe(await queryCount(`/lab/marram-quay/${list}`, await owner()));
});

test("the register answers with one statement", async () => {
  const [report] = await rows<{ code: string }>("select code from reports where number = 'MQ-R-26-00001'");
  expect(await queryCount(`/v/${report!.code}`)).toBe(1);
});
