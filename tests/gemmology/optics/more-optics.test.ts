import { expect, test } from "vitest";
import dispersion from "#fixtures/dispersion/dispersion.json" with { type: "json" };
import { apparentDepthMm } from "#app/gemmology/optics/apparent-depth-mm.ts";
import { brewsterAngleDeg } from "#app/gemmology/optics/brewster-angle-deg.ts";
import { cauchyIndex, cauchyThrough } from "#app/gemmology/optics/cauchy.ts";
import { dispersionInterval, lineBNm, lineGNm, sodiumNm } from "#app/gemmology/optics/dispersion-interval.ts";
import { doublingMm } from "#app/gemmology/optics/doubling-mm.ts";
import { gladstoneDale, specificRefractivity } from "#app/gemmology/optics/gladstone-dale.ts";
import { indexAtSodium } from "#app/gemmology/optics/index-at-sodium.ts";
import { indexAtWavelength, type DispersionFormula } from "#app/gemmology/optics/index-at-wavelength.ts";
import { indexFromBrewster } from "#app/gemmology/optics/index-from-brewster.ts";
import { indexFromDepths } from "#app/gemmology/optics/index-from-depths.ts";
import { indexFromReflectance } from "#app/gemmology/optics/index-from-reflectance.ts";
import { leastBirefringenceFromDoubling } from "#app/gemmology/optics/least-birefringence-from-doubling.ts";
import { normalReflectance } from "#app/gemmology/optics/normal-reflectance.ts";
import { opticAngle } from "#app/gemmology/optics/optic-angle.ts";
import { walkOffDeg } from "#app/gemmology/optics/walk-off-deg.ts";
import { workedOn } from "../worked-on.ts";

test.each(workedOn("Brewster angle"))("$id: Brewster's angle as $source prints it", ({ inputs, expected }) => {
  expect(Math.abs(brewsterAngleDeg(inputs.n2!, inputs.n1!) - expected.brewster_deg!)).toBeLessThan(0.06);
});

test.each(workedOn("RI from Brewster angle"))("$id: the index from Brewster's angle as $source prints it", ({ inputs, expected }) => {
  expect(indexFromBrewster({ angleDeg: inputs.brewster_deg! }).n).toBeCloseTo(expected.ri!, 2);
});

test.each(workedOn("apparent depth"))("$id: the apparent depth as $source prints it", ({ inputs, expected }) => {
  expect(apparentDepthMm({ realMm: inputs.real_depth!, n: inputs.n_object_side! })).toBeCloseTo(expected.apparent_depth!, 2);
});

// Source: the project's formulas, §1, computed there by an independent script.
test("angles, reflectance and depths go both ways, with the uncertainties that the formulas give", () => {
  for (const [n, deg] of [[1.544, 57.07], [1.77, 60.53], [2.417, 67.52]] as const) {
    expect(brewsterAngleDeg(n)).toBeCloseTo(deg, 2);
    expect(indexFromBrewster({ angleDeg: brewsterAngleDeg(n) }).n).toBeCloseTo(n, 9);
    expect(indexFromReflectance({ reflectance: normalReflectance({ n }) }).n).toBeCloseTo(n, 9);
  }
  expect(indexFromBrewster({ angleDeg: 67.52, uDeg: 1 }).u).toBeCloseTo(0.119, 3);
  expect(indexFromReflectance({ reflectance: 0.1719, u: 0.005 })).toEqual({ n: expect.closeTo(2.417, 3), u: expect.closeTo(0.035, 3) });
  expect(indexFromDepths({ realMm: 4.12, apparentMm: 2.33 })).toEqual({ n: expect.closeTo(1.768, 3), u: expect.closeTo(0.017, 3) });
  // An aperture of 0.12 reads 1.77 as 1.7788; corrected, it is 1.77 again.
  expect(1 / apparentDepthMm({ realMm: 1, n: 1.77, numericalAperture: 0.12 })).toBeCloseTo(1.7788, 4);
  expect(indexFromDepths({ realMm: 1, apparentMm: apparentDepthMm({ realMm: 1, n: 1.77, numericalAperture: 0.12 }), numericalAperture: 0.12 }).n).toBeCloseTo(1.77, 9);
});

// Source: each row's own paper (fixtures/dispersion); the index at the lines as the database computes it.
test.each(dispersion.filter((row) => "coefficients" in row).map((row) => ({ ...row, name: `${row.id} ${row.ray}` })))("$name: its index at B, D and G and its fire", (row) => {
  // Where the paper's range ends short of a line, the database carries its formula on; so does this check, and nothing else.
  const formula = { ...(row as unknown as DispersionFormula), rangeUm: [0.4, 0.7] };
  for (const [nm, n] of [[sodiumNm, row.n589], [lineGNm, row.n430], [lineBNm, row.n686]] as const) {
    if (n !== undefined) expect(indexAtWavelength(formula, nm)).toBeCloseTo(n, 4);
  }
  if (row.dispersionBG !== undefined && row.n430 !== undefined && row.n686 !== undefined) expect(dispersionInterval(formula)).toBeCloseTo(row.dispersionBG, 3.7);
});

test("outside the range that its paper measured a formula says nothing", () => {
  const moissanite = dispersion.find(({ id }) => id === "moissanite-synthetic") as unknown as DispersionFormula;
  expect(() => indexAtWavelength(moissanite, lineGNm)).toThrow(RangeError);
});

test("no dispersion formula was left out", () => {
  expect(dispersion).toHaveLength(57);
  expect(dispersion.filter((row) => "coefficients" in row)).toHaveLength(49);
});

// Source: worked examples w080–w085, from the papers named there.
test.each(workedOn("index at 589.3 nm and B-G dispersion (686.7-430.8 nm)").map((one) => ({ ...one, crystal: String(one.inputs.crystal) })))("$id: $crystal", ({ crystal, expected }) => {
  const row = dispersion.find(({ id, n589 }) => Math.abs(n589 - expected.nD!) < 0.0002 && crystal.split(" ").some((word) => id.includes(word.toLowerCase().slice(0, 4))));
  expect(row, crystal).toBeDefined();
  expect(row!.dispersionBG).toBeCloseTo(expected.B_G!, 3);
});

test("Cauchy's formula through B and G gives diamond's sodium index to 0.0003 (formulas, §2)", () => {
  const cauchy = cauchyThrough({ nm: lineGNm, n: 2.4517 }, { nm: lineBNm, n: 2.4073 });
  expect(cauchy).toEqual({ a: expect.closeTo(2.3784, 3), b: expect.closeTo(0.0136, 4) });
  expect(cauchyIndex(cauchy, sodiumNm)).toBeCloseTo(2.4176, 3);
});

test("a reading in other light comes to the sodium index of a candidate", () => {
  const known = dispersion.flatMap((each) => ("coefficients" in each && each.dispersionBG !== undefined && each.rangeUm[0]! < 0.486 && each.rangeUm[1]! > 0.656 && each.dispersionBG < 0.06 ? [{ ...each, dispersionBG: each.dispersionBG }] : []));
  expect(known.length).toBeGreaterThan(20);
  for (const row of known) {
    for (const nm of [486, 546, 656]) {
      const read = indexAtWavelength(row as unknown as DispersionFormula, nm);
      expect(Math.abs(indexAtSodium({ n: read, nm, dispersionBG: row.dispersionBG }) - row.n589), `${row.id} ${nm}`).toBeLessThan(0.0012);
    }
  }
});

// Source: the project's formulas, §5, computed there by an independent script.
test.each([
  ["topaz", 1.61, 1.613, 1.62, 66.7, "+"],
  ["peridot", 1.654, 1.671, 1.69, 87.7, "+"],
  ["chrysoberyl", 1.746, 1.748, 1.755, 56.4, "+"],
  ["andalusite", 1.634, 1.639, 1.643, 96.6, "-"],
  ["kornerupine", 1.668, 1.679, 1.682, 125.1, "-"],
] as const)("2V of %s", (_name, alpha, beta, gamma, twoVDeg, sign) => {
  expect(opticAngle({ alpha, beta, gamma })).toMatchObject({ twoVDeg: expect.closeTo(twoVDeg, 1), sign });
});

test("2V from indices to 0.001 is a rough figure, and its sign open where 90° is near", () => {
  const covariance = [[1e-6, 0, 0], [0, 1e-6, 0], [0, 0, 1e-6]];
  expect(opticAngle({ alpha: 1.61, beta: 1.613, gamma: 1.62, covariance }).uDeg).toBeCloseTo(15.8, 1);
  expect(opticAngle({ alpha: 1.654, beta: 1.671, gamma: 1.69, covariance })).toMatchObject({ uDeg: expect.closeTo(3.9, 1), sign: null });
});

test.each([["calcite", 1.6583, 1.4861, 6.26, 0.439], ["zircon", 1.925, 1.984, 1.73, 0.121], ["tourmaline", 1.64, 1.62, 0.7, 0.049], ["quartz", 1.5443, 1.5534, 0.34, 0.024]] as const)("the two rays of %s part as §5.3 says", (_name, omega, epsilon, deg, mm) => {
  expect(walkOffDeg({ omega, epsilon })).toBeCloseTo(deg, 1);
  expect(doublingMm({ omega, epsilon, pathMm: 4 })).toBeCloseTo(mm, 2);
  expect(leastBirefringenceFromDoubling({ n: (omega + epsilon) / 2, doublingMm: doublingMm({ omega, epsilon, pathMm: 4 }), pathMm: 4 })).toBeLessThanOrEqual(Math.abs(omega - epsilon) * 1.02);
});

test("index and density of quartz and corundum fit their oxides (formulas, §3)", () => {
  const quartz = specificRefractivity({ meanIndex: (2 * 1.5443 + 1.5534) / 3, densityGCm3: 2.65 });
  expect(quartz).toBeCloseTo(0.2065, 3);
  expect(gladstoneDale({ kPhysical: quartz, kChemical: 0.207 }).compatibility).toBe("superior");
  expect(gladstoneDale({ kPhysical: specificRefractivity({ meanIndex: 1.7654, densityGCm3: 3.99 }), kChemical: 0.193 }).compatibility).toBe("superior");
  expect(gladstoneDale({ kPhysical: 0.25, kChemical: 0.207 }).compatibility).toBe("poor");
});

test.each([
  () => brewsterAngleDeg(0.9),
  () => indexFromBrewster({ angleDeg: 30 }),
  () => indexFromReflectance({ reflectance: 0 }),
  () => indexFromDepths({ realMm: 2, apparentMm: 3 }),
  () => opticAngle({ alpha: 1.7, beta: 1.6, gamma: 1.8 }),
  () => indexAtSodium({ n: 1.6, nm: 900, dispersionBG: 0.02 }),
  () => specificRefractivity({ meanIndex: 1.5, densityGCm3: 0 }),
  () => cauchyThrough({ nm: 589, n: 1.5 }, { nm: 589, n: 1.6 }),
])("what cannot be is a RangeError (%#)", (work) => {
  expect(work).toThrow(RangeError);
});
