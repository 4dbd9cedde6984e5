import { expectedDensityU } from "../density/expected-density-u.ts";
import { fluorescenceStrengths, magneticResponses, strengths, type Evidence, type EstimateWay, type RotationCrystal } from "../ranking/evidence.ts";
import type { SpeciesForm } from "../species/species-table.ts";
import type { BenchTest } from "./bench-test.ts";

const steps = (from: number, to: number, count: number) => Array.from({ length: count }, (_, at) => from + ((to - from) * (at + 0.5)) / count);
const spread = ([low, high]: readonly [number, number], margin: number, count: number) => steps(low - margin, high + margin, count);

/** Standard uncertainty of an index that way, at the high indices it is used for (instruments' notes, default u). */
const [brewsterU, depthU] = [0.035, 0.03];

function estimates(index: readonly [number, number], { u, by }: { u: number; by: EstimateWay }): Evidence[] {
  return spread(index, 2 * u, 50).map((n) => ({ ri: [{ kind: "estimate", n, u, by }] }));
}

/** Nanometres within which a line or a band counts as the same, and how many of them count. */
const reachNm = { line: 10, band: 40 } as const;
const mostLines = 4;

/** The spectra that the likely forms are known for: their clear lines, each pattern once. */
function spectraOf(forms: readonly SpeciesForm[]): Evidence[] {
  const patterns = forms.flatMap(({ absorption }) => absorption.map(({ lines }) => lines.filter(([, , strength]) => strength >= 2).map(([nm, halfWidth]) => ({ nm, kind: halfWidth > 5 ? ("band" as const) : ("line" as const) }))));
  const written = new Map(patterns.filter((lines) => lines.length > 0).map((lines) => [lines.map(({ nm }) => nm).join(), lines]));
  return [...written.values()].map((absorption) => ({ absorption }));
}

/** Which of the crystals it is, each as sure as the other. */
function eitherCrystal(undecided: readonly RotationCrystal[]): Evidence[][] {
  return undecided.length < 2 ? [] : [undecided.map(({ indices, u }): Evidence => ({ ri: [{ kind: "rotation", solutions: [{ indices, ...(u !== undefined && { u }) }] }] }))];
}

/** Minutes are those of a practised hand (common practice). */
export const benchTests: readonly BenchTest[] = [
  {
    id: "edges",
    name: "Refractometer, turned through a half turn",
    minutes: 3,
    harms: "contactLiquid",
    outcomes: ({ isPolished }, { index }) =>
      isPolished
        ? [
            [...spread([index[0], Math.min(index[1], 1.8)], 0.006, 60).map((low): Evidence => ({ ri: [{ kind: "edges", low, high: low + 0.008, rotated: true }], birefringence: { value: 0.008 } })), { ri: [{ kind: "overLimit", limit: 1.81 }] }],
            steps(0, 0.08, 40).map((value): Evidence => ({ birefringence: { value } })),
          ]
        : [],
  },
  { id: "spot", name: "Spot reading", minutes: 2, harms: "contactLiquid", outcomes: (_stone, { index }) => [[...spread([index[0], Math.min(index[1], 1.8)], 0.02, 40).map((n): Evidence => ({ ri: [{ kind: "spot", n }] })), { ri: [{ kind: "overLimit", limit: 1.81 }] }]] },
  { id: "polariscope", name: "Polariscope", minutes: 2, harms: null, outcomes: () => [(["isotropic", "anomalous", "anisotropic", "aggregate"] as const).map((opticCharacter): Evidence => ({ opticCharacter }))] },
  { id: "figure", name: "Interference figure", minutes: 3, harms: null, outcomes: () => [(["isotropic", "anisotropic", "uniaxial", "biaxial", "aggregate"] as const).map((opticCharacter): Evidence => ({ opticCharacter }))] },
  {
    id: "density",
    name: "Weighing in water",
    minutes: 6,
    harms: "water",
    outcomes: ({ massCt, uAirCt, uWaterCt }, { sg }) => {
      if (massCt === null) return [];
      // What a stone of this weight would show, not what a larger one does.
      const u = Math.min(3, expectedDensityU({ massCt, sg: (sg[0] + sg[1]) / 2, uAirCt, uWaterCt }));
      return [spread(sg, 3 * u, 80).map((value): Evidence => ({ sg: { value, u } }))];
    },
  },
  { id: "dichroscope", name: "Dichroscope", minutes: 2, harms: null, outcomes: () => [strengths.map((strength): Evidence => ({ pleochroism: { strength } }))] },
  { id: "longWave", name: "Long-wave ultraviolet", minutes: 3, harms: "ultraviolet", outcomes: () => [fluorescenceStrengths.map((strength): Evidence => ({ fluorescence: { longWave: { strength } } }))] },
  { id: "shortWave", name: "Short-wave ultraviolet", minutes: 3, harms: "ultraviolet", outcomes: () => [fluorescenceStrengths.map((strength): Evidence => ({ fluorescence: { shortWave: { strength } } }))] },
  { id: "colourFilter", name: "Colour filter", minutes: 1, harms: null, outcomes: () => [["red", "no red"].map((colourFilter): Evidence => ({ colourFilter }))] },
  { id: "spectroscope", name: "Spectroscope", minutes: 4, harms: null, outcomes: (_stone, { forms }) => [[{ absorption: [] }, ...spectraOf(forms)]], sizeOf: ({ absorption = [] }) => absorption.slice(0, mostLines).reduce((size, { kind }) => size * reachNm[kind], 1) },
  { id: "magnet", name: "Magnet", minutes: 1, harms: null, outcomes: () => [magneticResponses.map((magnetic): Evidence => ({ magnetic }))] },
  { id: "brewster", name: "Brewster angle", minutes: 3, harms: null, outcomes: ({ isOverLimit }, { index }) => (isOverLimit ? [estimates(index, { u: brewsterU, by: "brewster" })] : []) },
  { id: "depth", name: "Real and apparent depth", minutes: 4, harms: null, outcomes: ({ isOverLimit }, { index }) => (isOverLimit ? [estimates(index, { u: depthU, by: "depth" })] : []) },
  { id: "polariser", name: "Polariser on the rotation run", minutes: 2, harms: "contactLiquid", outcomes: ({ undecided = [] }) => eitherCrystal(undecided) },
  { id: "secondFacet", name: "Rotation on a second facet", minutes: 6, harms: "contactLiquid", outcomes: ({ undecided = [] }) => eitherCrystal(undecided) },
  { id: "thermalProbe", name: "Thermal probe", minutes: 1, harms: "thermalProbe", outcomes: () => [(["diamond-like", "inert"] as const).map((thermal): Evidence => ({ thermal }))] },
];
