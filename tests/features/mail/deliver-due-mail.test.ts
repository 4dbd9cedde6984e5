import { randomUUID } from "node:crypto";
import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { outgoingMail } from "#app/db/schema/index.ts";
import { deliverDueMail } from "#app/features/mail/deliver-due-mail.server.ts";
import { queueMail } from "#app/features/mail/queue-mail.server.ts";
import { anApp } from "../../setup/an-app.ts";
import { later } from "../../setup/factories.ts";
import { testServices } from "../../setup/test-services.ts";

const minuteMs = 60_000;

async function aLetter(app: Awaited<ReturnType<typeof anApp>>, dedupeKey: string = randomUUID()) {
  await queueMail(app, { laboratoryId: null, to: { address: `${dedupeKey}@example.test`, name: "" }, kind: "test", dedupeKey, message: { subject: "Subject", html: "<p>Text</p>", text: "Text" } });
  return dedupeKey;
}
const row = async (app: Awaited<ReturnType<typeof anApp>>, key: string) => (await app.db.select().from(outgoingMail).where(eq(outgoingMail.dedupeKey, key)))[0]!;

test("a letter is written once, however often its cause repeats, and sent once by workers that share the queue", async () => {
  const app = { ...(await anApp()), services: testServices() };
  const key = await aLetter(app);
  await aLetter(app, key);
  await Promise.all(Array.from({ length: 6 }, () => deliverDueMail(app, { limit: 1_000 })));
  expect(app.services.sent.filter(({ to }) => to.address.startsWith(key))).toHaveLength(1);
  expect(await row(app, key)).toMatchObject({ state: "sent", sentAt: app.now });
});

test("a letter that the server refuses is tried again, later each time, and in the end kept with its reason", async () => {
  const app = { ...(await anApp()), services: { ...testServices(), mailer: { send: () => Promise.reject(new Error("451 try later")) } } };
  const key = await aLetter(app);
  await deliverDueMail(app, { limit: 1_000 });
  const first = await row(app, key);
  expect(first).toMatchObject({ state: "queued", attempts: 1, lastError: "451 try later" });
  await deliverDueMail(app, { limit: 1_000 });
  expect((await row(app, key)).attempts).toBe(1); // not before its time
  for (let tries = 2; tries <= 8; tries++) await deliverDueMail(later(app, tries * 120 * minuteMs), { limit: 1_000 });
  expect(await row(app, key)).toMatchObject({ state: "failed", attempts: 8 });
});

test("a worker that died while sending leaves the letter to the next one", async () => {
  const app = { ...(await anApp()), services: testServices() };
  const key = await aLetter(app);
  await app.db.update(outgoingMail).set({ leaseUntil: new Date(app.now.getTime() + minuteMs), attempts: 1 }).where(eq(outgoingMail.dedupeKey, key));
  await deliverDueMail(app, { limit: 1_000 });
  expect((await row(app, key)).state).toBe("queued");
  await deliverDueMail(later(app, 2 * minuteMs), { limit: 1_000 });
  expect((await row(app, key)).state).toBe("sent");
});
