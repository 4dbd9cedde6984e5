import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { expect, test } from "vitest";
import { AppError } from "#app/domain/app-error.ts";
import { isAllowed, operations } from "#app/domain/permissions.ts";
import { roles, type Role } from "#app/domain/roles.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { aLab, aMember } from "../setup/factories.ts";
import { operationEntries, type OperationEntry } from "./operations.ts";

/** Written out by hand from product.md, apart from the code: o owner, g gemmologist, a appraiser, d desk. */
const expected: Record<string, string> = {
  "laboratory.read": "ogad",
  "laboratory.manage": "o",
  "team.manage": "o",
  "prices.manage": "o",
  "prices.read": "od",
  "instruments.read": "ogad",
  "instruments.manage": "og",
  "clients.read": "ogad",
  "clients.manage": "od",
  "clients.grantTerms": "o",
  "takeIn.create": "od",
  "takeIn.read": "ogad",
  "custody.record": "ogd",
  "custody.release": "od",
  "declaredValue.read": "od",
  "stones.read": "ogad",
  "stones.decline": "od",
  "photos.add": "ogd",
  "readings.read": "oga",
  "readings.record": "g",
  "conclusions.read": "oga",
  "conclusions.propose": "g",
  "secondChecks.do": "g",
  "valuations.read": "oa",
  "valuations.write": "a",
  "invoices.read": "od",
  "invoices.manage": "od",
  "reports.read": "ogad",
  "reports.authoriseIdentification": "g",
  "reports.authoriseValuation": "a",
  "reports.issue": "ogad",
  "reports.withdraw": "o",
  "audit.read": "o",
};
const letter: Record<Role, string> = { owner: "o", gemmologist: "g", appraiser: "a", desk: "d" };

test("every operation is allowed to the roles that the product's page names, and to no other", () => {
  const decided = Object.fromEntries(operations.map((operation) => [operation, roles.filter((role) => isAllowed([role], operation)).map((role) => letter[role]).join("")]));
  expect(decided).toEqual(expected);
});

test("nobody may do anything without a role, and roles add up", () => {
  for (const operation of operations) {
    expect(isAllowed([], operation)).toBe(false);
    for (const first of roles) for (const second of roles) expect(isAllowed([first, second], operation)).toBe(isAllowed([first], operation) || isAllowed([second], operation));
  }
});

const outcome = async (work: () => Promise<unknown>): Promise<string> => {
  try {
    await work();
    return "done";
  } catch (error) {
    if (error instanceof AppError) return error.code;
    throw error;
  }
};

/** Rows of a laboratory with a full hand, and somebody in it with these roles alone. */
async function setting<Ids>({ rows }: OperationEntry<Ids>, held: Role[]): Promise<{ ids: Ids; ctx: LabContext }> {
  const lab = await aLab();
  return { ids: await rows(lab), ctx: await aMember(lab, held) };
}

test.each(operationEntries.flatMap((entry) => roles.map((role) => ({ name: entry.name, role, entry }))))("$name as $role", async ({ entry, role }) => {
  const { ids, ctx } = await setting(entry, [role]);
  const isExpected = expected[entry.operation]!.includes(letter[role]);
  const result = await outcome(() => entry.call(ctx, ids));
  if (isExpected && entry.mayBeRefused) expect(["done", "conflict", "invalid_input", ...(entry.mayBeRefused === "absent" ? ["not_found"] : entry.mayBeRefused === "notTheirs" ? ["forbidden"] : [])]).toContain(result);
  else if (isExpected) expect(result).toBe("done");
  else expect(result).toBe("forbidden");
});

test.each(operationEntries)("$name by a member without a role", async (entry) => {
  const { ids, ctx } = await setting(entry, []);
  expect(await outcome(() => entry.call(ctx, ids))).toBe("forbidden");
});

test.each(operationEntries.filter(({ hasNoIds }) => !hasNoIds))("$name on another laboratory's rows finds nothing", async (entry) => {
  const [ours, theirs] = [await aLab(), await aLab()];
  const ids = await entry.rows(ours);
  if (entry.isEmptyElsewhere) expect(await entry.call(theirs, ids)).toEqual(entry.isEmptyElsewhere === "list" ? [] : null);
  else expect(await outcome(() => entry.call(theirs, ids))).toBe("not_found");
});

test("every feature that asks for a role has an entry in operations.ts", () => {
  const files = (folder: string): string[] =>
    readdirSync(folder, { withFileTypes: true }).flatMap((entry) => (entry.isDirectory() ? files(path.join(folder, entry.name)) : [path.join(folder, entry.name)]));
  const asking = files("app/features").filter((file) => /\brequireRole\(\s*[\w.]+,/.test(readFileSync(file, "utf8")) && !file.endsWith("require-role.ts"));
  const named = new Set(operationEntries.map(({ name }) => name));
  const missing = asking.map((file) => path.basename(file).replace(/(\.server)?\.tsx?$/, "").replace(/-(\w)/g, (_, first: string) => first.toUpperCase())).filter((name) => !named.has(name));
  expect(missing).toEqual([]);
});
