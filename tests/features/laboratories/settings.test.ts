import { and, eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { auditEvents } from "#app/db/schema/index.ts";
import { endMembership } from "#app/features/laboratories/end-membership.server.ts";
import { getLaboratorySettings } from "#app/features/laboratories/get-laboratory-settings.server.ts";
import { laboratorySettingsForm, pricesForm } from "#app/features/laboratories/laboratory-forms.server.ts";
import { listPrices } from "#app/features/laboratories/list-prices.server.ts";
import { listTeam } from "#app/features/laboratories/list-team.server.ts";
import { priceListMark } from "#app/features/laboratories/price-list-mark.ts";
import { setMemberRoles } from "#app/features/laboratories/set-member-roles.server.ts";
import { updateLaboratory } from "#app/features/laboratories/update-laboratory.server.ts";
import { updatePrices } from "#app/features/laboratories/update-prices.server.ts";
import { aLab, aMember } from "../../setup/factories.ts";

const typed = { name: "Sandreed Gem Testing", address: "2 Wharf Row\r\n\r\nPort Ellery ", phone: "", email: "desk@sandreed.example", timeZone: "Europe/Lisbon", practice: "laboratory", taxLabel: "VAT", taxPercent: "19,6", usualDays: "7", selfCheckDelayHours: "24", custodyLimit: "250 000,50", version: "1" };
const settings = (fields: Partial<typeof typed> = {}) => laboratorySettingsForm("EUR").safeParse({ ...typed, ...fields });
const problems = (fields: Partial<typeof typed>) => settings(fields).error?.issues.map(({ path }) => path[0]) ?? [];

test("settings are read as typed, with a decimal comma", () => {
  expect(settings().data).toMatchObject({ addressLines: ["2 Wharf Row", "Port Ellery"], taxShareE4: 1960, usualDays: 7, custodyLimitMinor: 25_000_050, isSolePractice: false });
  expect(settings({ custodyLimit: "", email: "" }).data).toMatchObject({ custodyLimitMinor: null, email: "" });
});

test.each([
  { name: " " },
  { address: "\n" },
  { address: Array.from({ length: 7 }, () => "line").join("\n") },
  { timeZone: "Europe/Atlantis" },
  { taxPercent: "51" },
  { taxPercent: "19.605" },
  { taxPercent: "-1" },
  { usualDays: "0" },
  { usualDays: "1e3" },
  { selfCheckDelayHours: "2" },
  { custodyLimit: "-5" },
  { custodyLimit: "1.234" },
  { email: "desk@" },
])("absurd settings are refused beside their field: %o", (fields) => {
  expect(problems(fields)).toEqual(Object.keys(fields));
});

test("settings are saved once; a stale page is told, and changes nothing", async () => {
  const lab = await aLab();
  await updateLaboratory(lab, settings().data!);
  expect(await getLaboratorySettings(lab)).toMatchObject({ name: "Sandreed Gem Testing", taxShareE4: 1960, version: 2 });
  await expect(updateLaboratory(lab, settings({ name: "Other" }).data!)).rejects.toMatchObject({ status: 409 });
  expect(await getLaboratorySettings(lab)).toMatchObject({ name: "Sandreed Gem Testing", version: 2 });
  const events = await lab.db.select({ action: auditEvents.action, detail: auditEvents.detail }).from(auditEvents).where(and(eq(auditEvents.laboratoryId, lab.laboratoryId), eq(auditEvents.action, "laboratory.changed")));
  expect(events).toHaveLength(1);
});

test("a laboratory with a team is no sole practice", async () => {
  const lab = await aLab();
  await aMember(lab, ["desk"]);
  await expect(updateLaboratory(lab, settings({ practice: "sole" }).data!)).rejects.toMatchObject({ fieldErrors: { practice: [expect.any(String)] } });
  const alone = await aLab();
  await updateLaboratory(alone, settings({ practice: "sole" }).data!);
  expect(await getLaboratorySettings(alone)).toMatchObject({ isSolePractice: true });
});

test("roles are set as chosen; a stale page and a choice of none are refused", async () => {
  const lab = await aLab();
  const member = await aMember(lab, ["gemmologist"]);
  const change = { userId: member.actorId, roles: ["appraiser", "desk"] as const, title: "Valuer", rolesBefore: ["gemmologist"] as const, titleBefore: "Gemmologist" };
  await setMemberRoles(lab, change);
  expect((await listTeam(lab)).members.find(({ userId }) => userId === member.actorId)).toMatchObject({ roles: ["appraiser", "desk"], title: "Valuer" });
  await expect(setMemberRoles(lab, change)).rejects.toMatchObject({ status: 409 });
  await expect(setMemberRoles(lab, { ...change, roles: [], rolesBefore: ["appraiser", "desk"], titleBefore: "Valuer" })).rejects.toMatchObject({ code: "invalid_input" });
});

test("the last owner stays, even when two owners remove each other at once", async () => {
  const lab = await aLab({ roles: ["owner"] });
  const self = { userId: lab.actorId, roles: ["desk"] as const, title: "", rolesBefore: ["owner"] as const, titleBefore: "Gemmologist" };
  await expect(setMemberRoles(lab, self)).rejects.toMatchObject({ code: "conflict", fieldErrors: { roles: [expect.stringContaining("last owner")] } });
  await expect(endMembership(lab, { userId: lab.actorId })).rejects.toMatchObject({ code: "conflict" });
  const other = await aMember(lab, ["owner"]);
  const tries = await Promise.allSettled([endMembership(lab, { userId: other.actorId }), endMembership(other, { userId: lab.actorId })]);
  expect(tries.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  expect((await listTeam(lab)).members).toHaveLength(1);
});

const before = async (lab: Awaited<ReturnType<typeof aLab>>) => priceListMark(await listPrices(lab));
const form = (fields: Record<string, string>) =>
  pricesForm("EUR").safeParse({
    before: "x",
    "identification-label": "Identification",
    "identification-amount": "90",
    "identification-active": "on",
    "secondCheck-label": "Second check",
    "secondCheck-amount": "30,5",
    "secondCheck-active": "on",
    "valuation-label": "Valuation",
    "valuation-amount": "120.00",
    ...fields,
  });

test("fees are fixed amounts: a percentage, a minus and an absurd amount are refused", () => {
  expect(form({}).data!.changes.map(({ amountMinor, isActive }) => [amountMinor, isActive])).toEqual([[9000, true], [3050, true], [12000, false]]);
  for (const amount of ["2 %", "2%", "-5", "1e4", "12.345", "", "1000001"]) {
    const issues = form({ "valuation-amount": amount }).error?.issues ?? [];
    expect(issues.map(({ path }) => path[0])).toEqual(["valuation-amount"]);
  }
  expect(form({ "valuation-amount": "2 %" }).error?.issues[0]?.message).toContain("never depends on a value");
});

test("the price list is changed once; a stale page is told", async () => {
  const lab = await aLab();
  const mark = await before(lab);
  const { changes } = form({}).data!;
  await updatePrices(lab, { changes, before: mark });
  expect(await listPrices(lab)).toMatchObject([{ service: "identification", amountMinor: 9000 }, { service: "secondCheck", amountMinor: 3050 }, { service: "valuation", isActive: false }]);
  await expect(updatePrices(lab, { changes, before: mark })).rejects.toMatchObject({ status: 409 });
  await updatePrices(lab, { changes, before: await before(lab) });
  const events = await lab.db.select({ detail: auditEvents.detail }).from(auditEvents).where(and(eq(auditEvents.laboratoryId, lab.laboratoryId), eq(auditEvents.action, "prices.changed")));
  expect(events).toEqual([{ detail: { services: ["identification", "secondCheck", "valuation"] } }]);
});
