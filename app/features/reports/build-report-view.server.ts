import { calendarDateIn, formatCalendarDate } from "#app/domain/calendar-date.ts";
import { confidenceNames, limitNames, treatmentNames, type LimitCode, type TreatmentFinding } from "#app/domain/conclusion.ts";
import { decimalPlaces } from "#app/domain/decimal.ts";
import { conclusionStatement } from "#app/domain/conclusion-statement.ts";
import type { StoneId, UserId } from "#app/domain/ids.ts";
import type { ReadingDetail, ReadingValueName } from "#app/domain/reading.ts";
import { formatRegisterCode, type RegisterCode } from "#app/domain/register-code.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import type { ReportRow, ReportSignature, ReportView } from "#app/reports/report-view.ts";
import { loadReportMatter, type ReportMatter } from "./load-report-matter.server.ts";
import { observationRows, type ReportedReading } from "./observation-rows.ts";
import { valuationView } from "./valuation-view.ts";

type Frame = {
  stoneId: StoneId;
  kind: ReportView["kind"];
  number: string;
  version: number;
  code: RegisterCode;
  /** Calendar date, 2026-12-01. */
  reportOn: string;
  supersedesNumber: string | null;
  isDraft?: boolean;
};

/** Freezes what a report says. Inside the transaction of the authorisation, so that nothing moves meanwhile. */
export async function buildReportView(scope: LabScope, frame: Frame): Promise<ReportView> {
  const matter = await loadReportMatter(scope, { stoneId: frame.stoneId });
  const { stone, item, takeIn, client, laboratory, conclusion } = matter;
  const dayOf = (instant: Date) => formatCalendarDate(calendarDateIn(instant, laboratory.timeZone));
  const readings = groupReadings(matter);
  const { title, statements } = conclusionStatement(conclusion);
  const { description } = conclusion;
  return {
    kind: frame.kind,
    laboratory: { name: laboratory.name, mark: laboratory.prefix.slice(0, 3), addressLines: laboratory.addressLines, phone: laboratory.phone, email: laboratory.email },
    number: frame.number,
    version: frame.version,
    reportOn: formatCalendarDate(frame.reportOn),
    receivedOn: dayOf(takeIn.receivedAt),
    examinedOn: period(matter.readings.map(({ observation }) => observation.observedAt), dayOf) || dayOf(conclusion.concludedAt),
    timeZone: laboratory.timeZone,
    clientName: client.name,
    stoneCode: formatStoneCode(stone.code),
    receiptNumber: takeIn.number,
    asReceived: stone.description,
    conclusion: { title, statements, confidence: confidenceNames[conclusion.confidence] },
    description: [
      ...massAndSize(readings, { isMounted: stone.isMounted, itemMass: `${item.massText} ${item.massUnit}` }),
      row("Shape and cut", [description.shape, description.cut].filter(Boolean).join(", ")),
      row("Transparency", description.transparency),
      row("Colour", [description.colour, description.colourLight ? `in ${description.colourLight}` : ""].filter(Boolean).join(", ")),
      row("Phenomenon", description.phenomenon),
      row("Condition", description.condition),
    ].filter(({ parts }) => parts.some(({ text }) => text !== "")),
    observations: observationRows(readings),
    treatments: treatmentAnswers(conclusion.treatments),
    evidence: conclusion.evidence,
    natureEvidence: conclusion.natureEvidence,
    rejected: conclusion.rejected,
    limits: conclusion.limits.map((code) => limitNames[code as LimitCode] ?? code),
    instruments: instrumentLines(matter, dayOf),
    clientStatements: takeIn.clientStatements,
    cautions: careNotes(conclusion.treatments),
    photograph: matter.photo ? { caption: `${matter.photo.caption ? `${matter.photo.caption}. ` : ""}Photographed ${dayOf(matter.photo.createdAt)}. Not to scale.` } : null,
    signatures: signatures(scope, matter, dayOf),
    verification: { url: `${scope.services.publicOrigin}/v/${frame.code}`, code: formatRegisterCode(frame.code) },
    amendment: frame.supersedesNumber ? { supersedesNumber: frame.supersedesNumber, reason: matter.amendmentReason } : null,
    versions: { speciesTable: conclusion.speciesTableVersion, rankingModel: conclusion.modelVersion },
    authorisedAt: scope.now.toISOString(),
    isDraft: frame.isDraft ?? false,
    valuation: matter.valuation ? valuationView(matter.valuation, matter.comparables) : null,
  };
}

function groupReadings({ readings }: ReportMatter): ReportedReading[] {
  const byId = new Map<string, ReportedReading & { values: Map<ReadingValueName, { value: number; standardUncertainty: number | null; typedText: string }> }>();
  for (const { observation, value } of readings) {
    const reading = byId.get(observation.id) ?? { detail: observation.detail as ReadingDetail, quality: observation.quality, noResultReason: observation.noResultReason, values: new Map() };
    if (value) reading.values.set(value.name as ReadingValueName, value);
    byId.set(observation.id, reading);
  }
  return [...byId.values()];
}

const row = (label: string, text: string, isMono = false): ReportRow => ({ label, parts: [{ text, isMono }] });

function massAndSize(readings: readonly ReportedReading[], { isMounted, itemMass }: { isMounted: boolean; itemMass: string }): ReportRow[] {
  const weight = readings.findLast(({ detail, values }) => detail.kind === "weight" && values.has("weightCt"))?.values.get("weightCt");
  const size = readings.findLast(({ detail, values }) => detail.kind === "dimensions" && values.has("lengthMm"))?.values;
  const millimetres = size && ["lengthMm", "widthMm", "depthMm"].flatMap((name) => size.get(name as ReadingValueName) ?? []).map(({ value }) => value.toFixed(2));
  const mass = weight ? row("Weight", `${weight.value.toFixed(decimalPlaces(weight.typedText))} ct`, true) : row(isMounted ? "Weight with the setting" : "Weight as received", itemMass, true);
  return [mass, row("Dimensions", millimetres?.length ? `${millimetres.join(" × ")} mm` : "", true)];
}

function treatmentAnswers(findings: readonly TreatmentFinding[]): ReportView["treatments"] {
  const told = (wanted: readonly TreatmentFinding["status"][]) =>
    findings.filter(({ status }) => wanted.includes(status)).map(({ code, status, extent, evidence }) => {
      const degree = extent && extent !== "none" ? `, ${extent}` : "";
      return `${treatmentNames[code]}${status === "indications" ? ": indications found" : status === "detected" ? ": found" : ""}${degree}${evidence ? `. ${evidence}` : ""}`;
    });
  return { found: told(["detected", "indications"]), notFound: told(["notDetected"]), notDeterminable: told(["notDeterminable"]), stated: told(["statedByClient"]) };
}

/** Care that a treated stone needs (cautions 5.1); common practice. */
function careNotes(findings: readonly TreatmentFinding[]): string[] {
  const found = new Set(findings.filter(({ status }) => status === "detected" || status === "indications").map(({ code }) => code));
  const notes = ["Keep from hard knocks, sudden heat and household chemicals; ask before it is cleaned by ultrasound or steam."];
  if (found.has("oilOrResinFilling") || found.has("glassFilling")) notes.push("Filled fissures: no ultrasonic or steam cleaning, no acids, no heat at the goldsmith’s torch.");
  if (found.has("dyeing") || found.has("coating") || found.has("surfaceDiffusion")) notes.push("Colour at the surface: no solvents, no repolishing.");
  if (found.has("irradiation")) notes.push("Some irradiated colours fade in strong light or heat. Irradiated stones can carry residual activity; only a licensed laboratory can say.");
  notes.push("These notes are general; local rules and the advice of a licensed professional come first.");
  return notes;
}

function instrumentLines({ readings }: ReportMatter, dayOf: (instant: Date) => string): string[] {
  const lines = new Map<string, string>();
  for (const { instrument, check } of readings) {
    if (instrument) lines.set(instrument.id, `${instrument.name}${instrument.description ? `, ${instrument.description}` : `, ${instrument.kind}`}${check ? `, checked ${dayOf(check.checkedAt)} on ${check.referenceMaterial}` : ", no check on record at the time"}`);
  }
  return [...lines.values()].sort();
}

function signatures(scope: LabScope, { conclusion, check, valuation, people, laboratory }: ReportMatter, dayOf: (instant: Date) => string): ReportSignature[] {
  const by = (userId: UserId, statement: string, at: Date): ReportSignature => {
    const person = people.get(userId);
    return { name: person?.name ?? "", title: person?.title ?? "", statement, onDate: dayOf(at) };
  };
  const signed = [by(conclusion.concludedBy, "Examined and concluded", conclusion.concludedAt)];
  if (check?.decidedAt) {
    const isSelf = check.kind === "selfCheck";
    signed.push(by(check.checkerId, isSelf ? `Self-check after at least ${laboratory.selfCheckDelayHours} hours` : "Second check, independent readings", check.decidedAt));
  }
  if (scope.actorId && !signed.some(({ name }) => name === people.get(scope.actorId!)?.name)) signed.push(by(scope.actorId, "Authorised", scope.now));
  if (valuation?.signedBy && valuation.signedAt) signed.push(by(valuation.signedBy, "Valued", valuation.signedAt));
  return signed;
}

function period(instants: readonly Date[], dayOf: (instant: Date) => string): string {
  if (instants.length === 0) return "";
  const times = instants.map((instant) => instant.getTime());
  const [first, last] = [dayOf(new Date(Math.min(...times))), dayOf(new Date(Math.max(...times)))];
  return first === last ? first : `${first} to ${last}`;
}
