import type { Evidence } from "#app/gemmology/ranking/evidence.ts";
import { rankSpecies, type RankOptions } from "#app/gemmology/ranking/rank-species.ts";
import type { EvidenceLine, Ranking } from "#app/gemmology/ranking/ranking.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";
import { evidenceFromReadings, type RankedReading } from "#app/features/readings/evidence-from-readings.ts";
import { usualUncertainty } from "#app/features/readings/usual-uncertainty.ts";
import type { BenchCandidate, BenchRanking, Lane, Measured } from "./bench-ranking.ts";

/** A saved reading has its number; the one that is being typed has none yet. */
export type NumberedReading = RankedReading & Readonly<{ sequence: number | null }>;

const mostCandidates = 4;
const mostComparable = 12;
const negligible = 0.001;

/** Everything that the bench shows of a ranking, by one and the same code in the browser and on the server. */
export function rankReadings(
  readings: readonly NumberedReading[],
  table: SpeciesTable,
  { mostReasons = Infinity, compare = [], prior = "prevalence" }: RankOptions & { mostReasons?: number; /** Ids of two candidates. */ compare?: readonly string[] } = {},
): BenchRanking {
  const evidence = evidenceFromReadings(readings);
  const ranking = rankSpecies(evidence, table, { prior });
  const names = new Map(table.nodes.map(({ id, name }) => [id, name]));
  const against = contradictingReadings(readings, table);
  // One contradiction does not take a species from the ranking, but what it leaves unlikely is told with its reason.
  const isLeft = ({ probability, evidence: lines }: Ranking["candidates"][number]) => probability >= negligible || !lines.some(({ verdict }) => verdict === "contradicts");
  const left = ranking.candidates.filter(isLeft);
  const shown = left.filter(({ probability }, at) => at < mostCandidates && (at === 0 || probability >= negligible));
  const ruledOut = [
    ...ranking.candidates.filter((candidate) => !isLeft(candidate)).map(({ speciesId, evidence: lines }) => ({ speciesId, because: lines.find(({ verdict }) => verdict === "contradicts")!.because })),
    ...ranking.contradicted,
  ];
  const told = ({ speciesId, name, probability, evidence: lines }: Ranking["candidates"][number]): BenchCandidate => ({ speciesId, name, probability, lanes: lines.map((line) => laneOf(line, evidence)) });
  return {
    tableVersion: table.version,
    modelVersion: ranking.modelVersion,
    speciesCount: table.nodes.length,
    hasEvidence: Object.keys(evidence).length > 0,
    candidates: shown.map(told),
    otherCount: left.length - shown.length,
    comparable: left.slice(0, mostComparable).map(({ speciesId, name }) => ({ speciesId, name })),
    compared: compare.flatMap((id) => ranking.candidates.filter(({ speciesId }) => speciesId === id).map(told)),
    unlisted: ranking.unlisted,
    ruledOut: ruledOut.slice(0, mostReasons).map(({ speciesId, because }) => ({ speciesId, name: names.get(speciesId) ?? speciesId, because, readings: against.get(speciesId) ?? [] })),
    ruledOutCount: ruledOut.length,
    inseparable: ranking.inseparable.map(({ speciesIds, settledBy }) => ({ names: speciesIds.map((id) => names.get(id) ?? id), settledBy })),
    index: measuredIndex(evidence),
    density: evidence.sg ? { value: evidence.sg.value, u: evidence.sg.u ?? 0 } : null,
  };
}

type Contradiction = Readonly<{ sequence: number | null; because: string }>;

/** For each species the readings that contradict it by themselves, in the ranking's words. */
export function contradictingReadings(readings: readonly NumberedReading[], table: SpeciesTable): ReadonlyMap<string, readonly Contradiction[]> {
  const against = new Map<string, Contradiction[]>();
  for (const reading of readings) {
    for (const { speciesId, because } of contradictedBy(reading, table)) against.set(speciesId, [...(against.get(speciesId) ?? []), { sequence: reading.sequence, because }]);
  }
  return against;
}

type Against = ReadonlyArray<Readonly<{ speciesId: string; because: string }>>;
/** A reading never changes, so what it says by itself is worked out once; at the bench only the typed one is new. */
const workedOut = new WeakMap<NumberedReading, { table: SpeciesTable; against: Against }>();

function contradictedBy(reading: NumberedReading, table: SpeciesTable): Against {
  const known = workedOut.get(reading);
  if (known?.table === table) return known.against;
  const alone = evidenceFromReadings([reading]);
  let against: Against = [];
  if (Object.keys(alone).length > 0) {
    const { candidates, contradicted } = rankSpecies(alone, table);
    against = [...contradicted, ...candidates.flatMap(({ speciesId, evidence }) => evidence.filter(({ verdict }) => verdict === "contradicts").slice(0, 1).map(({ because }) => ({ speciesId, because })))];
  }
  workedOut.set(reading, { table, against });
  return against;
}

const labels: Readonly<Record<string, string>> = { ri: "Index", birefringence: "Birefringence", sg: "Density", opticCharacter: "Character", opticSign: "Sign", colour: "Colour", transparency: "Transparency", lustre: "Lustre", phenomena: "Phenomena", pleochroism: "Pleochroism", fluorescenceLongWave: "Long wave", fluorescenceShortWave: "Short wave", absorption: "Spectrum", colourFilter: "Filter", thermal: "Thermal", magnetic: "Magnet", heavyLiquid: "Heavy liquid" };
/** How far a lane reaches on each side of what was measured: the same for every species, so that lanes compare. */
const reach: Readonly<Record<string, number>> = { ri: 0.05, birefringence: 0.03, sg: 0.6 };

function laneOf({ property, observed, reference, verdict, because, logLikelihood }: EvidenceLine, evidence: Evidence): Lane {
  const lane = { property, label: labels[property] ?? property, observed, reference, verdict, because, logLikelihood };
  const half = reach[property];
  const [low, high = low] = numbersIn(observed);
  const [from, to = from] = numbersIn(reference);
  if (half === undefined || low === undefined || high === undefined || from === undefined || to === undefined) return { ...lane, scale: null };
  const middle = (low + high) / 2;
  const axis = { axisMin: Math.max(0, middle - half), axisMax: middle + half };
  // Over the limit: anything from there on.
  const upTo = observed.startsWith("over") ? axis.axisMax : high;
  return { ...lane, scale: { ...axis, referenceLow: from, referenceHigh: to, observedLow: low, observedHigh: upTo, u: uncertaintyOf(property, observed, evidence) } };
}

function uncertaintyOf(property: string, observed: string, evidence: Evidence): number {
  if (property === "sg") return evidence.sg?.u ?? 0;
  const kinds = observed.includes("spot") ? ["spot"] : ["edges", "single"];
  const edge = evidence.ri?.flatMap((reading) => (kinds.includes(reading.kind) && "u" in reading && reading.u ? [reading.u] : []))[0];
  if (observed.startsWith("over")) return 0;
  if (observed.includes("critical")) return usualUncertainty.criticalAngleIndex;
  return property === "birefringence" ? usualUncertainty.gapShare * (edge ?? usualUncertainty.edge) : (edge ?? usualUncertainty.edge);
}

const numbersIn = (text: string) => (text.match(/\d+\.\d+|\d+/g) ?? []).map(Number);

function measuredIndex({ ri = [] }: Evidence): Measured | null {
  const means = ri.flatMap((reading): Measured[] => {
    switch (reading.kind) {
      case "edges":
        return [{ value: (reading.low + reading.high) / 2, u: reading.u ?? usualUncertainty.edge }];
      case "single":
      case "spot":
        return [{ value: reading.n, u: reading.u ?? usualUncertainty.edge }];
      case "criticalAngle":
        return [{ value: reading.prismN * Math.sin((reading.angleDeg * Math.PI) / 180), u: usualUncertainty.criticalAngleIndex }];
      case "interval":
        return [{ value: (reading.low + reading.high) / 2, u: Math.max((reading.high - reading.low) / Math.sqrt(12), reading.u ?? usualUncertainty.edge) }];
      case "estimate":
        return [{ value: reading.n, u: reading.u }];
      case "rotation":
        return reading.solutions.slice(0, 1).map(({ indices, u }) => {
          const values = Object.values(indices);
          return { value: (Math.min(...values) + Math.max(...values)) / 2, u: u ?? usualUncertainty.edge };
        });
      case "overLimit":
        return [];
    }
  });
  return means.sort((a, b) => a.u - b.u)[0] ?? null;
}

/** The ranking as it is kept with a conclusion: whole, with what it was made from. */
export function rankingSnapshot(readings: readonly NumberedReading[], table: SpeciesTable, options: RankOptions = {}): { evidence: Evidence; ranking: Ranking } {
  const evidence = evidenceFromReadings(readings);
  return { evidence, ranking: rankSpecies(evidence, table, options) };
}
