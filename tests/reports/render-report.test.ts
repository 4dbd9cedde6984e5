import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import jsQR from "jsqr";
import sharp from "sharp";
import { expect, test, vi } from "vitest";
import { renderReport } from "#app/reports/render-report.ts";
import type { ReportView } from "#app/reports/report-view.ts";
import { aReportView } from "../setup/a-report-view.ts";

async function onDisk(view: ReportView) {
  const folder = mkdtempSync(path.join(os.tmpdir(), "isogyre-report-"));
  const file = path.join(folder, "report.pdf");
  const pdf = await renderReport(view);
  writeFileSync(file, pdf);
  return { file, folder, pdf, [Symbol.dispose]: () => rmSync(folder, { recursive: true }) };
}

const tallPicture = new Uint8Array(await sharp({ create: { width: 40, height: 900, channels: 3, background: "#333" } }).jpeg().toBuffer());

const aValuation: NonNullable<ReportView["valuation"]> = {
  option: { name: "Restricted appraisal report", useRestriction: "For the client alone." },
  value: "12\u202f500.00 EUR",
  valueType: "Retail replacement value, new",
  valueDefinition: "The price at which a new item of like kind and quality can be bought at retail within a reasonable time.",
  valueDefinitionSource: "the insurer's policy wording, as given by the client",
  facts: [{ label: "Effective date", parts: [{ text: "1 December 2026" }] }],
  reasoning: "The three comparables were brought to the size and colour of this stone.",
  otherApproaches: "The cost approach was not applied: the stone is not set.",
  comparables: [{ reference: "Dealer list, autumn", description: "Oval 2.2 ct, heated", onDate: "12 Oct 2026", price: "11\u202f800.00 EUR", adjustment: "× 1.05, better colour", adjusted: "12\u202f390.00 EUR" }],
  limitingConditions: ["For insurance only."],
  certification: ["The statements of fact in this report are true and correct to the best of my knowledge."],
};

const run = (command: string, ...args: string[]) => execFileSync(command, args, { encoding: "utf8", maxBuffer: 2 ** 26 });

const pagesOf = (file: string) => run("pdftotext", "-layout", file, "-").split("\f").slice(0, -1);

async function readQr({ file, folder }: { file: string; folder: string }): Promise<string | undefined> {
  run("pdftoppm", "-r", "150", "-f", "1", "-l", "1", "-png", "-singlefile", file, path.join(folder, "page"));
  const { data, info } = await sharp(readFileSync(path.join(folder, "page.png"))).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  return jsQR(new Uint8ClampedArray(data), info.width, info.height)?.data;
}

test("the QR code on the page's image leads to the register", async () => {
  using report = await onDisk(aReportView());
  expect(await readQr(report)).toBe("http://127.0.0.1:3000/v/7KQ4M2XD9TPA3HZW");
}, 30_000);

test("the text comes out of the PDF as it went in, Greek letters and signs included", async () => {
  using report = await onDisk(aReportView());
  const text = run("pdftotext", "-layout", report.file, "-");
  for (const part of ["nω 1.770(1)", "nε 1.762(1)", "8.41 × 6.90 × 4.52 mm", "21.4 °C", "MQ-26-0417 · 1", "7KQ4-M2XD", "9TPA-3HZW", "Page 1 of 2", "Page 2 of 2", "End of the report"]) expect(text).toContain(part);
});

test("fonts are embedded and the file is sound", async () => {
  using report = await onDisk(aReportView());
  const fonts = run("pdffonts", report.file).trim().split("\n").slice(2);
  expect(fonts.length).toBeGreaterThanOrEqual(4);
  for (const font of fonts) expect(font).toMatch(/ yes (yes|no) +yes /);
  expect(run("qpdf", "--check", report.file)).toContain("No syntax or stream encoding errors found");
});

test("the same view gives the same bytes", async () => {
  const [first, second] = [await renderReport(aReportView()), await renderReport(aReportView())];
  expect(Buffer.from(first).equals(Buffer.from(second))).toBe(true);
});

test("a photograph is placed with its caption", async () => {
  const jpeg = await sharp({ create: { width: 800, height: 600, channels: 3, background: "#b3154a" } }).jpeg().toBuffer();
  using report = await onDisk(aReportView({ photograph: { caption: "Photographed 1 December 2026. Not to scale.", jpeg: new Uint8Array(jpeg) } }));
  expect(run("pdfimages", "-list", report.file)).toMatch(/jpeg/);
});

test("what was printed before does not show in the bytes", async () => {
  // Characters that share a glyph with others: whichever came first in the process must not decide the text layer.
  await renderReport(aReportView({ evidence: "no\u00a0break, µ and μ, Ω and Ω, soft\u00adhyphen, ﬁ and fi", clientName: "ﬁeld o\ufb03ce" }));
  const later = await renderReport(aReportView());
  vi.resetModules();
  const afresh = await import("#app/reports/render-report.ts");
  expect(afresh.renderReport).not.toBe(renderReport);
  expect(Buffer.from(later).equals(Buffer.from(await afresh.renderReport(aReportView())))).toBe(true);
});

test("a draft gives the same bytes too, and another view gives others", async () => {
  const render = async (overrides: Partial<ReportView>) => Buffer.from(await renderReport(aReportView(overrides)));
  expect((await render({ isDraft: true })).equals(await render({ isDraft: true }))).toBe(true);
  expect((await render({})).equals(await render({ version: 2 }))).toBe(false);
});

test("the document says what it is, by whom and from when", async () => {
  using report = await onDisk(aReportView());
  const info = run("pdfinfo", "-isodates", report.file);
  expect(info).toMatch(/Title: +MQ-R-26-00318 · Ruby/);
  expect(info).toMatch(/Author: +Marram Quay Gem Testing/);
  expect(info).toMatch(/CreationDate: +2026-12-01T10:00:00Z/);
  expect(info).toMatch(/Page size: +595.28 x 841.89 pts \(A4\)/);
});

test("every page bears the report's number and the last one its end", async () => {
  using report = await onDisk(aReportView({ evidence: "word ".repeat(3_000) }));
  const pages = pagesOf(report.file);
  expect(pages.length).toBeGreaterThan(3);
  pages.forEach((page, index) => {
    expect(page).toContain("MQ-R-26-00318");
    expect(page).toContain(`Page ${index + 1} of ${pages.length}`);
    expect(page.includes("End of the report MQ-R-26-00318")).toBe(index === pages.length - 1);
  });
});

const hostile = ["x".repeat(10_000), "wort ".repeat(2_000), "💎 emoji 👩‍🔬 and عربى and 中文 \ud800", "<script>alert(1)</script>", "=cmd()|' /C calc'!A0", "line\nbreak\r\nand\ttab\u0000\u202egnp.exe", ""];

function withTextEverywhere(text: string): ReportView {
  const view = aReportView();
  const row = { label: text.slice(0, 300), parts: [{ text, isMono: true }, { text }] };
  return {
    ...view,
    laboratory: { name: text, mark: text.slice(0, 3), addressLines: [text], phone: text, email: text },
    clientName: text,
    clientContactLines: [text, text],
    stoneCode: text,
    examinedOn: text,
    asReceived: text,
    conclusion: { title: text.slice(0, 300), statements: [text.slice(0, 600)], confidence: "Identified" },
    description: [row],
    observations: [row, row],
    treatments: { found: [text], notFound: [text], notDeterminable: [text], stated: [text] },
    evidence: text,
    clientStatements: text,
    rejected: [{ name: text.slice(0, 100), because: text }],
    externalStatements: [{ issuer: text, number: text, onDate: text, statement: text }],
    photograph: { caption: text, jpeg: tallPicture },
    rotationPlot: { facetLabel: text, points: [{ angleDeg: 0, index: 1.6 }], curves: [{ label: text, points: [] }] },
    signatures: [1, 2, 3, 4].map(() => ({ name: text, title: text, statement: text, onDate: "1 December 2026" })),
    amendment: { supersedesNumber: "MQ-R-26-00001", reason: text },
    valuation: { ...aValuation, option: { name: text, useRestriction: text }, value: text.slice(0, 100), facts: [row], comparables: [{ ...aValuation.comparables[0]!, reference: text, description: text, price: text.slice(0, 400) }], certification: [text] },
  };
}

test.each(hostile.map((text, index) => [index, text] as const))("hostile text %s in every field stays inside the page and breaks nothing", async (_index, text) => {
  using report = await onDisk(withTextEverywhere(text));
  expect(run("qpdf", "--check", report.file)).toContain("No syntax or stream encoding errors found");
  const boxes = [...run("pdftotext", "-bbox", report.file, "-").matchAll(/<word xMin="([-\d.]+)" yMin="([-\d.]+)" xMax="([-\d.]+)" yMax="([-\d.]+)"/g)].map((match) => match.slice(1).map(Number));
  expect(boxes.length).toBeGreaterThan(50);
  const least = (part: number) => boxes.reduce((found, box) => Math.min(found, box[part]!), Infinity);
  const most = (part: number) => boxes.reduce((found, box) => Math.max(found, box[part]!), -Infinity);
  expect({ left: least(0) > 42, top: least(1) > 15, right: most(2) < 595.3 - 42, bottom: most(3) < 842 - 25 }).toEqual({ left: true, top: true, right: true, bottom: true });
  expect(await readQr(report)).toBe("http://127.0.0.1:3000/v/7KQ4M2XD9TPA3HZW");
}, 60_000);

test("a text of 10,000 characters is printed to its last word", async () => {
  using report = await onDisk(aReportView({ evidence: "wort ".repeat(2_000) }));
  expect(run("pdftotext", report.file, "-").match(/\bwort\b/g)).toHaveLength(2_000);
});

test("what no face can write is seen as a box; markup and formulas are plain text", async () => {
  using report = await onDisk(aReportView({ asReceived: "ruby 💎 中文 end", evidence: "<script>alert(1)</script> & {{x}}", natureEvidence: "abc\u202egnp.exe" }));
  const text = run("pdftotext", "-layout", report.file, "-");
  for (const part of ["ruby ☐ ☐☐ end", "<script>alert(1)</script> & {{x}}", "abcgnp.exe"]) expect(text).toContain(part);
});

test("treatment answers three questions, also when there is nothing to say", async () => {
  using report = await onDisk(aReportView({ treatments: { found: [], notFound: [], notDeterminable: [], stated: [] } }));
  const text = run("pdftotext", "-layout", report.file, "-");
  for (const part of ["Nothing was found by the methods used.", "No treatment was excluded.", "None is listed.", "does not mean that a stone is untreated"]) expect(text).toContain(part);
});

test("a rotation run is drawn with its scale", async () => {
  const curve = (index: (angleDeg: number) => number) => Array.from({ length: 37 }, (_, step) => ({ angleDeg: step * 5, index: index(step * 5) }));
  using report = await onDisk(
    aReportView({
      rotationPlot: {
        facetLabel: "table facet",
        points: [{ angleDeg: 0, index: 1.77 }, { angleDeg: 90, index: 1.769 }],
        curves: [{ label: "upper edge", points: curve(() => 1.77) }, { label: "lower edge", points: curve((angleDeg) => 1.762 + 0.007 * Math.sin((angleDeg * Math.PI) / 180) ** 2) }],
      },
    }),
  );
  const [first] = pagesOf(report.file);
  for (const part of ["Rotation of the stone, table facet", "1.770", "1.762", "90°", "180°", "upper edge full line; lower edge broken line"]) expect(first).toContain(part);
});

test("an address is printed, but never on a report with a value", async () => {
  using plain = await onDisk(aReportView({ clientContactLines: ["12 Fenner Lane"] }));
  using valued = await onDisk(aReportView({ clientContactLines: ["12 Fenner Lane"], kind: "identificationWithValuation", valuation: aValuation }));
  expect(run("pdftotext", plain.file, "-")).toContain("12 Fenner Lane");
  expect(run("pdftotext", valued.file, "-")).not.toContain("12 Fenner Lane");
});

test("a sole practitioner's self-check is told as it is", async () => {
  const [concluded] = aReportView().signatures;
  using report = await onDisk(aReportView({ signatures: [concluded!, { ...concluded!, statement: "Self-check after at least 24 hours" }] }));
  const text = run("pdftotext", report.file, "-");
  expect(text).toContain("Self-check after at least 24 hours");
  expect(text).not.toMatch(/second check/i);
});

test("a draft says so on every page", async () => {
  using report = await onDisk(aReportView({ isDraft: true }));
  for (const page of ["1", "2"]) expect(run("pdftotext", "-f", page, "-l", page, report.file, "-")).toContain("Draft, not issued");
});

test("a valuation has pages of its own with its definition, comparables, certification and signature", async () => {
  const appraiser = { name: "R. Castellane", title: "appraiser", statement: "Valued", onDate: "1 December 2026" };
  using report = await onDisk(aReportView({ kind: "identificationWithValuation", valuation: aValuation, signatures: [...aReportView().signatures, appraiser] }));
  const pages = pagesOf(report.file);
  for (const part of ["Restricted appraisal report", "For the client alone.", "12 500.00 EUR", "11 800.00 EUR", "12 390.00 EUR", "Source: the insurer's policy wording", "× 1.05, better colour"]) expect(pages[2]).toContain(part);
  expect(pages[0]).toContain("M. Lindqvist");
  expect(pages[0]).not.toContain("R. Castellane");
  // The appraiser signs under the certification, on the same page.
  const signed = pages.find((page) => page.includes("R. Castellane"));
  expect(signed).toContain("true and correct to the best of my knowledge");
});

test("comparables that fill pages repeat their column titles", async () => {
  const comparables = Array.from({ length: 60 }, (_, index) => ({ ...aValuation.comparables[0]!, reference: `Lot ${index + 1}` }));
  using report = await onDisk(aReportView({ valuation: { ...aValuation, comparables } }));
  const withLots = pagesOf(report.file).filter((page) => /Lot \d+/.test(page));
  expect(withLots.length).toBeGreaterThan(1);
  for (const page of withLots) expect(page).toContain("Description and adjustment");
  expect(withLots.join("").match(/Lot \d+/g)).toHaveLength(60);
});
