import { immersionLiquids } from "#app/gemmology/optics/immersion-liquids.ts";
import { indexFromBrewsterAngle } from "#app/gemmology/optics/index-from-brewster-angle.ts";
import { indexFromDepths } from "#app/gemmology/optics/index-from-depths.ts";
import { indexFromReflectance } from "#app/gemmology/optics/index-from-reflectance.ts";
import type { DescribedDetail } from "#app/domain/bench-tests/test-forms.ts";
import type { ReadingValue } from "#app/domain/reading.ts";
import { derived } from "./derived-values.ts";

const liquidNames = { water: "water", glycerol: "glycerol", benzylBenzoate: "benzyl benzoate", bromonaphthalene: "1-bromonaphthalene", diiodomethane: "diiodomethane" } as const;
/** By relief an index is told to 0.005 to 0.01 (instruments 2.11): the wider. */
const nearLiquidU = 0.01;

/** Index of the liquid of an immersion reading, at 589.3 nm near 20 °C. */
export function immersionIndex(liquid: keyof typeof liquidNames): number {
  return immersionLiquids.find(({ name }) => name === liquidNames[liquid])!.n;
}

/** What follows from a described reading's numbers: an index, with its uncertainty and the formula that gave it. */
export function derivedFromDescribed(detail: DescribedDetail, values: readonly ReadingValue[]): ReadingValue[] {
  const get = (name: ReadingValue["name"]) => values.find((value) => value.name === name);
  const index = (n: number, u: number, formula: string) => [derived("n", { value: n, unit: "n", u, formula })];
  switch (detail.kind) {
    case "reflectivity": {
      const { value, standardUncertainty } = get("reflectancePercent")!;
      const { n, u } = indexFromReflectance({ reflectance: value / 100, uReflectance: (standardUncertainty ?? 0.5) / 100 });
      return index(n, u, "Fresnel reflectance at the normal v1");
    }
    case "brewster": {
      const { value, standardUncertainty } = get("brewsterDeg")!;
      const { n, u } = indexFromBrewsterAngle({ brewsterDeg: value, uBrewsterDeg: standardUncertainty ?? 0.3 });
      return index(n, u, "n = tan of the Brewster angle v1");
    }
    case "realDepth": {
      const [real, apparent, aperture] = [get("realMm")!, get("apparentMm")!, get("numericalAperture")];
      const { n, u, readsHighByAtMost } = indexFromDepths({ realMm: real.value, apparentMm: apparent.value, uRealMm: real.standardUncertainty ?? 0.02, uApparentMm: apparent.standardUncertainty ?? 0.02, numericalAperture: aperture?.value ?? 0 });
      // The aperture's bias is one-sided and of unknown share: taken off by half, and half of it is rectangular (JCGM 100:2008, 4.3.7).
      return index(n - readsHighByAtMost / 2, Math.hypot(u, readsHighByAtMost / 2 / Math.sqrt(3)), "real over apparent depth v1");
    }
    case "immersion":
      return detail.comparison === "near" && detail.liquid ? index(immersionIndex(detail.liquid), nearLiquidU, "near the liquid's index v1") : [];
    default:
      return [];
  }
}
