import { randomUUID } from "node:crypto";
import { existsSync, readFileSync } from "node:fs";
import { and, eq } from "drizzle-orm";
import { newId } from "#app/db/new-id.server.ts";
import { attachments, invoices, items, reports, stones } from "#app/db/schema/index.ts";
import type { ReportId } from "#app/domain/ids.ts";
import { certificationPoints } from "#app/domain/valuation.ts";
import { recordHandOver } from "#app/features/custody/record-hand-over.server.ts";
import { releaseItem } from "#app/features/custody/release-item.server.ts";
import { proposeConclusion } from "#app/features/identification/propose-conclusion.server.ts";
import { recordInclusion } from "#app/features/inclusions/record-inclusion.server.ts";
import { strikeInclusion } from "#app/features/inclusions/strike-inclusion.server.ts";
import { recordDeskPayment } from "#app/features/invoices/record-desk-payment.server.ts";
import { addPhoto } from "#app/features/photos/add-photo.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { authoriseReport } from "#app/features/reports/authorise-report.server.ts";
import { issueReport } from "#app/features/reports/issue-report.server.ts";
import { renderQueuedReports } from "#app/features/reports/render-queued-reports.server.ts";
import { reopenStone } from "#app/features/reports/reopen-stone.server.ts";
import { withdrawReport } from "#app/features/reports/withdraw-report.server.ts";
import { compareSecondCheck } from "#app/features/second-checks/compare-second-check.server.ts";
import { decideSecondCheck } from "#app/features/second-checks/decide-second-check.server.ts";
import { startSecondCheck } from "#app/features/second-checks/start-second-check.server.ts";
import { addSpectrum } from "#app/features/spectra/add-spectrum.server.ts";
import { takeInItems } from "#app/features/take-ins/take-in-items.server.ts";
import { saveAndSignValuation } from "#app/features/valuations/save-and-sign-valuation.server.ts";
import { saveValuation } from "#app/features/valuations/save-valuation.server.ts";
import type { ValuationInput } from "#app/features/valuations/valuation-forms.server.ts";
import { inventedSpectrum } from "./invented-spectrum.ts";
import type { Laboratory } from "./open-laboratories.ts";
import { photoFile } from "./photo-file.ts";
import type { Conclusion, Reading, Story } from "./story.ts";

type Cast = { desk: string; examiner: string; checker: string; appraiser: string; owner: string };
const minuteMs = 60_000;
const hourMs = 60 * minuteMs;
const consents = ["dryCloth", "contactLiquid", "hydrostatic", "ultraviolet", "photography", "publicRegister"] as const;

/** Lets one stone live through the product's own operations, each at its time and by its person. */
export async function tellStory(lab: Laboratory, story: Story, { now, cast }: { now: Date; cast: Cast }): Promise<void> {
  // Taken in at the desk in the morning; work goes on from there and never past the present.
  let clock = new Date(Math.min(now.getTime() - 3 * minuteMs, now.getTime() - story.daysAgo * 24 * hourMs));
  const steps = 4 + (story.readings?.length ?? 0) * 2 + (story.check?.readings.length ?? 0);
  const stepMs = Math.min(25 * minuteMs, (now.getTime() - clock.getTime()) / (steps + 40));
  const later = (ms = stepMs) => (clock = new Date(Math.min(clock.getTime() + ms, now.getTime())));

  const desk = lab.as(cast.desk, clock);
  const isGrams = story.massUnit === "g";
  const { takeInId } = await takeInItems(desk, {
    requestId: randomUUID(),
    client: { id: lab.clients.get(story.client)! },
    handedOverBy: "the client", capacity: story.client === "ardenne" ? "executor" : story.client === "ferro" || story.client === "holm" ? "trade" : "owner",
    returnMethod: "collect", clientStatements: story.statements ?? "", place: "Safe 1", isValuationWanted: story.isValuationWanted ?? false,
    items: [{
      description: story.description, mount: story.mount ?? "loose", stoneCount: story.stoneCount ?? 1, massText: story.mass, massUnit: story.massUnit ?? "ct",
      balanceId: lab.instruments.get(isGrams ? "B2" : "B1")!, condition: story.condition ?? "None seen at 10×", declaredValue: story.declared ? story.declared * 100 : null,
      consents: story.consents ?? [...consents], seal: "",
    }],
  });
  const { db, laboratoryId } = desk;
  const [item] = await db.select({ id: items.id, number: items.number }).from(items).where(and(eq(items.laboratoryId, laboratoryId), eq(items.takeInId, takeInId)));
  const [stone] = await db.select({ id: stones.id, code: stones.code }).from(stones).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.itemId, item!.id))).orderBy(stones.sequence).limit(1);
  const stoneCode = stone!.code;
  if (story.photo && existsSync(photoFile(story.photo))) {
    later(2 * minuteMs);
    await addPhoto({ ...desk, now: clock }, { itemId: item!.id, bytes: readFileSync(photoFile(story.photo)), fileName: "stone.jpg", sourceKey: `demo-${stoneCode}` });
  }
  if (story.isPaid) await payAtDesk();
  if (!story.readings) return;

  later();
  await recordHandOver(lab.as(cast.examiner, clock), { requestId: newId<"custodyEvent">(), itemNumber: item!.number, purpose: "toBench", toPlace: "Bench 2", holder: undefined, massText: story.mass, massUnit: story.massUnit ?? "ct", seal: "", remark: "" });
  await readAll(cast.examiner, story.readings);
  for (const { onPlot, onPhoto, sizeMm, struckBecause, ...mark } of story.inclusions ?? []) {
    later();
    const examiner = lab.as(cast.examiner, clock);
    const [photo] = await db.select({ id: attachments.id }).from(attachments).where(and(eq(attachments.laboratoryId, laboratoryId), eq(attachments.itemId, item!.id)));
    const { sequence } = await recordInclusion(examiner, { ...mark, requestId: newId<"inclusion">(), stoneCode, otherText: "", size: sizeMm ? { value: Number(sizeMm), text: sizeMm } : null, onPlot: { side: "crown", at: onPlot }, onPhoto: onPhoto && photo ? { photoId: photo.id, at: onPhoto } : null });
    if (struckBecause) await strikeInclusion(examiner, { stoneCode, sequence, reason: struckBecause });
  }
  if (story.spectrum) {
    later();
    const { title, note, bands } = story.spectrum;
    await addSpectrum(lab.as(cast.examiner, clock), { requestId: newId<"spectrum">(), stoneCode, bytes: inventedSpectrum({ title, bands }), fileName: "table.jdx", note, assumed: { xUnit: "nm", yUnit: "absorbance" } });
  }
  if (!story.conclusion) return;
  await conclude(story.conclusion);
  if (!story.check) return;

  const check = story.check;
  // A sole practitioner checks a day later, and it is called a self-check.
  clock = new Date(Math.min(now.getTime(), clock.getTime() + (cast.checker === cast.examiner ? 25 * hourMs : stepMs * 4)));
  await checkAgain(check.readings, check.outcome ?? "agreed", check.reason ?? "");
  if (check.outcome === "returned") return;

  if (story.valuation) {
    later();
    const appraiser = lab.as(cast.appraiser, clock);
    const input = valuationOf(story, clock);
    if (story.valuation === "draft") await saveValuation(appraiser, { stoneCode, input: { ...input, certification: [], amountMinor: null } });
    else await saveAndSignValuation(appraiser, { stoneCode, input });
  }
  if (!story.report) return;
  const number = await authorise();
  if (story.report === "authorised") return;
  const first = await issue(number);
  if (story.report === "withdrawn") {
    later();
    await withdrawReport(lab.as(cast.owner, clock), { number: first, reason: "duplicate", note: "The same strand was reported under an older number." });
  }
  if (story.report === "superseded") {
    later();
    await reopenStone(lab.as(cast.owner, clock), { stoneCode, reason: "The colour was described under the wrong lamp; seen again in daylight." });
    await readAll(cast.examiner, [{ draft: { kind: "free", text: "Colour judged again in daylight 5500 K", quality: "good" }, instrument: null }]);
    await conclude({ ...story.conclusion, description: { ...story.conclusion.description, colour: "Yellowish green, medium, strong", colourLight: "daylight 5500 K" } });
    later();
    await checkAgain(check.readings, "agreed", "");
    await issue(await authorise());
  }
  if (story.isReleased) {
    later();
    await recordHandOver(lab.as(cast.desk, clock), { requestId: newId<"custodyEvent">(), itemNumber: item!.number, purpose: "toSafe", toPlace: "Safe 1", holder: undefined, massText: story.mass, massUnit: story.massUnit ?? "ct", seal: "", remark: "" });
    later();
    await releaseItem(lab.as(cast.desk, clock), { requestId: newId<"custodyEvent">(), itemNumber: item!.number, collectedBy: "the client", idSeen: "the receipt; known to us", massText: story.mass, massUnit: story.massUnit ?? "ct", isConditionAgreed: true, seal: "", remark: "" });
  }

  async function readAll(person: string, readings: readonly Reading[], isForSecondCheck = false): Promise<void> {
    for (const { draft, instrument, note, struckBecause } of readings) {
      later();
      const { sequence } = await recordReading(lab.as(person, clock), {
        requestId: newId<"observation">(), stoneCode, instrumentId: instrument ? lab.instruments.get(instrument)! : null, noResultReason: "", note: note ?? "", areCandidatesHidden: isForSecondCheck, draft, isForSecondCheck,
      });
      if (struckBecause) {
        later(2 * minuteMs);
        await strikeReading(lab.as(person, clock), { stoneCode, sequence, reason: struckBecause });
      }
    }
  }

  async function conclude(conclusion: Conclusion): Promise<void> {
    later();
    const [row] = await db.select({ version: stones.version }).from(stones).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)));
    const { description, ...rest } = conclusion;
    await proposeConclusion(lab.as(cast.examiner, clock), {
      stoneCode, requestId: newId<"conclusion">(), version: row!.version, variety: "", confidence: "identified", treatments: [], limits: [], contradictionsExplained: "", reasoning: "", ...rest,
      description: { shape: "", cut: "", transparency: "", colour: "", colourLight: "", phenomenon: "", condition: "None seen at 10×", ...description },
    });
  }

  async function checkAgain(readings: readonly Reading[], outcome: "agreed" | "returned", reason: string): Promise<void> {
    await startSecondCheck(lab.as(cast.checker, clock), { stoneCode, requestId: newId<"secondCheck">() });
    await readAll(cast.checker, readings, true);
    later();
    await compareSecondCheck(lab.as(cast.checker, clock), { stoneCode, ownSpecies: story.conclusion!.speciesName, ownNature: story.conclusion!.nature });
    later();
    await decideSecondCheck(lab.as(cast.checker, clock), { stoneCode, outcome, reason });
  }

  async function authorise(): Promise<string> {
    later();
    return authoriseReport(lab.as(story.isValuationWanted ? cast.appraiser : cast.examiner, clock), { stoneCode });
  }

  async function issue(number: string): Promise<string> {
    later();
    await renderQueuedReports({ db: lab.as(cast.owner, clock).db as Parameters<typeof renderQueuedReports>[0]["db"], services: desk.services, now: clock });
    const [report] = await db.select({ id: reports.id }).from(reports).where(and(eq(reports.laboratoryId, laboratoryId), eq(reports.number, number)));
    await issueReport({ ...lab.as(cast.owner, clock), actorId: null }, { reportId: report!.id as ReportId });
    return number;
  }

  async function payAtDesk(): Promise<void> {
    later(5 * minuteMs);
    const [invoice] = await db.select({ number: invoices.number }).from(invoices).where(and(eq(invoices.laboratoryId, laboratoryId), eq(invoices.takeInId, takeInId)));
    await recordDeskPayment(lab.as(cast.desk, clock), { number: invoice!.number, method: "transfer", reference: `bank ${invoice!.number}` });
  }
}

function valuationOf(story: Story, at: Date): ValuationInput {
  const on = at.toISOString().slice(0, 10);
  const priceOf = (amount: number) => amount * 100;
  const value = Math.round((story.declared ?? 1000) * 1.3);
  return {
    rowVersion: 0, purpose: "Insurance scheduling", intendedUse: "Scheduling on the owner’s policy", intendedUsers: "The client and their insurer",
    valueType: "retailReplacementNew", valueDefinition: "The price at which a new item of like kind and quality can usually be bought at retail, within a reasonable time, from a shop of the usual kind for it.",
    valueDefinitionSource: "the insurer’s own wording, as given by the client", marketLevel: "retailIndependent", marketPlace: "Port Ellery and its region",
    inspection: "In hand, loose, by the appraiser", inspectedOn: on, effectiveOn: on, currency: "EUR", amount: String(value), amountMinor: priceOf(value), isTaxIncluded: true,
    approachReasoning: "Three retail prices for stones of like size and colour, brought to this size; the middle one weighs most.", otherApproachesWhyNot: "The cost approach was not applied: the stone is not set. Income does not arise.",
    limitingConditions: ["For the stated use and date only.", "Treatments that the bench cannot determine are assumed to be the usual ones."], certification: [...certificationPoints], priorServices: "",
    comparables: [0.94, 1.02, 1.07].map((factor, index) => ({
      kind: "retailAsk" as const, reference: `Shop window ${index + 1}, seen ${on}`, onDate: on, place: "Port Ellery", description: `${story.description}, like size`, amount: String(Math.round(value * factor)), amountMinor: priceOf(Math.round(value * factor)),
      currency: "EUR" as const, exchangeRate: 1, isPremiumIncluded: false, isTaxIncluded: true, isSold: false, adjustmentFactor: 1, adjustmentReason: "",
    })),
  };
}
