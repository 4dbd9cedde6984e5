import { and, eq } from "drizzle-orm";
import type { Db } from "#app/db/client.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { clients, clientUsers, laboratories, membershipRoles, memberships, users } from "#app/db/schema/index.ts";
import type { ClientId, InstrumentId, LaboratoryId, UserId } from "#app/domain/ids.ts";
import { roles as allRoles, type Role } from "#app/domain/roles.ts";
import { createClient } from "#app/features/clients/create-client.server.ts";
import { grantTerms } from "#app/features/clients/grant-terms.server.ts";
import { recordInstrumentCheck } from "#app/features/instruments/record-instrument-check.server.ts";
import { registerInstrument } from "#app/features/instruments/register-instrument.server.ts";
import { addReferenceMaterial } from "#app/features/reference-materials/add-reference-material.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { openLaboratory } from "#app/features/laboratories/open-laboratory.server.ts";
import type { Services } from "#app/features/services.ts";
import { addDays, calendarDateIn } from "#app/domain/calendar-date.ts";
import type { ClientKey } from "./story.ts";

export type Person = { email: string; name: string };
export type Laboratory = {
  /** A context in which one person acts at one moment. */
  as: (person: string, now: Date) => LabContext;
  instruments: Map<string, InstrumentId>;
  clients: Map<ClientKey, ClientId>;
};

type Setting = { db: Db; services: Services; passwordHash: string; now: Date };

export async function addPeople({ db, passwordHash, now }: Setting, people: readonly Person[]): Promise<Map<string, UserId>> {
  const ids = new Map<string, UserId>();
  for (const { email, name } of people) {
    const id = newId<"user">();
    await db.insert(users).values({ id, email, name, passwordHash, passwordChangedAt: now, emailConfirmedAt: now, isDemonstration: true, createdAt: now });
    ids.set(email.split("@")[0]!, id);
  }
  return ids;
}

type Plan = {
  name: string;
  slug: string;
  prefix: string;
  isSolePractice: boolean;
  addressLines: string[];
  phone: string;
  email: string;
  owner: string;
  members: Array<{ key: string; roles: Role[]; title: string }>;
};

export async function openDemoLaboratory(setting: Setting, ids: ReadonlyMap<string, UserId>, plan: Plan): Promise<Laboratory> {
  const { db, services, now } = setting;
  const ownerId = ids.get(plan.owner)!;
  const basics = { name: plan.name, slug: plan.slug, prefix: plan.prefix, isSolePractice: plan.isSolePractice, timeZone: "Europe/Lisbon", currency: "EUR" as const };
  const { laboratoryId } = await openLaboratory({ db, services, now }, { ownerId, laboratory: basics });
  const rest = { addressLines: plan.addressLines, phone: plan.phone, email: plan.email, taxShareE4: 2300, taxLabel: "VAT", custodyLimitMinor: 25_000_000, selfCheckDelayHours: 24 };
  await db.update(laboratories).set(rest).where(eq(laboratories.id, laboratoryId));

  await db.delete(membershipRoles).where(and(eq(membershipRoles.laboratoryId, laboratoryId), eq(membershipRoles.userId, ownerId)));
  for (const { key, roles, title } of plan.members) {
    const userId = ids.get(key)!;
    if (userId !== ownerId) await db.insert(memberships).values({ laboratoryId, userId, title, joinedAt: now });
    else await db.update(memberships).set({ title }).where(and(eq(memberships.laboratoryId, laboratoryId), eq(memberships.userId, userId)));
    await db.insert(membershipRoles).values(roles.map((role) => ({ laboratoryId, userId, role })));
  }

  const as = (person: string, at: Date): LabContext => {
    const member = plan.members.find(({ key }) => key === person)!;
    return {
      db, services, laboratoryId, now: at, actorId: ids.get(person)!, roles: member.roles,
      person: { name: person, email: `${person}@${plan.slug}.example`, title: member.title },
      laboratory: { ...basics, taxShareE4: rest.taxShareE4, taxLabel: rest.taxLabel, usualDays: 5, selfCheckDelayHours: rest.selfCheckDelayHours },
    };
  };
  return { as, instruments: await addInstruments(as(plan.owner, now)), clients: await addClients(as(plan.owner, now), { ids, laboratoryId }) };
}

const instrumentPlans = [
  { kind: "refractometer", name: "R1", description: "shadow-edge refractometer, white light", location: "Bench 1", resolution: 0.005, upperLimit: 1.81, check: ["quartz, ordinary ray", "1.544", "1.5445", "0.002"], ageDays: 9 },
  { kind: "refractometer", name: "R2", description: "shadow-edge refractometer, sodium light", location: "Bench 2", resolution: 0.001, upperLimit: 1.81, check: ["quartz, ordinary ray", "1.544", "1.5435", "0.002"], ageDays: 1 },
  { kind: "angleRefractometer", name: "A1", description: "critical-angle refractometer", location: "Bench 2", resolution: 0.02, upperLimit: 1.81, prismIndex: 1.88, check: ["quartz, ordinary ray", "55.227", "55.22", "0.1"], ageDays: 4 },
  { kind: "polariscope", name: "P1", description: "polariscope with conoscope", location: "Bench 2", check: null, ageDays: 0 },
  { kind: "balance", name: "B1", description: "carat balance, 0.001 ct", location: "Bench 2", resolution: 0.001, check: ["check weight 5 ct", "5.000", "5.0005", "0.003"], ageDays: 1 },
  { kind: "balance", name: "B2", description: "gram balance, 0.01 g", location: "Desk", resolution: 0.01, check: ["check weight 50 g", "50.00", "50.00", "0.02"], ageDays: 3 },
  { kind: "gauge", name: "G1", description: "leverage gauge, 0.01 mm", location: "Bench 2", resolution: 0.01, check: ["gauge block 5 mm", "5.00", "5.00", "0.02"], ageDays: 6 },
  { kind: "dichroscope", name: "D1", description: "calcite dichroscope", location: "Bench 2", check: null, ageDays: 0 },
  { kind: "spectroscope", name: "S1", description: "diffraction-grating spectroscope", location: "Bench 1", resolution: 1, check: ["mercury line", "546.1", "546", "3"], ageDays: 5 },
  { kind: "uvLamp", name: "L1", description: "viewing cabinet, 365 and 254 nm, interlocked", location: "Dark corner", check: null, ageDays: 0 },
  { kind: "colourFilter", name: "F1", description: "dichromatic filter", location: "Bench 1", check: null, ageDays: 0 },
  { kind: "thermalProbe", name: "T1", description: "thermal probe", location: "Bench 1", check: null, ageDays: 0 },
  { kind: "refractometer", name: "R3", description: "shadow-edge refractometer, for spots", location: "Bench 3", resolution: 0.01, upperLimit: 1.79, check: ["quartz, ordinary ray", "1.544", "1.545", "0.005"], ageDays: 2, failsAs: "1.558" },
  { kind: "microscope", name: "M1", description: "darkfield microscope, 10–70×", location: "Bench 1", check: null, ageDays: 0 },
] as const;

/** Since then each was checked again, but for one whose check is overdue. */
export async function checkInstrumentsAgain({ as, instruments }: Laboratory, { owner, now }: { owner: string; now: Date }): Promise<void> {
  for (const plan of instrumentPlans) {
    if (!plan.check || plan.name === "R1") continue;
    const [reference, nominal, reading, limit] = plan.check;
    // One was knocked: what was read on it is called back.
    const shown = "failsAs" in plan ? plan.failsAs : reading;
    await checkInstrument(as(owner, new Date(now.getTime() - plan.ageDays * 24 * 60 * 60 * 1000)), { id: instruments.get(plan.name)!, check: [reference, nominal, shown, limit], usualDays: 14 });
  }
}

async function checkInstrument(owner: LabContext, { id, check, usualDays }: { id: InstrumentId; check: readonly [string, string, string, string]; usualDays: number }): Promise<void> {
  const [referenceMaterial, nominal, reading, limit] = check;
  const typed = (text: string) => ({ value: Number(text), text });
  const nextDueOn = addDays(calendarDateIn(owner.now, owner.laboratory.timeZone), usualDays);
  await recordInstrumentCheck(owner, id, { requestId: newId<"instrumentCheck">(), referenceMaterial, nominal: typed(nominal), reading: typed(reading), limit: typed(limit), tempC: 21.5, nextDueOn, note: "" });
}

async function addInstruments(owner: LabContext): Promise<Map<string, InstrumentId>> {
  await addReferences(owner);
  const instruments = new Map<string, InstrumentId>();
  for (const plan of instrumentPlans) {
    const { kind, name, description, location } = plan;
    const id = await registerInstrument(owner, {
      requestId: newId<"instrument">(), kind, name, description, serial: "", location,
      resolution: "resolution" in plan ? plan.resolution : null, standardUncertainty: null,
      upperLimit: "upperLimit" in plan ? plan.upperLimit : null, prismIndex: "prismIndex" in plan ? plan.prismIndex : null,
    });
    instruments.set(name, id);
    if (plan.check) await checkInstrument(owner, { id, check: plan.check, usualDays: name === "R1" ? 20 : 60 });
  }
  return instruments;
}

/** Values of the materials: quartz by its Sellmeier equation, spinel and corundum as usually stated (common practice); weights and blocks by their nominal value. */
const referencePlans = [
  { name: "Quartz Q1, ordinary ray", forKind: "refractometer", unit: "n", nominalValue: 1.5442, standardUncertainty: 0.0001, limitValue: 0.002, source: "Literature, 589.3 nm" },
  { name: "Quartz Q1, extraordinary ray", forKind: "refractometer", unit: "n", nominalValue: 1.5533, standardUncertainty: 0.0001, limitValue: 0.002, source: "Literature, 589.3 nm" },
  { name: "Synthetic spinel S1", forKind: "refractometer", unit: "n", nominalValue: 1.728, standardUncertainty: 0.0005, limitValue: 0.002, source: "Common practice for flame-fusion spinel" },
  { name: "Check weight 5 ct", forKind: "balance", unit: "ct", nominalValue: 5, standardUncertainty: 0.0005, limitValue: 0.003, source: "Nominal value, class M1" },
  { name: "Gauge block 5 mm", forKind: "gauge", unit: "mm", nominalValue: 5, standardUncertainty: 0.001, limitValue: 0.02, source: "Nominal value, works certificate" },
  { name: "Glass plate P1", forKind: "polariscope", unit: null, nominalValue: null, standardUncertainty: null, limitValue: null, expectedText: "dark throughout", source: "Annealed plate, own observation" },
] as const;

async function addReferences(owner: LabContext): Promise<void> {
  for (const plan of referencePlans) await addReferenceMaterial(owner, { requestId: newId<"referenceMaterial">(), expectedText: "", condition: "Clean, no chips", conditionSeenOn: calendarDateIn(owner.now, owner.laboratory.timeZone), ...plan });
}

const clientPlans: ReadonlyArray<{ key: ClientKey; name: string; contactName: string; email: string; addressLines: string[]; hasTerms?: boolean }> = [
  { key: "ardenne", name: "Ardenne Estate", contactName: "Linnea Ardenne", email: "ardenne@estate.example", addressLines: ["The Old Customs House", "Port Ellery"] },
  { key: "ferro", name: "Ferro & Daughters", contactName: "Ondine Ferro", email: "post@ferrodaughters.example", addressLines: ["12 Ropewalk", "Port Ellery"] },
  { key: "castellan", name: "R. Castellan", contactName: "", email: "castellan@post.example", addressLines: ["Flat 3, 8 Gull Street"] },
  { key: "holm", name: "Holm Lane Antiques", contactName: "Tove Hallam", email: "shop@holmlane.example", addressLines: ["1 Holm Lane"], hasTerms: true },
  { key: "museum", name: "Port Ellery Museum", contactName: "Dr Auden Pryce", email: "registrar@portellerymuseum.example", addressLines: ["Museum Quay"], hasTerms: true },
];

async function addClients(owner: LabContext, { ids, laboratoryId }: { ids: ReadonlyMap<string, UserId>; laboratoryId: LaboratoryId }): Promise<Map<ClientKey, ClientId>> {
  const made = new Map<ClientKey, ClientId>();
  for (const { key, hasTerms, ...details } of clientPlans) {
    const id = newId<"client">();
    await createClient({ ...owner, roles: allRoles }, { requestId: id, ...details, phone: "", note: "" });
    if (hasTerms) {
      const [row] = await owner.db.select({ version: clients.version }).from(clients).where(and(eq(clients.laboratoryId, laboratoryId), eq(clients.id, id)));
      await grantTerms({ ...owner, roles: allRoles }, id, { terms: "account", version: row!.version });
    }
    made.set(key, id);
  }
  await owner.db.insert(clientUsers).values({ laboratoryId, clientId: made.get("ardenne")!, userId: ids.get("ardenne")!, joinedAt: owner.now });
  return made;
}
