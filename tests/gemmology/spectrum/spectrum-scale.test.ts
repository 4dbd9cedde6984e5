import { expect, test } from "vitest";
import { indexAtWavelength } from "#app/gemmology/optics/index-at-wavelength.ts";
import { flintGlass, nmAtShare, readSpectrumView, shareAtNm, spectrumViewText, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

const views = (["red", "violet"] as const).flatMap((leftEnd) => (["prism", "grating"] as const).map((spread): SpectrumView => ({ leftEnd, spread })));

// The maker's data sheet of the glass F2: n at the d line 1.62004, Abbe number 36.37 between F (486.1) and C (656.3).
test("the prism's glass has the indices of its data sheet", () => {
  expect(indexAtWavelength(flintGlass, 587.56)).toBeCloseTo(1.62004, 5);
  expect((indexAtWavelength(flintGlass, 587.56) - 1) / (indexAtWavelength(flintGlass, 486.13) - indexAtWavelength(flintGlass, 656.27))).toBeCloseTo(36.37, 1);
});

test.each(views)("red $leftEnd, $spread: the ends lie at the ends and every place is found again", (view) => {
  expect(shareAtNm(view.leftEnd === "red" ? 700 : 400, view)).toBeCloseTo(0, 9);
  expect(shareAtNm(view.leftEnd === "red" ? 400 : 700, view)).toBeCloseTo(1, 9);
  for (let nm = 400; nm <= 700; nm += 7) expect(nmAtShare(shareAtNm(nm, view), view)).toBeCloseTo(nm, 6);
  expect(nmAtShare(-3, view)).toBeCloseTo(view.leftEnd === "red" ? 700 : 400, 6);
  expect(nmAtShare(4, view)).toBeCloseTo(view.leftEnd === "red" ? 400 : 700, 6);
});

test("a prism crowds the red, a grating does not", () => {
  const width = (from: number, to: number, spread: "prism" | "grating") => Math.abs(shareAtNm(from, { leftEnd: "red", spread }) - shareAtNm(to, { leftEnd: "red", spread }));
  expect(width(650, 700, "grating")).toBeCloseTo(width(400, 450, "grating"), 9);
  expect(width(650, 700, "prism")).toBeLessThan(width(400, 450, "prism") / 4);
});

test("a view is kept as a word; what is no view is the usual one", () => {
  for (const view of views) expect(readSpectrumView(spectrumViewText(view))).toEqual(view);
  for (const text of [undefined, "", "red", "red-prism-x", "blue-prism", "__proto__"]) expect(readSpectrumView(text)).toEqual({ leftEnd: "red", spread: "grating" });
});
