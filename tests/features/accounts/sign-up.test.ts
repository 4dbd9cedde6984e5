import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { auditEvents, laboratories, membershipRoles, prices, users } from "#app/db/schema/index.ts";
import { confirmEmail } from "#app/features/accounts/confirm-email.server.ts";
import { findSignUp } from "#app/features/accounts/find-sign-up.server.ts";
import { signUpLaboratory } from "#app/features/accounts/sign-up-laboratory.server.ts";
import { verifyPassword } from "#app/features/accounts/verify-password.server.ts";
import { landingPath } from "#app/features/accounts/landing-path.server.ts";
import { openLaboratory } from "#app/features/laboratories/open-laboratory.server.ts";
import { later } from "../../setup/factories.ts";
import { aNewLaboratory, anApp, aPerson, aRequestId, goodPassword, lettersTo } from "../../setup/an-app.ts";

const anEmail = () => `${aRequestId().slice(0, 13)}@example.test`;
const ask = (email: string, laboratory = aNewLaboratory()) => ({ name: "Iva Sorrel", email, password: goodPassword, requestId: aRequestId(), laboratory });

test("a sole practitioner signs up, confirms, and has a laboratory with every role and a price list", async () => {
  const app = await anApp();
  const email = anEmail();
  const laboratory = aNewLaboratory({ isSolePractice: true });
  await signUpLaboratory(app, ask(email, laboratory));
  const [letter] = await lettersTo(app, email);
  expect(letter).toMatchObject({ kind: "confirmEmail" });
  expect(await findSignUp(app, letter!.token)).toMatchObject({ email, laboratory });
  const { userId, labSlug } = await confirmEmail(app, { token: letter!.token, slug: laboratory.slug, prefix: laboratory.prefix });
  expect(labSlug).toBe(laboratory.slug);
  expect(await verifyPassword(app, { email, password: goodPassword, mayBeDemonstration: false })).toBe(userId);
  expect(await landingPath(app, userId)).toBe(`/lab/${laboratory.slug}/stones`);
  const [row] = await app.db.select().from(laboratories).where(eq(laboratories.slug, laboratory.slug));
  expect(row).toMatchObject({ ...laboratory, version: 1 });
  const held = await app.db.select({ role: membershipRoles.role }).from(membershipRoles).where(eq(membershipRoles.laboratoryId, row!.id));
  expect(held.map(({ role }) => role).sort()).toEqual(["appraiser", "desk", "gemmologist", "owner"]);
  const list = await app.db.select({ service: prices.service, amountMinor: prices.amountMinor }).from(prices).where(eq(prices.laboratoryId, row!.id)).orderBy(prices.position);
  expect(list.map(({ service }) => service)).toEqual(["identification", "secondCheck", "valuation"]);
  expect(list.every(({ amountMinor }) => amountMinor > 0)).toBe(true);
  expect(await app.db.select({ action: auditEvents.action }).from(auditEvents).where(eq(auditEvents.laboratoryId, row!.id))).toEqual([{ action: "laboratory.opened" }]);
});

test("before the address is confirmed there is no account, no laboratory, and no name is held", async () => {
  const app = await anApp();
  const email = anEmail();
  const laboratory = aNewLaboratory();
  await signUpLaboratory(app, ask(email, laboratory));
  expect(await app.db.select().from(users).where(eq(users.email, email))).toEqual([]);
  expect(await app.db.select().from(laboratories).where(eq(laboratories.slug, laboratory.slug))).toEqual([]);
  await signUpLaboratory(app, ask(anEmail(), laboratory));
});

test("an address with an account gets the same answer; only its mailbox learns more", async () => {
  const app = await anApp();
  const { email, password, userId } = await aPerson(app);
  await expect(signUpLaboratory(app, ask(email))).resolves.toBeUndefined();
  const letters = await lettersTo(app, email);
  expect(letters.map(({ kind }) => kind)).toEqual(["accountExists"]);
  expect(letters[0]!.text).toContain("/reset-password/");
  expect(await verifyPassword(app, { email, password, mayBeDemonstration: false })).toBe(userId);
});

test("a confirmation link works once and for a day", async () => {
  const app = await anApp();
  const [once, late] = [anEmail(), anEmail()];
  const [first, second] = [aNewLaboratory(), aNewLaboratory()];
  await signUpLaboratory(app, ask(once, first));
  await signUpLaboratory(app, ask(late, second));
  const [a, b] = [(await lettersTo(app, once))[0]!.token, (await lettersTo(app, late))[0]!.token];
  const tries = await Promise.allSettled(Array.from({ length: 4 }, () => confirmEmail(app, { token: a, slug: first.slug, prefix: first.prefix })));
  expect(tries.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  await expect(confirmEmail(app, { token: a, slug: first.slug, prefix: first.prefix })).rejects.toMatchObject({ code: "not_found" });
  await expect(confirmEmail(later(app, 24 * 3_600_000), { token: b, slug: second.slug, prefix: second.prefix })).rejects.toMatchObject({ code: "not_found" });
  await expect(confirmEmail(app, { token: "A".repeat(43), slug: second.slug, prefix: second.prefix })).rejects.toMatchObject({ code: "not_found" });
});

test("a short name taken in the meantime is asked for again, and the link still works", async () => {
  const app = await anApp();
  const email = anEmail();
  const wanted = aNewLaboratory();
  await signUpLaboratory(app, ask(email, wanted));
  await openLaboratory(app, { ownerId: (await aPerson(app)).userId, laboratory: { ...aNewLaboratory(), slug: wanted.slug } });
  const token = (await lettersTo(app, email))[0]!.token;
  await expect(confirmEmail(app, { token, slug: wanted.slug, prefix: wanted.prefix })).rejects.toMatchObject({ fieldErrors: { slug: [expect.stringContaining("Another laboratory is at")] } });
  expect(await app.db.select().from(users).where(eq(users.email, email))).toEqual([]);
  await confirmEmail(app, { token, slug: `${wanted.slug}-2`, prefix: wanted.prefix });
});

test("a short name or letters of another laboratory are refused beside their fields", async () => {
  const app = await anApp();
  const theirs = aNewLaboratory();
  await openLaboratory(app, { ownerId: (await aPerson(app)).userId, laboratory: theirs });
  await expect(signUpLaboratory(app, ask(anEmail(), theirs))).rejects.toMatchObject({ code: "invalid_input", fieldErrors: { slug: [expect.any(String)], prefix: [expect.any(String)] } });
  await expect(openLaboratory(app, { ownerId: (await aPerson(app)).userId, laboratory: { ...aNewLaboratory(), prefix: theirs.prefix } })).rejects.toMatchObject({ fieldErrors: { prefix: [expect.any(String)] } });
});

test("a laboratory opened twice by the same form is opened once", async () => {
  const app = await anApp();
  const { userId } = await aPerson(app);
  const laboratory = aNewLaboratory();
  const [a, b] = [await openLaboratory(app, { ownerId: userId, laboratory }), await openLaboratory(app, { ownerId: userId, laboratory })];
  expect(b).toEqual(a);
});

test("two who want the same name at once: one has it, the other is told", async () => {
  const app = await anApp();
  const wanted = aNewLaboratory();
  const people = await Promise.all(Array.from({ length: 4 }, () => aPerson(app)));
  const tries = await Promise.allSettled(people.map(({ userId }) => openLaboratory(app, { ownerId: userId, laboratory: wanted })));
  expect(tries.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  for (const tried of tries) if (tried.status === "rejected") expect(["conflict", "invalid_input"]).toContain(tried.reason.code);
});

test("a common or personal password is refused at sign-up, before anything is written", async () => {
  const app = await anApp();
  const email = anEmail();
  for (const password of ["too short", "passwordpassword", "Iva Sorrel Iva Sorrel"]) {
    await expect(signUpLaboratory(app, { ...ask(email), password })).rejects.toMatchObject({ fieldErrors: { password: [expect.any(String)] } });
  }
  expect(await lettersTo(app, email)).toEqual([]);
});

test("one form sent twice sends one letter; one address is written to three times an hour at most", async () => {
  const app = await anApp();
  const email = anEmail();
  const form = ask(email);
  await signUpLaboratory(app, form);
  await signUpLaboratory(app, form);
  expect(await lettersTo(app, email)).toHaveLength(1);
  await signUpLaboratory(app, ask(email));
  await expect(signUpLaboratory(app, ask(email))).rejects.toMatchObject({ status: 429 });
});
