import { createHash, randomBytes } from "node:crypto";
import { newId } from "#app/db/new-id.server.ts";
import { clients, instruments, laboratories, membershipRoles, memberships, prices, users } from "#app/db/schema/index.ts";
import type { ClientId, InstrumentId, LaboratoryId, UserId } from "#app/domain/ids.ts";
import type { Role } from "#app/domain/roles.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import type { Services } from "#app/features/services.ts";
import { getTestDb } from "./test-db.ts";
import { testServices } from "./test-services.ts";

/** A fixed clock: 1 December 2026, ten in the morning in UTC. */
export const testNow = new Date("2026-12-01T10:00:00.000Z");

type LabOptions = { roles?: Role[]; isSolePractice?: boolean; now?: Date; services?: Services };

/** A laboratory of its own with one member, so that tests never meet each other's rows. */
export async function aLab({ roles = ["owner", "gemmologist", "appraiser", "desk"], isSolePractice = false, now = testNow, services }: LabOptions = {}): Promise<LabContext> {
  const db = await getTestDb();
  const tag = randomBytes(4).toString("hex");
  const laboratoryId = newId<"laboratory">();
  const laboratory = {
    slug: `lab-${tag}`,
    name: `Laboratory ${tag}`,
    prefix: prefixFrom(tag),
    isSolePractice,
    timeZone: "Europe/Lisbon",
    currency: "EUR" as const,
    taxShareE4: 2000,
    taxLabel: "VAT",
    usualDays: 5,
    selfCheckDelayHours: 24,
  };
  await db.insert(laboratories).values({ id: laboratoryId, ...laboratory, addressLines: ["1 Test Row"], createdAt: now });
  const services_ = services ?? testServices();
  const ctx = await aMember({ db, laboratoryId, laboratory, now, services: services_ }, roles);
  await db.insert(prices).values([
    { laboratoryId, id: newId<"price">(), service: "identification", label: "Identification", amountMinor: 8500, position: 1, changedAt: now },
    { laboratoryId, id: newId<"price">(), service: "secondCheck", label: "Second check", amountMinor: 3000, position: 2, changedAt: now },
    { laboratoryId, id: newId<"price">(), service: "valuation", label: "Valuation", amountMinor: 12000, position: 3, changedAt: now },
  ]);
  return ctx;
}

type LabBase = Pick<LabContext, "db" | "laboratoryId" | "laboratory" | "now" | "services">;

/** Another person of the same laboratory, with their own roles. */
export async function aMember(lab: LabBase, roles: Role[]): Promise<LabContext> {
  const { db, laboratoryId, laboratory, now, services } = lab;
  const userId = newId<"user">();
  const tag = randomBytes(5).toString("hex");
  const person = { name: `Person ${tag}`, email: `${tag}@example.test`, title: "Gemmologist" };
  await db.insert(users).values({ id: userId, name: person.name, email: person.email, emailConfirmedAt: now, createdAt: now });
  await db.insert(memberships).values({ laboratoryId, userId, title: person.title, joinedAt: now });
  if (roles.length > 0) await db.insert(membershipRoles).values(roles.map((role) => ({ laboratoryId, userId, role })));
  return { db, laboratoryId, laboratory, now, services, actorId: userId, person, roles };
}

export async function aClient(ctx: LabContext, fields: Partial<{ name: string; email: string; terms: "prepaid" | "account" }> = {}): Promise<ClientId> {
  const id = newId<"client">();
  await ctx.db.insert(clients).values({
    laboratoryId: ctx.laboratoryId,
    id,
    name: "Ardenne Estate",
    email: "estate@example.test",
    addressLines: ["2 Harbour Lane"],
    createdAt: ctx.now,
    ...fields,
  });
  return id;
}

export async function anInstrument(ctx: LabContext, fields: Partial<typeof instruments.$inferInsert> = {}): Promise<InstrumentId> {
  const id = newId<"instrument">();
  await ctx.db.insert(instruments).values({
    laboratoryId: ctx.laboratoryId,
    id,
    kind: "balance",
    name: `B-${randomBytes(3).toString("hex")}`,
    resolution: 0.001,
    createdAt: ctx.now,
    ...fields,
  });
  return id;
}

/** The same context some time later. */
export function later<T extends { now: Date }>(ctx: T, ms: number): T {
  return { ...ctx, now: new Date(ctx.now.getTime() + ms) };
}

export type { LaboratoryId, UserId };

function prefixFrom(tag: string): string {
  // Prefixes are unique over the installation: letters only, from a hash, so that parallel tests do not collide.
  const digest = createHash("sha256").update(tag).digest();
  return Array.from({ length: 6 }, (_, i) => String.fromCharCode(65 + (digest[i]! % 26))).join("");
}
