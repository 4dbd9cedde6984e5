import { beforeAll, expect, inject, test } from "vitest";
import { allStatements } from "./query-log.ts";
import { addressOf, routeLines } from "./route-lines.ts";
import { cookieOf } from "./sign-in.ts";
import { asTest, rows } from "./world.ts";

const { url, queryLog, databaseUrl } = inject("journey");
let statements: string[];

// The log has every statement of the demonstration, which was loaded by the product's own operations, and of each page.
beforeAll(async () => {
  const cookie = await cookieOf(url, "rosalind@marramquay.example");
  for (const line of await routeLines()) if (line.get) await (await fetch(url + addressOf(line), { headers: { cookie }, redirect: "manual" })).arrayBuffer();
  statements = allStatements(queryLog).filter((statement) => !statement.startsWith(asTest));
});

const shape = (statement: string) => statement.replace(/X'[0-9a-f]*'|'(?:[^'\\]|\\.|'')*'|\b\d+\b/gi, "?");

test("no page counts rows or skips them (P10)", () => {
  expect(statements.length).toBeGreaterThan(1_000);
  const bad = statements.map(shape).filter((one) => /\bcount\s*\(\s*\*?\s*\)|\boffset\b|\blimit\s+\?\s*,/i.test(one) && !/information_schema|__drizzle/i.test(one));
  expect([...new Set(bad)]).toEqual([]);
});

/** Statements that ask across laboratories, each by something that no two laboratories share. */
const across: ReadonlyArray<{ by: RegExp; why: string }> = [
  { by: /from `?outgoing_mail`?|update `?outgoing_mail`?/, why: "one queue of letters, delivered for all" },
  { by: /^select `client_id` from `client_users` where `client_users`.`user_id` = \?/, why: "whether somebody is a client anywhere" },
  { by: /`email_tokens`.`token_hash` = \?|^delete from `email_tokens` where `email_tokens`.`expires_at` < \?/, why: "links in letters, by what only their reader has; those run out are cleared for all" },
  { by: /`provider_events`.`event_id` = \?/, why: "the payment service's events, by its own ids, before it is known whose they are" },
  { by: /`register_entries`.`code` = \?/, why: "the public register, by its code" },
];

test("every statement on a laboratory's table names the laboratory (T11)", async () => {
  const database = new URL(databaseUrl).pathname.slice(1);
  const tenant = (await rows<{ name: string }>("select table_name name from information_schema.columns where table_schema = ? and column_name = 'laboratory_id'", [database])).map(({ name }) => name);
  expect(tenant.length).toBeGreaterThan(15);
  const bad = new Set<string>();
  for (const one of new Set(statements.map(shape))) {
    if (/^(create|alter|show|insert into `?__drizzle)/i.test(one)) continue;
    const named = [...one.matchAll(/\b(?:from|join|into|update)\s+`?(\w+)`?/gi)].map(([, table]) => table!);
    if (named.some((table) => tenant.includes(table)) && !/laboratory_id/.test(one) && !across.some(({ by }) => by.test(one))) bad.add(one.slice(0, 400));
  }
  expect([...bad]).toEqual([]);
});
