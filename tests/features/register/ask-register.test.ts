import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { reports } from "#app/db/schema/index.ts";
import { newRegisterCode } from "#app/features/reports/new-register-code.server.ts";
import { parseRegisterCode, type RegisterCode } from "#app/domain/register-code.ts";
import { askRegister } from "#app/features/register/ask-register.server.ts";
import { issueReportByNumber } from "#app/features/reports/issue-report-by-number.server.ts";
import { anApp } from "../../setup/an-app.ts";
import { aCheckedStone, aReportToIssue } from "../../setup/checked-stone-factory.ts";
import { aLab } from "../../setup/factories.ts";

async function anIssuedCode(): Promise<RegisterCode> {
  const ctx = await aLab();
  const number = await aReportToIssue(ctx, await aCheckedStone(ctx));
  await issueReportByNumber(ctx, { number });
  const [row] = await ctx.db.select({ code: reports.code }).from(reports).where(eq(reports.laboratoryId, ctx.laboratoryId));
  return row!.code as RegisterCode;
}

test("a code that was typed by hand finds its report; one wrong character does not find another", async () => {
  const code = await anIssuedCode();
  const typed = code.toLowerCase().replaceAll("0", "O").replaceAll("1", "l").replace(/(.{4})/g, "$1- ");
  expect(await askRegister(await anApp(), parseRegisterCode(typed)!)).toMatchObject({ code, state: "issued" });
  for (let at = 0; at < code.length; at++) {
    const other = code[at] === "7" ? "8" : "7";
    expect(parseRegisterCode(code.slice(0, at) + other + code.slice(at + 1))).toBeUndefined();
  }
});

test("the register does not know what was never issued", async () => {
  expect(await askRegister(await anApp(), newRegisterCode())).toBeUndefined();
});

test("the 61st question within a minute from one address is refused, exactly, and others are not", async () => {
  const [app, code] = [await anApp(), await anIssuedCode()];
  const answers = await Promise.allSettled(Array.from({ length: 80 }, () => askRegister(app, code)));
  expect(answers.filter(({ status }) => status === "fulfilled")).toHaveLength(60);
  for (const answer of answers) if (answer.status === "rejected") expect(answer.reason).toMatchObject({ code: "rate_limited", retryAfterS: 60 });
  expect(await askRegister(await anApp(), code)).toMatchObject({ state: "issued" });
  expect(await askRegister({ ...app, now: new Date(app.now.getTime() + 61_000) }, code)).toMatchObject({ state: "issued" });
});
