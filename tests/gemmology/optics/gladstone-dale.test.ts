import { expect, test } from "vitest";
import { gladstoneDaleCompatibility, refractiveEnergyByComposition, refractiveEnergyByPhysics } from "#app/gemmology/optics/gladstone-dale.ts";
import { indexAtWavelength } from "#app/gemmology/optics/index-at-wavelength.ts";
import { published } from "./published-dispersion.ts";

const indexOf = (id: string, ray?: string) => indexAtWavelength(published(id, ray ? { ray } : {}), 589.3);

test("quartz refracts 0.2065 cm³/g and corundum 0.1918", () => {
  expect(refractiveEnergyByPhysics({ meanIndex: (2 * 1.5443 + 1.5534) / 3, densityGCm3: 2.65 })).toBeCloseTo(0.2065, 4);
  expect(refractiveEnergyByPhysics({ meanIndex: (2 * 1.7681 + 1.76) / 3, densityGCm3: 3.99 })).toBeCloseTo(0.1918, 4);
});

// Oxide constants 0.207 for silica and 0.193 for alumina (older tables, from memory).
test("quartz and corundum are superior and excellent by the constants of their oxides", () => {
  expect(gladstoneDaleCompatibility({ byPhysics: 0.2065, byComposition: 0.207 }).compatibility).toBe("superior");
  expect(gladstoneDaleCompatibility({ byPhysics: 0.1918, byComposition: 0.193 }).compatibility).toBe("superior");
});

// Additivity on matter outside the rule: indices of three published formulas, X-ray densities 3.58, 3.987 and 3.58 g/cm³.
test("the constants of periclase and corundum make spinel, as the rule says", () => {
  const magnesia = refractiveEnergyByPhysics({ meanIndex: indexOf("periclase-synthetic"), densityGCm3: 3.58 });
  const alumina = refractiveEnergyByPhysics({ meanIndex: (2 * indexOf("ruby", "o") + indexOf("ruby", "e")) / 3, densityGCm3: 3.987 });
  const [magnesiaMass, aluminaMass] = [40.304, 101.961];
  const byComposition = refractiveEnergyByComposition([
    { constant: magnesia, massFraction: magnesiaMass / (magnesiaMass + aluminaMass) },
    { constant: alumina, massFraction: aluminaMass / (magnesiaMass + aluminaMass) },
  ]);
  const byPhysics = refractiveEnergyByPhysics({ meanIndex: indexOf("spinel-red"), densityGCm3: 3.58 });
  expect(gladstoneDaleCompatibility({ byPhysics, byComposition }).compatibility).toMatch(/superior|excellent/);
  // Glass of the same composition as quartz but the index of flint would not go together.
  expect(gladstoneDaleCompatibility({ byPhysics: refractiveEnergyByPhysics({ meanIndex: 1.62, densityGCm3: 2.65 }), byComposition: 0.207 }).compatibility).toBe("poor");
});

// Limits of the classes: Mandarino, Canadian Mineralogist 19 (1981) 441.
test.each([[0.019, "superior"], [0.02, "excellent"], [0.039, "excellent"], [0.04, "good"], [0.059, "good"], [0.06, "fair"], [0.079, "fair"], [0.08, "poor"]])("a difference of %s is %s, to either side", (difference, compatibility) => {
  expect(gladstoneDaleCompatibility({ byPhysics: 1 - difference, byComposition: 1 }).compatibility).toBe(compatibility);
  expect(gladstoneDaleCompatibility({ byPhysics: 1 + difference, byComposition: 1 }).compatibility).toBe(compatibility);
});

test("a composition that does not add up is refused", () => {
  expect(() => refractiveEnergyByComposition([{ constant: 0.2, massFraction: 0.5 }])).toThrow(/sum of massFraction out of range: 0.5/);
  expect(() => refractiveEnergyByPhysics({ meanIndex: 1.5, densityGCm3: 0 })).toThrow(/densityGCm3 out of range/);
});
