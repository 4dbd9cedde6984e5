import { expect, test } from "vitest";
import { findSignedIn } from "#app/features/accounts/find-signed-in.server.ts";
import { requestPasswordReset } from "#app/features/accounts/request-password-reset.server.ts";
import { resetPassword } from "#app/features/accounts/reset-password.server.ts";
import { startSession } from "#app/features/accounts/start-session.server.ts";
import { verifyPassword } from "#app/features/accounts/verify-password.server.ts";
import { later } from "../../setup/factories.ts";
import { anApp, aPerson, aRequestId, lettersTo } from "../../setup/an-app.ts";

const password = "vaguely-marzipan-tractor";

test("a link from a letter sets the password once, ends every session, and kills the other links", async () => {
  const app = await anApp();
  const { userId, email } = await aPerson(app);
  const session = await startSession(app, { userId, userAgent: "" });
  await requestPasswordReset(app, { email: email.toUpperCase(), requestId: aRequestId() });
  await requestPasswordReset(app, { email, requestId: aRequestId() });
  const [newer, older] = await lettersTo(app, email);
  await expect(resetPassword(app, { token: older!.token, password: "passwordpassword" })).rejects.toMatchObject({ fieldErrors: { password: [expect.any(String)] } });
  const tries = await Promise.allSettled(Array.from({ length: 4 }, () => resetPassword(app, { token: older!.token, password })));
  expect(tries.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  expect(await findSignedIn(app, session)).toBeUndefined();
  expect(await verifyPassword(app, { email, password, mayBeDemonstration: false })).toBe(userId);
  for (const { token } of [newer!, older!]) await expect(resetPassword(app, { token, password })).rejects.toMatchObject({ code: "not_found" });
  expect((await lettersTo(app, email)).map(({ kind }) => kind)).toEqual(["passwordChanged", "resetPassword", "resetPassword"]);
});

test("a reset link runs out after an hour", async () => {
  const app = await anApp();
  const { email } = await aPerson(app);
  await requestPasswordReset(app, { email, requestId: aRequestId() });
  const { token } = (await lettersTo(app, email))[0]!;
  await expect(resetPassword(later(app, 60 * 60_000), { token, password })).rejects.toMatchObject({ code: "not_found" });
  await resetPassword(later(app, 59 * 60_000), { token, password });
});

test("asking for an unknown address looks the same, and is counted the same", async () => {
  const app = await anApp();
  const { email } = await aPerson(app);
  const unknown = `nobody.${aRequestId()}@example.test`;
  const answers = async (address: string) => {
    const seen = [];
    for (let at = 0; at < 4; at++) seen.push(await requestPasswordReset(app, { email: address, requestId: aRequestId() }).catch((error: { status: number; userMessage: string }) => [error.status, error.userMessage]));
    return seen;
  };
  expect(await answers(unknown)).toEqual(await answers(email));
  expect(await lettersTo(app, email)).toHaveLength(3);
  expect(await lettersTo(app, unknown)).toEqual([]);
});

test("one form sent twice sends one letter", async () => {
  const app = await anApp();
  const { email } = await aPerson(app);
  const requestId = aRequestId();
  await requestPasswordReset(app, { email, requestId });
  await requestPasswordReset(app, { email, requestId });
  expect(await lettersTo(app, email)).toHaveLength(1);
});
