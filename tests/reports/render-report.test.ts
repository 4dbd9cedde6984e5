import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import jsQR from "jsqr";
import sharp from "sharp";
import { expect, test } from "vitest";
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

const run = (command: string, ...args: string[]) => execFileSync(command, args, { encoding: "utf8" });

test("the QR code on the page's image leads to the register", async () => {
  using report = await onDisk(aReportView());
  run("pdftoppm", "-r", "150", "-f", "1", "-l", "1", "-png", report.file, path.join(report.folder, "page"));
  const { data, info } = await sharp(readFileSync(path.join(report.folder, "page-1.png"))).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  expect(jsQR(new Uint8ClampedArray(data), info.width, info.height)?.data).toBe("http://127.0.0.1:3000/v/7KQ4M2XD9TPA3HZW");
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

const hostile = ["x".repeat(10_000), "wort ".repeat(2_000), "💎 emoji 👩‍🔬 and عربى and 中文", "<script>alert(1)</script>", "=cmd()|' /C calc'!A0", "line\nbreak\r\nand\ttab\u0000\u202egnp.exe"];

test.each(hostile.map((text, index) => [index, text] as const))("hostile text %s wraps inside the page and breaks nothing", async (_index, text) => {
  using report = await onDisk(aReportView({ asReceived: text, clientStatements: text, evidence: text, clientName: text, conclusion: { title: text.slice(0, 200), statements: [text.slice(0, 600)], confidence: "Identified" }, rejected: [{ name: text.slice(0, 100), because: text }] }));
  expect(run("qpdf", "--check", report.file)).toContain("No syntax or stream encoding errors found");
  const boxes = run("pdftotext", "-bbox", report.file, "-");
  const rights = [...boxes.matchAll(/xMax="([\d.]+)"/g)].map((match) => Number(match[1]));
  expect(Math.max(...rights)).toBeLessThan(595.3);
}, 60_000);

test("a draft says so on every page", async () => {
  using report = await onDisk(aReportView({ isDraft: true }));
  for (const page of ["1", "2"]) expect(run("pdftotext", "-f", page, "-l", page, report.file, "-")).toContain("Draft, not issued");
});

test("a valuation has pages of its own with its definition, comparables and certification", async () => {
  using report = await onDisk(
    aReportView({
      kind: "identificationWithValuation",
      valuation: {
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
      },
    }),
  );
  const text = run("pdftotext", "-layout", report.file, "-");
  for (const part of ["Opinion of value", "12 500.00 EUR", "12 390.00 EUR", "Page 3 of 3"]) expect(text.replaceAll("\u202f", " ")).toContain(part);
});
