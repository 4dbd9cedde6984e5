import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { users } from "#app/db/schema/index.ts";
import { verifyPassword } from "#app/features/accounts/verify-password.server.ts";
import { findSignedIn } from "#app/features/accounts/find-signed-in.server.ts";
import { startSession } from "#app/features/accounts/start-session.server.ts";
import { endSession } from "#app/features/accounts/end-session.server.ts";
import { sessionAbsoluteMs, sessionIdleMs } from "#app/features/accounts/session-lifetime.ts";
import { changePassword } from "#app/features/accounts/change-password.server.ts";
import { endAllSessions } from "#app/features/accounts/end-all-sessions.server.ts";
import { endOneSession } from "#app/features/accounts/end-one-session.server.ts";
import { listSessions } from "#app/features/accounts/list-sessions.server.ts";
import { purgeExpired } from "#app/features/accounts/purge-expired.server.ts";
import { later } from "../../setup/factories.ts";
import { anApp, aPerson, lettersTo } from "../../setup/an-app.ts";
import { testServices } from "../../setup/test-services.ts";

const refusal = (promise: Promise<unknown>) => promise.then(() => undefined, (error: { code: string; userMessage: string; status: number }) => ({ code: error.code, userMessage: error.userMessage, status: error.status }));
const noDemo = { mayBeDemonstration: false };

test("the right password says who it is, whatever the case of the address", async () => {
  const app = await anApp();
  const { userId, email, password } = await aPerson(app);
  expect(await verifyPassword(app, { email: ` ${email.toUpperCase()} `, password, ...noDemo })).toBe(userId);
});

test("an unknown address, a wrong password and an account without password get one and the same answer", async () => {
  const app = await anApp();
  const { email } = await aPerson(app);
  const without = await aPerson(app);
  await app.db.update(users).set({ passwordHash: null }).where(eq(users.id, without.userId));
  const answers = await Promise.all([
    refusal(verifyPassword(app, { email, password: "another password", ...noDemo })),
    refusal(verifyPassword(app, { email: "nobody.here@example.test", password: "another password", ...noDemo })),
    refusal(verifyPassword(app, { email: without.email, password: "another password", ...noDemo })),
  ]);
  expect(answers[0]).toMatchObject({ code: "invalid_input" });
  expect(answers[1]).toEqual(answers[0]);
  expect(answers[2]).toEqual(answers[0]);
});

test("an unknown address takes as long as a wrong password", async () => {
  const app = { ...(await anApp()), services: testServices() };
  const { email } = await aPerson(app);
  const timeOf = async (address: string) => {
    const startedAt = performance.now();
    await refusal(verifyPassword(app, { email: address, password: "another password", ...noDemo }));
    return performance.now() - startedAt;
  };
  await timeOf("warm.up@example.test");
  const known = [await timeOf(email), await timeOf(email)];
  const unknown = [await timeOf("nobody.a@example.test"), await timeOf("nobody.b@example.test")];
  // A hash takes hundreds of milliseconds, everything else a few: skipping it could not be missed.
  expect(Math.min(...unknown)).toBeGreaterThan(Math.min(...known) * 0.5);
});

test("no character of a long password is dropped", async () => {
  const app = { ...(await anApp()), services: testServices() };
  const password = `${"plinth otter cadmium ".repeat(10)}end`;
  const { userId, email } = await aPerson(app, { password });
  expect(await refusal(verifyPassword(app, { email, password: `${password.slice(0, -1)}t`, ...noDemo }))).toMatchObject({ code: "invalid_input" });
  expect(await verifyPassword(app, { email, password, ...noDemo })).toBe(userId);
});

test("the eleventh wrong try within a quarter of an hour is refused, even with the right password, and told nothing about", async () => {
  const app = await anApp();
  const { email, password, userId } = await aPerson(app);
  for (let at = 0; at < 10; at++) expect(await refusal(verifyPassword(app, { email, password: "a wrong password", ...noDemo }))).toMatchObject({ code: "invalid_input" });
  const closed = await refusal(verifyPassword(app, { email, password, ...noDemo }));
  expect(closed).toMatchObject({ status: 429 });
  for (let at = 0; at < 10; at++) await refusal(verifyPassword(app, { email: "unknown.person@example.test", password: "a wrong password", ...noDemo }));
  expect(await refusal(verifyPassword(app, { email: "unknown.person@example.test", password, ...noDemo }))).toEqual(closed);
  expect(await verifyPassword(later(app, 15 * 60_000), { email, password, ...noDemo })).toBe(userId);
});

test("signing in rightly a hundred times closes no door", async () => {
  const app = await anApp();
  const { email, password, userId } = await aPerson(app);
  for (let at = 0; at < 110; at++) expect(await verifyPassword(app, { email, password, ...noDemo })).toBe(userId);
});

test("a hundred wrong tries from one address close it for every account", async () => {
  const app = await anApp();
  const { email, password } = await aPerson(app);
  for (let at = 0; at < 100; at++) await refusal(verifyPassword(app, { email: `guess${at}.${app.clientAddress.slice(-8)}@example.test`, password, ...noDemo }));
  expect(await refusal(verifyPassword(app, { email, password, ...noDemo }))).toMatchObject({ status: 429 });
  expect(await refusal(verifyPassword({ ...app, clientAddress: "2001:db8::77" }, { email, password, ...noDemo }))).toBeUndefined();
});

test("the demonstration people sign in only where the demonstration is on", async () => {
  const app = await anApp();
  const { email, password, userId } = await aPerson(app, { isDemonstration: true });
  expect(await refusal(verifyPassword(app, { email, password, mayBeDemonstration: false }))).toMatchObject({ code: "invalid_input" });
  expect(await verifyPassword(app, { email, password, mayBeDemonstration: true })).toBe(userId);
});

test("a session ends by itself: unused after half a day, in any case after a week", async () => {
  const app = await anApp();
  const { userId } = await aPerson(app);
  const token = await startSession(app, { userId, userAgent: "test" });
  expect(await findSignedIn(later(app, sessionIdleMs - 1), token)).toMatchObject({ userId });
  expect(await findSignedIn(later(app, 2 * sessionIdleMs + 1), token)).toBeUndefined();
  const used = await startSession(app, { userId, userAgent: "test" });
  for (let at = 1; at * 6 * 3_600_000 < sessionAbsoluteMs; at++) expect(await findSignedIn(later(app, at * 6 * 3_600_000), used)).toMatchObject({ userId });
  expect(await findSignedIn(later(app, sessionAbsoluteMs), used)).toBeUndefined();
});

test("the database holds no token that opens a session", async () => {
  const app = await anApp();
  const { userId } = await aPerson(app);
  const token = await startSession(app, { userId, userAgent: "test" });
  const [session] = await listSessions(app, { userId, currentToken: token });
  expect(session!.id).not.toContain(token);
  expect(await findSignedIn(app, session!.id)).toBeUndefined();
});

test("a person sees where they are signed in, ends one place, and everywhere", async () => {
  const app = await anApp();
  const { userId } = await aPerson(app);
  const stranger = await aPerson(app);
  const bench = await startSession(app, { userId, userAgent: "Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0" });
  const tablet = await startSession(later(app, 1000), { userId, userAgent: "Mozilla/5.0 (iPad; CPU OS 18_0 like Mac OS X) AppleWebKit/605.1.15 Version/18.0 Safari/604.1" });
  const theirs = await startSession(app, { userId: stranger.userId, userAgent: "" });
  const places = await listSessions(app, { userId, currentToken: bench });
  expect(places.map(({ place, isCurrent }) => [place, isCurrent])).toEqual([["Safari on iPad", false], ["Firefox on Linux", true]]);
  await expect(endOneSession(app, { userId: stranger.userId, sessionId: places[0]!.id })).rejects.toMatchObject({ code: "not_found" });
  await expect(endOneSession(app, { userId, sessionId: "zz" })).rejects.toMatchObject({ code: "not_found" });
  await endOneSession(app, { userId, sessionId: places[0]!.id });
  expect(await findSignedIn(app, tablet)).toBeUndefined();
  expect(await findSignedIn(app, bench)).toBeDefined();
  await endAllSessions(app, { userId });
  expect(await findSignedIn(app, bench)).toBeUndefined();
  expect(await findSignedIn(app, theirs)).toBeDefined();
  await endSession(app, theirs);
  expect(await findSignedIn(app, theirs)).toBeUndefined();
});

test("a changed password ends every session, starts a new one here, and tells the person", async () => {
  const app = await anApp();
  const { userId, email, password } = await aPerson(app);
  const [here, elsewhere] = [await startSession(app, { userId, userAgent: "" }), await startSession(app, { userId, userAgent: "" })];
  await expect(changePassword(app, { userId, currentPassword: "not it at all", password: "vaguely-marzipan-tractor", userAgent: "" })).rejects.toMatchObject({ fieldErrors: { currentPassword: [expect.any(String)] } });
  await expect(changePassword(app, { userId, currentPassword: password, password: "passwordpassword", userAgent: "" })).rejects.toMatchObject({ fieldErrors: { password: [expect.any(String)] } });
  const token = await changePassword(app, { userId, currentPassword: password, password: "vaguely-marzipan-tractor", userAgent: "" });
  expect(await Promise.all([here, elsewhere, token].map(async (each) => Boolean(await findSignedIn(app, each))))).toEqual([false, false, true]);
  expect(await verifyPassword(app, { email, password: "vaguely-marzipan-tractor", ...noDemo })).toBe(userId);
  expect((await lettersTo(app, email)).map(({ kind }) => kind)).toEqual(["passwordChanged"]);
});

test("the current password cannot be guessed from a session left open", async () => {
  const app = await anApp();
  const { userId, password } = await aPerson(app);
  const change = (currentPassword: string) => changePassword(app, { userId, currentPassword, password: "vaguely-marzipan-tractor", userAgent: "" });
  for (let at = 0; at < 10; at++) await expect(change("a wrong guess here")).rejects.toMatchObject({ code: "invalid_input" });
  await expect(change(password)).rejects.toMatchObject({ status: 429 });
});

test("what ran out is cleared away, what is good stays", async () => {
  const app = await anApp();
  const { userId } = await aPerson(app);
  const token = await startSession(app, { userId, userAgent: "" });
  await purgeExpired(app);
  expect(await findSignedIn(app, token)).toBeDefined();
  await purgeExpired({ db: app.db, now: new Date(app.now.getTime() + sessionAbsoluteMs + 1) });
  expect(await findSignedIn(app, token)).toBeUndefined();
});
