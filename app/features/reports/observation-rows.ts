import { decimalPlaces } from "#app/domain/decimal.ts";
import { formatWithUncertainty } from "#app/domain/format-uncertainty.ts";
import { isDescribed, type DescribedDetail } from "#app/domain/bench-tests/test-forms.ts";
import { describedWords } from "#app/features/readings/described-words.ts";
import { lightNames, observationKindNames, type ReadingDetail, type ReadingValueName } from "#app/domain/reading.ts";
import type { ReportRow } from "#app/reports/report-view.ts";

export type ReportedReading = Readonly<{
  detail: ReadingDetail;
  quality: "good" | "fair" | "poor" | "noResult";
  noResultReason: string;
  values: ReadonlyMap<ReadingValueName, { value: number; standardUncertainty: number | null; typedText: string }>;
}>;

type Parts = ReportRow["parts"];

/** Readings as a report tells them: for each property the best and latest one, with its uncertainty and conditions. */
export function observationRows(readings: readonly ReportedReading[]): ReportRow[] {
  const best = <Kind extends ReadingDetail["kind"]>(kind: Kind) => {
    const ofKind = readings.filter((reading): reading is ReportedReading & { detail: Extract<ReadingDetail, { kind: Kind }> } => reading.detail.kind === kind && reading.quality !== "noResult");
    return ofKind.findLast(({ quality }) => quality === "good") ?? ofKind.at(-1);
  };
  const polariscope = best("polariscope");
  const rows: Array<[string, Parts | undefined]> = [
    ["Refractive index", rotation(best("rotation")) ?? refractiveIndex(best("refractometer"), polariscope) ?? critical(best("criticalAngle")) ?? spot(best("spot")) ?? coarse(best("brewster")) ?? coarse(best("reflectivity")) ?? coarse(best("realDepth")) ?? overLimit(best("overLimit"))],
    ["Birefringence", birefringence(best("rotation")) ?? birefringence(best("refractometer"))],
    ["Optic character", polariscope && [{ text: character(polariscope.detail) }]],
    ["Specific gravity", density(best("density"))],
    ...seenRows(readings, best),
    ...readings.filter(({ detail, quality }) => detail.kind === "free" && quality !== "noResult").map(({ detail }): [string, Parts] => ["Observed", [{ text: detail.kind === "free" ? detail.text : "" }]]),
    ...noReadings(readings),
  ];
  return rows.flatMap(([label, parts]) => (parts ? [{ label, parts }] : []));
}

/** The refractive indices in one line, for the public register. */
export function indicesLine(rows: readonly ReportRow[]): string {
  return rows.find(({ label }) => label === "Refractive index")?.parts.map(({ text }) => text).join("  ") ?? "";
}

function refractiveIndex(reading: ReportedReading | undefined, polariscope: ReportedReading | undefined): Parts | undefined {
  if (reading?.detail.kind !== "refractometer") return undefined;
  const low = reading.values.get("low") ?? reading.values.get("n");
  const high = reading.values.get("high");
  if (!low) return undefined;
  const conditions = { text: `${reading.detail.facet === "other" ? "another facet" : reading.detail.facet}, ${lightNames[reading.detail.light]}` };
  if (!high) return [{ text: `n ${number(low)}`, isMono: true }, conditions];
  const figure = polariscope?.detail.kind === "polariscope" ? polariscope.detail : undefined;
  if (reading.detail.isRotated && figure?.sign && figure.figure.startsWith("uniaxial")) {
    const [omega, epsilon] = figure.sign === "-" ? [high, low] : [low, high];
    return [{ text: `nω ${number(omega)}`, isMono: true }, { text: `nε ${number(epsilon)}`, isMono: true }, conditions];
  }
  return [{ text: `${number(low)} – ${number(high)}`, isMono: true }, ...(reading.detail.isRotated ? [] : [{ text: "one position only" }]), conditions];
}

/** By a run over a half turn: each index of the crystal, or both ends where one facet leaves the middle open. */
function rotation(reading: ReportedReading | undefined): Parts | undefined {
  if (reading?.detail.kind !== "rotation") return undefined;
  const names = [["n", "n"], ["omega", "nω"], ["epsilon", "nε"], ["alpha", "nα"], ["beta", "nβ"], ["gamma", "nγ"]] as const;
  const own = names.flatMap(([name, symbol]) => {
    const value = reading.values.get(name);
    return value ? [{ text: `${symbol} ${number(value)}`, isMono: true }] : [];
  });
  const [low, high] = [reading.values.get("low"), reading.values.get("high")];
  const parts = own.length > 0 ? own : low && high ? [{ text: `${number(low)} – ${number(high)}`, isMono: true }] : [];
  return parts.length > 0 ? [...parts, { text: `rotation run, ${lightNames[reading.detail.light]}` }] : undefined;
}

const coarseWords = { brewster: "by Brewster angle", reflectivity: "by reflectance", realDepth: "by real and apparent depth" } as const;

function coarse(reading: ReportedReading | undefined): Parts | undefined {
  const n = reading?.values.get("n");
  return reading && n && [{ text: `n ${number(n)}`, isMono: true }, { text: coarseWords[reading.detail.kind as keyof typeof coarseWords] }];
}

const seenLabels = [["dichroscope", "Pleochroism"], ["spectroscope", "Spectrum"], ["colourFilter", "Colour filter"], ["thermalProbe", "Thermal probe"], ["conductivity", "Conductivity"], ["magnet", "Magnet"], ["immersion", "Immersion"], ["magnification", "Magnification"]] as const;

/** What was looked at, in the words of its form; both lamps have a row of their own. */
function seenRows(readings: readonly ReportedReading[], best: (kind: DescribedDetail["kind"]) => ReportedReading | undefined): Array<[string, Parts]> {
  const told = (label: string, reading: ReportedReading | undefined): Array<[string, Parts]> => {
    if (!reading || !isDescribed(reading.detail.kind)) return [];
    const { headline, seen, conditions } = describedWords(reading.detail as DescribedDetail, [...reading.values].map(([name, value]) => ({ name, unit: "1", formula: null, ...value })));
    return [[label, [{ text: [headline || (label === "Spectrum" ? "no lines seen" : ""), seen, conditions].filter(Boolean).join(", ") }]]];
  };
  const lamp = (wave: string) => readings.findLast(({ detail, quality }) => detail.kind === "ultraviolet" && detail.wave === wave && quality !== "noResult");
  return [
    ...told("Fluorescence", lamp("longWave")),
    ...told("Fluorescence", lamp("shortWave")),
    ...seenLabels.flatMap(([kind, label]) => told(label, best(kind))),
  ];
}

function critical(reading: ReportedReading | undefined): Parts | undefined {
  const n = reading?.values.get("n");
  return n && [{ text: `n ${number(n)}`, isMono: true }, { text: "by critical angle" }];
}

function spot(reading: ReportedReading | undefined): Parts | undefined {
  const n = reading?.values.get("n");
  return n && [{ text: `n ≈ ${n.typedText ? n.value.toFixed(decimalPlaces(n.typedText)) : n.value}`, isMono: true }, { text: "spot reading" }];
}

function overLimit(reading: ReportedReading | undefined): Parts | undefined {
  const limit = reading?.values.get("limit");
  return limit && [{ text: `n > ${limit.value.toFixed(2)}`, isMono: true }, { text: "over the limit of the refractometer" }];
}

function birefringence(reading: ReportedReading | undefined): Parts | undefined {
  const delta = reading?.values.get("birefringence");
  return delta && [{ text: number(delta), isMono: true }];
}

function density(reading: ReportedReading | undefined): Parts | undefined {
  const sg = reading?.values.get("sg");
  if (!sg) return undefined;
  const tempC = reading?.values.get("tempC");
  return [{ text: formatWithUncertainty(sg.value, sg.standardUncertainty, { mostDecimals: 3 }), isMono: true }, { text: `hydrostatic${tempC ? `, ${tempC.typedText.replace(",", ".")} °C` : ""}` }];
}

function character(detail: ReadingDetail): string {
  if (detail.kind !== "polariscope") return "";
  const sign = detail.sign === "+" ? " positive" : detail.sign === "-" ? " negative" : "";
  if (detail.figure === "uniaxial" || detail.figure === "uniaxialHollowCentre") return `Uniaxial${sign}`;
  if (detail.figure === "biaxial") return `Biaxial${sign}`;
  return {
    dark: "Singly refractive",
    blinks: "Doubly refractive, character not determined",
    staysLight: "Aggregate behaviour",
    anomalous: "Singly refractive with anomalous double refraction",
    cannotTell: "Not determined",
  }[detail.behaviour];
}

const kindLabels: Partial<Record<ReadingDetail["kind"], string>> = { refractometer: "Refractive index", spot: "Spot reading", criticalAngle: "Critical angle", polariscope: "Optic character", density: "Specific gravity" };

/** Tests that gave no reading, with the reason: a blank would hide that they were tried. */
function noReadings(readings: readonly ReportedReading[]): Array<[string, Parts]> {
  return readings.filter(({ quality }) => quality === "noResult").map(({ detail, noResultReason }) => [kindLabels[detail.kind] ?? (detail.kind === "free" ? "Observed" : observationKindNames[detail.kind]), [{ text: `no reading: ${noResultReason}` }]]);
}

function number({ value, standardUncertainty }: { value: number; standardUncertainty: number | null }): string {
  return formatWithUncertainty(value, standardUncertainty, { mostDecimals: 4 });
}

