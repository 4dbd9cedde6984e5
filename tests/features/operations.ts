import { createHash } from "node:crypto";
import { eq } from "drizzle-orm";
import sharp from "sharp";
import { newId } from "#app/db/new-id.server.ts";
import { reportFiles, reports, stones } from "#app/db/schema/index.ts";
import type { Operation } from "#app/domain/permissions.ts";
import { inviteClient } from "#app/features/accounts/invite-client.server.ts";
import { inviteStaff } from "#app/features/accounts/invite-staff.server.ts";
import { withdrawInvitation } from "#app/features/accounts/withdraw-invitation.server.ts";
import { endMembership } from "#app/features/laboratories/end-membership.server.ts";
import { getLaboratorySettings } from "#app/features/laboratories/get-laboratory-settings.server.ts";
import { listPrices } from "#app/features/laboratories/list-prices.server.ts";
import { listTeam } from "#app/features/laboratories/list-team.server.ts";
import { priceListMark } from "#app/features/laboratories/price-list-mark.ts";
import { setMemberRoles } from "#app/features/laboratories/set-member-roles.server.ts";
import { updateLaboratory } from "#app/features/laboratories/update-laboratory.server.ts";
import { updatePrices } from "#app/features/laboratories/update-prices.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { createClient } from "#app/features/clients/create-client.server.ts";
import { findClients } from "#app/features/clients/find-clients.server.ts";
import { getClient } from "#app/features/clients/get-client.server.ts";
import { grantTerms } from "#app/features/clients/grant-terms.server.ts";
import { listClients } from "#app/features/clients/list-clients.server.ts";
import { updateClient } from "#app/features/clients/update-client.server.ts";
import { getCustodyStanding } from "#app/features/custody/get-custody-standing.server.ts";
import { listCustody } from "#app/features/custody/list-custody.server.ts";
import { listHolders } from "#app/features/custody/list-holders.server.ts";
import { recordHandOver } from "#app/features/custody/record-hand-over.server.ts";
import { releaseItem } from "#app/features/custody/release-item.server.ts";
import { editInstrument } from "#app/features/instruments/edit-instrument.server.ts";
import { endCorrection } from "#app/features/instruments/end-correction.server.ts";
import { findBalances } from "#app/features/instruments/find-balances.server.ts";
import { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { listInstruments } from "#app/features/instruments/list-instruments.server.ts";
import { previewCorrection } from "#app/features/instruments/preview-correction.server.ts";
import { recordInstrumentCheck } from "#app/features/instruments/record-instrument-check.server.ts";
import { addMicroscopePhoto } from "#app/features/inclusions/add-microscope-photo.server.ts";
import { getInclusions } from "#app/features/inclusions/get-inclusions.server.ts";
import { recordInclusion, type RecordInclusion } from "#app/features/inclusions/record-inclusion.server.ts";
import { setPhotoScale } from "#app/features/inclusions/set-photo-scale.server.ts";
import { setStoneOutline } from "#app/features/inclusions/set-stone-outline.server.ts";
import { strikeInclusion } from "#app/features/inclusions/strike-inclusion.server.ts";
import { registerInstrument } from "#app/features/instruments/register-instrument.server.ts";
import { startCorrection } from "#app/features/instruments/start-correction.server.ts";
import { getInvoice } from "#app/features/invoices/get-invoice.server.ts";
import { listInvoices } from "#app/features/invoices/list-invoices.server.ts";
import { recordDeskPayment } from "#app/features/invoices/record-desk-payment.server.ts";
import { refundInvoice } from "#app/features/invoices/refund-invoice.server.ts";
import { sendInvoice } from "#app/features/invoices/send-invoice.server.ts";
import { voidInvoice } from "#app/features/invoices/void-invoice.server.ts";
import { getParcel } from "#app/features/parcels/get-parcel.server.ts";
import { listParcels } from "#app/features/parcels/list-parcels.server.ts";
import { nameParcelItem } from "#app/features/parcels/name-parcel-item.server.ts";
import { openParcelStone } from "#app/features/parcels/open-parcel-stone.server.ts";
import { saveParcel } from "#app/features/parcels/save-parcel.server.ts";
import { addPhoto } from "#app/features/photos/add-photo.server.ts";
import { findItemForPhoto } from "#app/features/photos/find-item-for-photo.server.ts";
import { getPhoto } from "#app/features/photos/get-photo.server.ts";
import { removePhoto } from "#app/features/photos/remove-photo.server.ts";
import { listRecall } from "#app/features/recalls/list-recall.server.ts";
import { workRecall } from "#app/features/recalls/work-recall.server.ts";
import { addReferenceMaterial } from "#app/features/reference-materials/add-reference-material.server.ts";
import { editReferenceMaterial } from "#app/features/reference-materials/edit-reference-material.server.ts";
import { getReferenceMaterial } from "#app/features/reference-materials/get-reference-material.server.ts";
import { listReferenceMaterials } from "#app/features/reference-materials/list-reference-materials.server.ts";
import { authoriseReport } from "#app/features/reports/authorise-report.server.ts";
import { getReport } from "#app/features/reports/get-report.server.ts";
import { issueReportByNumber } from "#app/features/reports/issue-report-by-number.server.ts";
import { listReports } from "#app/features/reports/list-reports.server.ts";
import { previewReport } from "#app/features/reports/preview-report.server.ts";
import { readReportPdf } from "#app/features/reports/read-report-pdf.server.ts";
import { reopenStone } from "#app/features/reports/reopen-stone.server.ts";
import { retryPdf } from "#app/features/reports/retry-pdf.server.ts";
import { withdrawReport } from "#app/features/reports/withdraw-report.server.ts";
import { getConclusion } from "#app/features/identification/get-conclusion.server.ts";
import { proposeConclusion } from "#app/features/identification/propose-conclusion.server.ts";
import { getStonePlace } from "#app/features/identification/get-stone-place.server.ts";
import { rankStone } from "#app/features/identification/rank-stone.server.ts";
import { listReadings } from "#app/features/readings/list-readings.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { compareSecondCheck } from "#app/features/second-checks/compare-second-check.server.ts";
import { decideSecondCheck } from "#app/features/second-checks/decide-second-check.server.ts";
import { startSecondCheck } from "#app/features/second-checks/start-second-check.server.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { getStoneMark } from "#app/features/stones/get-stone-mark.server.ts";
import { listOfferedServices } from "#app/features/take-ins/list-offered-services.server.ts";
import { addSpectrum } from "#app/features/spectra/add-spectrum.server.ts";
import { listSpectra } from "#app/features/spectra/list-spectra.server.ts";
import { readSpectrumSource } from "#app/features/spectra/read-spectrum-source.server.ts";
import { withdrawSpectrum } from "#app/features/spectra/withdraw-spectrum.server.ts";
import { listStones } from "#app/features/stones/list-stones.server.ts";
import { getLetterhead } from "#app/features/take-ins/get-letterhead.server.ts";
import { getTakeIn } from "#app/features/take-ins/get-take-in.server.ts";
import { takeInItems } from "#app/features/take-ins/take-in-items.server.ts";
import { getValuation } from "#app/features/valuations/get-valuation.server.ts";
import { saveValuation } from "#app/features/valuations/save-valuation.server.ts";
import { signValuation } from "#app/features/valuations/sign-valuation.server.ts";
import type { ValuationInput } from "#app/features/valuations/valuation-forms.server.ts";
import { aRequestId } from "../setup/an-app.ts";
import { aBench, aReading, corundum } from "../setup/bench-factory.ts";
import { aParcel, aParcelDraft, howRead } from "../setup/parcel-factory.ts";
import { aConcludedStone, aConclusion } from "../setup/conclusion-factory.ts";
import { anInvoice } from "../setup/an-invoice.ts";
import { aCorrectedInstrument, aRecalledReading, aReference, referenceDetails } from "../setup/instrument-factory.ts";
import { aClient, aMember, anInstrument } from "../setup/factories.ts";
import { aTakenInItem, itemInput, takeInInput } from "../setup/take-in-factory.ts";

/** One feature operation, so that permission-matrix.test.ts can run it as every role and against another laboratory's rows. */
export type OperationEntry<Ids> = {
  /** Of the function, which names its file. */
  name: string;
  operation: Operation;
  /** Makes what the call needs, as an owner with every role. */
  rows: (lab: LabContext) => Promise<Ids>;
  call: (ctx: LabContext, ids: Ids) => Promise<unknown>;
  /** It names no row, so another laboratory's cannot be asked for. */
  hasNoIds?: true;
  /** With the role, it may still be refused for the state the rows are in; "absent": for a part that `rows` does not make; "notTheirs": for being somebody else's. */
  mayBeRefused?: true | "absent" | "notTheirs";
  /** A list below a row: or what may not be there yet: of another laboratory's row it is empty instead of not found. */
  isEmptyElsewhere?: "list" | "null";
};

/** Keeps the type of `rows` and `call` together and forgets it in the list. */
function entry<Ids>(described: OperationEntry<Ids>): OperationEntry<unknown> {
  return described as OperationEntry<unknown>;
}

const nothing = async () => undefined;
const settings = { name: "Renamed", addressLines: ["1 Row"], phone: "", email: "", timeZone: "UTC", isSolePractice: false, taxLabel: "VAT", taxShareE4: 0, usualDays: 5, selfCheckDelayHours: 24, custodyLimitMinor: null, version: 1 };
const anInvitation = () => ({ name: "Odo", email: `${aRequestId()}@example.test`, title: "", roles: ["desk"] as const, requestId: aRequestId() });

const clientDetails = { name: "Ferro & Daughters", contactName: "", email: "", phone: "", addressLines: ["4 Quay"], note: "" };
const instrumentDetails = () => ({ kind: "refractometer" as const, name: `R-${aRequestId().slice(-8)}`, description: "", serial: "", location: "", resolution: 0.001, standardUncertainty: 0.0015, upperLimit: 1.81, prismIndex: null });
const mass = { massText: "2.143", massUnit: "ct", seal: "", remark: "" } as const;
const anItem = (lab: LabContext) => aTakenInItem(lab);
const aStoneCode = async (lab: LabContext) => (await aTakenInItem(lab)).stoneCodes[0]!;
const anInvoiceNumber = async (lab: LabContext) => (await anInvoice(lab)).number;
const valuation: ValuationInput = {
  rowVersion: 0, purpose: "Insurance", intendedUse: "Insurance", intendedUsers: "The owner", valueType: "retailReplacementNew", valueDefinition: "As defined", valueDefinitionSource: "House definition", marketLevel: "retailIndependent", marketPlace: "Port Ellery",
  inspection: "In hand", inspectedOn: null, effectiveOn: "2026-12-01", currency: "EUR", amount: "", amountMinor: null, isTaxIncluded: false, approachReasoning: "", otherApproachesWhyNot: "", limitingConditions: [], certification: [], priorServices: "", comparables: [],
};

async function aPicture(): Promise<Buffer> {
  return sharp({ create: { width: 32, height: 32, channels: 3, background: "#b3154a" } }).jpeg().toBuffer();
}

const anInclusion = (stoneCode: string): RecordInclusion => ({ requestId: newId<"inclusion">(), stoneCode, type: "needle", otherText: "", onPhoto: null, onPlot: { side: "crown", at: { x: 0.4, y: 0.6 } }, depth: "middle", amount: "one", size: null, note: "" });
const aSpectrum = (stoneCode: string) => ({ requestId: newId<"spectrum">(), stoneCode, bytes: Buffer.from("400;1\n401;2\n402;4\n403;2\n404;1"), fileName: "a.csv", note: "", assumed: { xUnit: "nm", yUnit: "absorbance" } }) as const;

async function aMeasuredStone(lab: LabContext): Promise<string> {
  const stoneCode = await aStoneCode(lab);
  await addSpectrum(lab, aSpectrum(stoneCode));
  return stoneCode;
}

async function aPhoto(lab: LabContext) {
  const { itemId } = await aTakenInItem(lab);
  return addPhoto(lab, { itemId, bytes: await aPicture(), fileName: "photo.jpg", sourceKey: "upload-1" });
}

/** A report as the database holds it; what it says does not matter here. */
async function aReportNumber(lab: LabContext): Promise<string> {
  const code = await aStoneCode(lab);
  const [stone] = await lab.db.select({ id: stones.id, clientId: stones.clientId }).from(stones).where(eq(stones.code, code));
  const number = `${lab.laboratory.prefix}-R-26-00001`;
  const id = newId<"report">();
  await lab.db.insert(reports).values({ laboratoryId: lab.laboratoryId, id, number, kind: "identification", stoneId: stone!.id, clientId: stone!.clientId, state: "issued", version: 1, pdfState: "failed", authorisedBy: lab.actorId, authorisedAt: lab.now, issuedAt: lab.now, createdAt: lab.now });
  await lab.db.insert(reportFiles).values({ laboratoryId: lab.laboratoryId, reportId: id, pdf: Buffer.from("%PDF-"), sha256: createHash("sha256").update("%PDF-").digest(), sizeBytes: 5, templateVersion: "test", renderedAt: lab.now });
  return number;
}

/** One entry an operation. */
export const operationEntries: ReadonlyArray<OperationEntry<unknown>> = [
  // laboratories
  entry({ name: "getLaboratorySettings", operation: "laboratory.manage", rows: nothing, call: (ctx) => getLaboratorySettings(ctx), hasNoIds: true }),
  entry({ name: "updateLaboratory", operation: "laboratory.manage", rows: nothing, call: (ctx) => updateLaboratory(ctx, settings), hasNoIds: true }),
  entry({ name: "listTeam", operation: "team.manage", rows: nothing, call: (ctx) => listTeam(ctx), hasNoIds: true }),
  entry({
    name: "setMemberRoles",
    operation: "team.manage",
    rows: async (lab) => (await aMember(lab, ["desk"])).actorId,
    call: (ctx, userId) => setMemberRoles(ctx, { userId, roles: ["appraiser"], title: "Valuer", rolesBefore: ["desk"], titleBefore: "Gemmologist" }),
  }),
  entry({ name: "endMembership", operation: "team.manage", rows: async (lab) => (await aMember(lab, ["desk"])).actorId, call: (ctx, userId) => endMembership(ctx, { userId }) }),
  entry({ name: "listPrices", operation: "prices.read", rows: nothing, call: (ctx) => listPrices(ctx), hasNoIds: true }),
  entry({
    name: "updatePrices",
    operation: "prices.manage",
    rows: async (lab) => listPrices(lab),
    call: (ctx, list) => updatePrices(ctx, { before: priceListMark(list), changes: list.map((price) => ({ ...price, amountMinor: 100 })) }),
    hasNoIds: true,
  }),

  // accounts
  entry({ name: "inviteStaff", operation: "team.manage", rows: nothing, call: (ctx) => inviteStaff(ctx, anInvitation()), hasNoIds: true }),
  entry({
    name: "withdrawInvitation",
    operation: "team.manage",
    rows: async (lab) => {
      await inviteStaff(lab, anInvitation());
      return (await listTeam(lab)).invitations[0]!.id;
    },
    call: (ctx, invitationId) => withdrawInvitation(ctx, { invitationId }),
  }),
  entry({ name: "inviteClient", operation: "clients.manage", rows: (lab) => aClient(lab), call: (ctx, clientId) => inviteClient(ctx, { clientId, requestId: newId() }) }),

  // clients
  entry({ name: "createClient", operation: "clients.manage", rows: nothing, call: (ctx) => createClient(ctx, { ...clientDetails, requestId: newId<"client">() }), hasNoIds: true }),
  entry({ name: "findClients", operation: "clients.read", rows: nothing, call: (ctx) => findClients(ctx, "fer"), hasNoIds: true }),
  entry({ name: "listClients", operation: "clients.read", rows: nothing, call: (ctx) => listClients(ctx), hasNoIds: true }),
  entry({ name: "getClient", operation: "clients.read", rows: (lab) => aClient(lab), call: (ctx, id) => getClient(ctx, id) }),
  entry({ name: "updateClient", operation: "clients.manage", rows: (lab) => aClient(lab), call: (ctx, id) => updateClient(ctx, id, { ...clientDetails, version: 1 }) }),
  entry({ name: "grantTerms", operation: "clients.grantTerms", rows: (lab) => aClient(lab), call: (ctx, id) => grantTerms(ctx, id, { terms: "account", version: 1 }) }),

  // take-in and custody
  entry({ name: "takeInItems", operation: "takeIn.create", rows: (lab) => takeInInput(lab), call: async (ctx, input) => takeInItems(ctx, { ...input, items: [itemInput(await anInstrument(ctx))] }), mayBeRefused: true }),
  entry({ name: "getTakeIn", operation: "takeIn.read", rows: anItem, call: (ctx, { takeInNumber }) => getTakeIn(ctx, takeInNumber) }),
  entry({ name: "getLetterhead", operation: "takeIn.read", rows: nothing, call: (ctx) => getLetterhead(ctx), hasNoIds: true }),
  entry({ name: "getCustodyStanding", operation: "declaredValue.read", rows: nothing, call: (ctx) => getCustodyStanding(ctx), hasNoIds: true }),
  entry({ name: "listHolders", operation: "takeIn.read", rows: nothing, call: (ctx) => listHolders(ctx), hasNoIds: true }),
  entry({ name: "listCustody", operation: "takeIn.read", rows: anItem, call: (ctx, { itemNumber }) => listCustody(ctx, itemNumber), isEmptyElsewhere: "list" }),
  entry({
    name: "recordHandOver",
    operation: "custody.record",
    rows: anItem,
    call: (ctx, { itemNumber }) => recordHandOver(ctx, { ...mass, requestId: newId<"custodyEvent">(), itemNumber, purpose: "toBench", toPlace: "Bench 2", holder: undefined }),
  }),
  entry({
    name: "releaseItem",
    operation: "custody.release",
    rows: anItem,
    call: (ctx, { itemNumber }) => releaseItem(ctx, { ...mass, requestId: newId<"custodyEvent">(), itemNumber, collectedBy: "L. Ardenne", idSeen: "passport", isConditionAgreed: true }),
    mayBeRefused: true,
  }),
  entry({ name: "listStones", operation: "stones.read", rows: nothing, call: (ctx) => listStones(ctx), hasNoIds: true }),

  entry({ name: "listOfferedServices", operation: "prices.read", rows: nothing, call: (ctx) => listOfferedServices(ctx), hasNoIds: true }),

  // bench
  entry({ name: "getBench", operation: "stones.read", rows: aStoneCode, call: (ctx, stoneCode) => getBench(ctx, { stoneCode }) }),
  entry({ name: "getStoneMark", operation: "stones.read", rows: aStoneCode, call: (ctx, stoneCode) => getStoneMark(ctx, { stoneCode }) }),
  entry({ name: "listReadings", operation: "readings.read", rows: aStoneCode, call: (ctx, stoneCode) => listReadings(ctx, { stoneCode }), isEmptyElsewhere: "list" }),
  entry({ name: "getStonePlace", operation: "readings.read", rows: (lab) => aBench(lab), call: (ctx, bench) => getStonePlace(ctx, bench) }),
  entry({ name: "rankStone", operation: "readings.read", rows: nothing, call: (ctx) => rankStone(ctx, { readings: [] }), hasNoIds: true }),
  entry({ name: "recordReading", operation: "readings.record", rows: (lab) => aBench(lab), call: (ctx, bench) => recordReading(ctx, aReading(bench, corundum.free)) }),
  entry({
    name: "strikeReading",
    operation: "readings.record",
    rows: async (lab) => {
      const bench = await aBench(lab);
      const { sequence } = await recordReading(lab, aReading(bench, corundum.free));
      return { stoneCode: bench.stoneCode, sequence };
    },
    call: (ctx, { stoneCode, sequence }) => strikeReading(ctx, { stoneCode, sequence, reason: "liquid edge" }),
    mayBeRefused: "notTheirs",
  }),
  entry({ name: "getConclusion", operation: "conclusions.read", rows: async (lab) => (await aConcludedStone(lab)).stoneCode, call: (ctx, stoneCode) => getConclusion(ctx, { stoneCode }), isEmptyElsewhere: "null" }),
  entry({
    name: "proposeConclusion",
    operation: "conclusions.propose",
    rows: async (lab) => {
      const bench = await aBench(lab);
      return aConclusion(lab, bench);
    },
    call: (ctx, conclusion) => proposeConclusion(ctx, conclusion),
    mayBeRefused: true,
  }),
  entry({ name: "startSecondCheck", operation: "secondChecks.do", rows: async (lab) => (await aConcludedStone(lab)).stoneCode, call: (ctx, stoneCode) => startSecondCheck(ctx, { stoneCode, requestId: newId<"secondCheck">() }) }),
  entry({
    name: "compareSecondCheck",
    operation: "secondChecks.do",
    rows: async (lab) => (await aConcludedStone(lab)).stoneCode,
    call: (ctx, stoneCode) => compareSecondCheck(ctx, { stoneCode, ownSpecies: "Corundum", ownNature: "synthetic" }),
    mayBeRefused: "absent",
  }),
  entry({
    name: "decideSecondCheck",
    operation: "secondChecks.do",
    rows: async (lab) => (await aConcludedStone(lab)).stoneCode,
    call: (ctx, stoneCode) => decideSecondCheck(ctx, { stoneCode, outcome: "agreed", reason: "" }),
    mayBeRefused: "absent",
  }),

  // inclusions
  entry({ name: "recordInclusion", operation: "readings.record", rows: aStoneCode, call: (ctx, stoneCode) => recordInclusion(ctx, anInclusion(stoneCode)) }),
  entry({ name: "getInclusions", operation: "readings.read", rows: aStoneCode, call: (ctx, stoneCode) => getInclusions(ctx, { stoneCode }) }),
  entry({
    name: "strikeInclusion",
    operation: "readings.record",
    rows: async (lab) => {
      const stoneCode = await aStoneCode(lab);
      await recordInclusion(lab, anInclusion(stoneCode));
      return stoneCode;
    },
    call: (ctx, stoneCode) => strikeInclusion(ctx, { stoneCode, sequence: 1, reason: "dust" }),
    mayBeRefused: "notTheirs",
  }),
  entry({ name: "setStoneOutline", operation: "readings.record", rows: aStoneCode, call: (ctx, stoneCode) => setStoneOutline(ctx, { stoneCode, outline: "pear" }) }),
  entry({
    name: "addMicroscopePhoto",
    operation: "readings.record",
    rows: aStoneCode,
    call: async (ctx, stoneCode) => addMicroscopePhoto(ctx, { stoneCode, bytes: await aPicture(), fileName: "a.jpg", sourceKey: "form:1", magnificationX: 40, pictureWidthMm: 4.2 }),
  }),
  entry({
    name: "setPhotoScale",
    operation: "readings.record",
    rows: async (lab) => {
      const stoneCode = await aStoneCode(lab);
      return { stoneCode, photoId: await addMicroscopePhoto(lab, { stoneCode, bytes: await aPicture(), fileName: "a.jpg", sourceKey: "form:1", magnificationX: null, pictureWidthMm: null }) };
    },
    call: (ctx, ids) => setPhotoScale(ctx, { ...ids, magnificationX: 40, pictureWidthMm: 4.2 }),
  }),

  // measured spectra
  entry({ name: "addSpectrum", operation: "readings.record", rows: aStoneCode, call: (ctx, stoneCode) => addSpectrum(ctx, aSpectrum(stoneCode)) }),
  entry({ name: "listSpectra", operation: "readings.read", rows: aMeasuredStone, call: (ctx, stoneCode) => listSpectra(ctx, { stoneCode }), isEmptyElsewhere: "list" }),
  entry({ name: "readSpectrumSource", operation: "readings.read", rows: aMeasuredStone, call: (ctx, stoneCode) => readSpectrumSource(ctx, { stoneCode, sequence: 1 }) }),
  entry({ name: "withdrawSpectrum", operation: "readings.record", rows: aMeasuredStone, call: (ctx, stoneCode) => withdrawSpectrum(ctx, { stoneCode, sequence: 1, reason: "of another stone" }) }),
  // parcels
  entry({ name: "listParcels", operation: "readings.read", rows: nothing, call: (ctx) => listParcels(ctx), hasNoIds: true }),
  entry({ name: "saveParcel", operation: "readings.record", rows: nothing, call: (ctx) => saveParcel(ctx, aParcelDraft()), hasNoIds: true }),
  entry({ name: "getParcel", operation: "readings.read", rows: (lab) => aParcel(lab), call: (ctx, { parcelId }) => getParcel(ctx, parcelId) }),
  entry({ name: "nameParcelItem", operation: "readings.record", rows: async (lab) => ({ ...(await aParcel(lab, { itemNumber: "" })), ...(await anItem(lab)) }), call: (ctx, { parcelId, itemNumber }) => nameParcelItem(ctx, parcelId, { itemNumber }) }),
  entry({ name: "openParcelStone", operation: "readings.record", rows: (lab) => aParcel(lab), call: (ctx, { parcelId, instruments }) => openParcelStone(ctx, parcelId, { ...howRead(instruments), position: 1 }) }),

  // photographs
  entry({ name: "findItemForPhoto", operation: "photos.add", rows: anItem, call: (ctx, { itemNumber }) => findItemForPhoto(ctx, itemNumber) }),
  entry({ name: "addPhoto", operation: "photos.add", rows: anItem, call: async (ctx, { itemId }) => addPhoto(ctx, { itemId, bytes: await aPicture(), fileName: "photo.jpg", sourceKey: "upload-2" }) }),
  entry({ name: "getPhoto", operation: "stones.read", rows: aPhoto, call: (ctx, id) => getPhoto(ctx, id, "full") }),
  entry({ name: "removePhoto", operation: "photos.add", rows: aPhoto, call: (ctx, id) => removePhoto(ctx, id) }),

  // instruments
  entry({ name: "registerInstrument", operation: "instruments.manage", rows: nothing, call: (ctx) => registerInstrument(ctx, { ...instrumentDetails(), requestId: newId<"instrument">() }), hasNoIds: true }),
  entry({ name: "listInstruments", operation: "instruments.read", rows: nothing, call: (ctx) => listInstruments(ctx), hasNoIds: true }),
  entry({ name: "findBalances", operation: "instruments.read", rows: nothing, call: (ctx) => findBalances(ctx), hasNoIds: true }),
  entry({ name: "getInstrument", operation: "instruments.read", rows: (lab) => anInstrument(lab), call: (ctx, id) => getInstrument(ctx, id) }),
  entry({ name: "editInstrument", operation: "instruments.manage", rows: (lab) => anInstrument(lab), call: (ctx, id) => editInstrument(ctx, id, { ...instrumentDetails(), version: 1, status: "inService", statusReason: "" }) }),
  entry({
    name: "recordInstrumentCheck",
    operation: "instruments.manage",
    rows: (lab) => anInstrument(lab),
    call: (ctx, id) =>
      recordInstrumentCheck(ctx, id, { requestId: newId<"instrumentCheck">(), referenceMaterial: "Quartz", nominal: { value: 1.544, text: "1.544" }, reading: { value: 1.544, text: "1.544" }, limit: { value: 0.001, text: "0.001" }, tempC: 21, nextDueOn: "2026-12-08", note: "" }),
  }),
  entry({ name: "previewCorrection", operation: "instruments.manage", rows: (lab) => aCorrectedInstrument(lab), call: (ctx, { instrumentId, checkIds }) => previewCorrection(ctx, instrumentId, { checkIds, model: "offset" }) }),
  entry({
    name: "startCorrection",
    operation: "instruments.manage",
    rows: (lab) => aCorrectedInstrument(lab),
    call: (ctx, { instrumentId, checkIds }) => startCorrection(ctx, instrumentId, { requestId: newId<"instrumentCorrection">(), checkIds, model: "offset", reason: "new prism" }),
  }),
  entry({ name: "endCorrection", operation: "instruments.manage", rows: (lab) => aCorrectedInstrument(lab), call: (ctx, { instrumentId }) => endCorrection(ctx, instrumentId, { reason: "serviced" }) }),
  entry({ name: "listReferenceMaterials", operation: "instruments.read", rows: nothing, call: (ctx) => listReferenceMaterials(ctx), hasNoIds: true }),
  entry({ name: "getReferenceMaterial", operation: "instruments.read", rows: (lab) => aReference(lab), call: (ctx, id) => getReferenceMaterial(ctx, id) }),
  entry({ name: "addReferenceMaterial", operation: "instruments.manage", rows: nothing, call: (ctx) => addReferenceMaterial(ctx, { ...referenceDetails(), requestId: newId<"referenceMaterial">() }), hasNoIds: true }),
  entry({ name: "editReferenceMaterial", operation: "instruments.manage", rows: (lab) => aReference(lab), call: (ctx, id) => editReferenceMaterial(ctx, id, { ...referenceDetails(), isRetired: true, version: 1 }) }),

  // recall
  entry({ name: "listRecall", operation: "readings.read", rows: nothing, call: (ctx) => listRecall(ctx), hasNoIds: true }),
  entry({ name: "workRecall", operation: "instruments.manage", rows: (lab) => aRecalledReading(lab), call: (ctx, { stoneCode, sequence }) => workRecall(ctx, { items: [{ stoneCode, sequence }], deed: "accepted", reason: "The block was dirty, not the scale." }) }),

  // invoices
  entry({ name: "listInvoices", operation: "invoices.read", rows: nothing, call: (ctx) => listInvoices(ctx, {}), hasNoIds: true }),
  entry({ name: "getInvoice", operation: "invoices.read", rows: anInvoiceNumber, call: (ctx, number) => getInvoice(ctx, { number }) }),
  entry({ name: "sendInvoice", operation: "invoices.manage", rows: anInvoiceNumber, call: (ctx, number) => sendInvoice(ctx, { number }) }),
  entry({ name: "recordDeskPayment", operation: "invoices.manage", rows: anInvoiceNumber, call: (ctx, number) => recordDeskPayment(ctx, { number, method: "cash", reference: "slip 1" }) }),
  entry({ name: "voidInvoice", operation: "invoices.manage", rows: anInvoiceNumber, call: (ctx, number) => voidInvoice(ctx, { number, reason: "made by mistake" }), mayBeRefused: true }),
  entry({
    name: "refundInvoice",
    operation: "invoices.manage",
    rows: async (lab) => {
      const number = await anInvoiceNumber(lab);
      await recordDeskPayment(lab, { number, method: "cash", reference: "slip 1" });
      return number;
    },
    call: (ctx, number) => refundInvoice(ctx, { number, reason: "given back" }),
  }),

  // valuations
  entry({ name: "getValuation", operation: "valuations.read", rows: aStoneCode, call: (ctx, stoneCode) => getValuation(ctx, { stoneCode }) }),
  entry({ name: "saveValuation", operation: "valuations.write", rows: aStoneCode, call: (ctx, stoneCode) => saveValuation(ctx, { stoneCode, input: valuation }), mayBeRefused: true }),
  entry({ name: "signValuation", operation: "valuations.write", rows: aStoneCode, call: (ctx, stoneCode) => signValuation(ctx, { stoneCode, rowVersion: 1 }), mayBeRefused: "absent" }),

  // reports
  entry({ name: "authoriseReport", operation: "reports.authoriseIdentification", rows: aStoneCode, call: (ctx, stoneCode) => authoriseReport(ctx, { stoneCode }), mayBeRefused: true }),
  entry({ name: "previewReport", operation: "conclusions.read", rows: aStoneCode, call: (ctx, stoneCode) => previewReport(ctx, { stoneCode }), mayBeRefused: true }),
  entry({ name: "listReports", operation: "reports.read", rows: nothing, call: (ctx) => listReports(ctx, {}), hasNoIds: true }),
  entry({ name: "getReport", operation: "reports.read", rows: aReportNumber, call: (ctx, number) => getReport(ctx, { number }) }),
  entry({ name: "readReportPdf", operation: "reports.read", rows: aReportNumber, call: (ctx, number) => readReportPdf(ctx, { number }) }),
  entry({ name: "issueReportByNumber", operation: "reports.issue", rows: aReportNumber, call: (ctx, number) => issueReportByNumber(ctx, { number }), mayBeRefused: true }),
  entry({ name: "retryPdf", operation: "reports.issue", rows: aReportNumber, call: (ctx, number) => retryPdf(ctx, { number }) }),
  entry({ name: "withdrawReport", operation: "reports.withdraw", rows: aReportNumber, call: (ctx, number) => withdrawReport(ctx, { number, reason: "identityError", note: "wrong stone" }) }),
  entry({ name: "reopenStone", operation: "reports.withdraw", rows: aStoneCode, call: (ctx, stoneCode) => reopenStone(ctx, { stoneCode, reason: "amend" }), mayBeRefused: true }),
];
