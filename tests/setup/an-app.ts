import { randomBytes, randomUUID } from "node:crypto";
import { desc, eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { outgoingMail, users } from "#app/db/schema/index.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { NewLaboratory } from "#app/domain/new-laboratory.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { testNow } from "./factories.ts";
import { getTestDb } from "./test-db.ts";
import { testServices } from "./test-services.ts";

/** Hashing made quick for tests that are not about it; as one-way as they need. */
const quickPasswords = {
  hash: async (password: string) => `quick:${Buffer.from(password).toString("base64url")}`.slice(0, 80),
  matches: async (password: string, hash: string | null) => hash !== null && hash === (await quickPasswords.hash(password)),
};

/** An asker from an address of their own, so that no test meets another's limits. */
export async function anApp({ now = testNow }: { now?: Date } = {}): Promise<AppContext> {
  return { db: await getTestDb(), now, services: testServices({ passwords: quickPasswords }), clientAddress: `2001:db8::${randomBytes(6).toString("hex")}` };
}

export const goodPassword = "plinth otter cadmium";

export async function aPerson(app: AppContext, fields: Partial<typeof users.$inferInsert> & { password?: string } = {}): Promise<{ userId: UserId; email: string; name: string; password: string }> {
  const { password = goodPassword, ...rest } = fields;
  const tag = randomBytes(6).toString("hex");
  const person = { id: newId<"user">(), name: `Person ${tag}`, email: `${tag}@example.test`, ...rest };
  await app.db.insert(users).values({ ...person, passwordHash: await app.services.passwords.hash(password), emailConfirmedAt: app.now, createdAt: app.now });
  return { userId: person.id, email: person.email, name: person.name, password };
}

export function aNewLaboratory(fields: Partial<NewLaboratory> = {}): NewLaboratory {
  const tag = randomBytes(4).toString("hex");
  const letters = Array.from(randomBytes(6), (byte) => String.fromCharCode(65 + (byte % 26))).join("");
  return { name: `Laboratory ${tag}`, slug: `new-${tag}`, prefix: letters, isSolePractice: false, timeZone: "Europe/Lisbon", currency: "EUR", ...fields };
}

/** The letters waiting for an address, the newest first, with the token in each one's link. */
export async function lettersTo(app: AppContext, address: string) {
  const rows = await app.db.select().from(outgoingMail).where(eq(outgoingMail.toAddress, address)).orderBy(desc(outgoingMail.id));
  return rows.map((row) => ({ kind: row.kind, subject: row.subject, text: row.textBody, token: /\/(?:reset-password|confirm-email|invitation)\/([\w-]{43})/.exec(row.textBody)?.[1] ?? "" }));
}

export const aRequestId = () => randomUUID();
