import { renderToStaticMarkup } from "react-dom/server";
import { expect, test } from "vitest";
import { spectrumKeyAct } from "#app/components/bench/spectrum/spectrum-keys.ts";
import { SpectrumDrawing } from "#app/components/bench/spectrum/spectrum-drawing.tsx";
import { SpectrumField } from "#app/components/bench/spectrum/spectrum-field.tsx";
import { DrawnSpectrum } from "#app/components/charts/spectrum/drawn-spectrum.tsx";
import { readSpectrumLines } from "#app/domain/bench-tests/spectrum-lines.ts";
import { absorptionLines } from "#app/features/species/absorption-lines.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import type { SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

const redLeft: SpectrumView = { leftEnd: "red", spread: "grating" };
const { lines } = readSpectrumLines("694 e, 550, 540-580 weak");

test("lines stand at their place from either end, and are told in words", () => {
  const markup = renderToStaticMarkup(<DrawnSpectrum lines={lines} view={redLeft} />);
  expect(markup).toContain('x1="50.00%" x2="50.00%"');
  expect(markup).toContain('x="40.00%" width="13.33%"');
  expect(markup).toContain("band from 540 to 580 nm, weak");
  expect(renderToStaticMarkup(<DrawnSpectrum lines={lines} view={{ ...redLeft, leftEnd: "violet" }} />)).toContain('x1="98.00%"');
});

test("a line outside what is drawn is not drawn, and still told", () => {
  const markup = renderToStaticMarkup(<DrawnSpectrum lines={readSpectrumLines("720").lines} view={redLeft} />);
  expect(markup).not.toContain("stroke-opacity");
  expect(markup).toContain("line at 720 nm");
});

test("the field is words, whether or not the drawing is there", () => {
  const markup = renderToStaticMarkup(<SpectrumField id="lines" name="lines" label="Lines and bands" defaultValue="694 e, 540-580 band" errors={["“x” is no line."]} />);
  expect(markup).toMatch(/<textarea[^>]*name="lines"[^>]*>694 e, 540-580 band<\/textarea>/);
  expect(markup).toContain("“x” is no line.");
});

test("without script the drawing is a picture of the words, with the candidates' lines above it", () => {
  const markup = renderToStaticMarkup(<SpectrumDrawing field={{ current: null }} text="694 e, 540-580 band" id="lines" maxLength={500} candidates={absorptionLines(loadSpeciesTable().table, ["corundum", "diamond"])} />);
  expect(markup).toContain("line at 694 nm, shining");
  expect(markup).toContain("Corundum");
  expect(markup).not.toContain("<button");
});

test("the table's lines of a species come once each, and species without any are left out", () => {
  const { table } = loadSpeciesTable();
  const [corundum, ...others] = absorptionLines(table, ["corundum", "no such species"]);
  expect(others).toEqual([]);
  expect(corundum!.lines.some(({ nm, strength }) => Math.abs(nm - 450) < 1 && strength === "strong")).toBe(true);
  const places = corundum!.lines.map(({ nm, halfWidthNm }) => `${nm}/${halfWidthNm}`);
  expect(new Set(places).size).toBe(places.length);
});

test("keys move towards where they point, whichever end is left, and never out of the picture", () => {
  expect(spectrumKeyAct("ArrowRight", false, 550, redLeft)).toEqual({ act: "move", toNm: 549 });
  expect(spectrumKeyAct("ArrowRight", true, 550, { ...redLeft, leftEnd: "violet" })).toEqual({ act: "move", toNm: 560 });
  expect(spectrumKeyAct("ArrowLeft", true, 696, redLeft)).toEqual({ act: "move", toNm: 700 });
  expect(spectrumKeyAct("W", false, 550, redLeft)).toEqual({ act: "strength", strength: "weak" });
  expect(spectrumKeyAct("x", false, 550, redLeft)).toBeNull();
});
