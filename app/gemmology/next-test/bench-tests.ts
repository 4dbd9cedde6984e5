import { expectedDensityU } from "../density/expected-density-u.ts";
import { fluorescenceStrengths, strengths, type Evidence } from "../ranking/evidence.ts";
import type { BenchTest } from "./bench-test.ts";

const steps = (from: number, to: number, count: number) => Array.from({ length: count }, (_, at) => from + ((to - from) * (at + 0.5)) / count);
const spread = ([low, high]: readonly [number, number], margin: number, count: number) => steps(low - margin, high + margin, count);

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
  { id: "thermalProbe", name: "Thermal probe", minutes: 1, harms: "thermalProbe", outcomes: () => [(["diamond-like", "inert"] as const).map((thermal): Evidence => ({ thermal }))] },
];
