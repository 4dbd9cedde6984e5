import { gzipSync } from "node:zlib";
import { beforeAll, expect, inject, test } from "vitest";
import { cookieOf } from "./sign-in.ts";

const { url } = inject("journey");
// quality.md P16: the bare React Router page was 112.9 KB of script; 1.5 times that is due now, 1.25 times later.
const bareBytes = 112.9 * 1024;
const gzippedBytes = (text: string) => gzipSync(text, { level: 9 }).byteLength;

let cookie: string;
beforeAll(async () => {
  cookie = await cookieOf(url, "rosalind@marramquay.example");
});

/** What a browser fetches before the page works: scripts named in the document, and what these import at once. */
async function firstLoad(path: string) {
  const html = await (await fetch(url + path, { headers: { cookie } })).text();
  const named = [...html.matchAll(/(?:src|href)="(\/assets\/[^"]+\.js)"|(?:import|from)\s*"(\/assets\/[^"]+\.js)"/g)].map(([, first, second]) => (first ?? second)!);
  const scripts = new Map<string, string>();
  const queue = [...new Set(named)];
  for (let file = queue.shift(); file; file = queue.shift()) {
    if (scripts.has(file)) continue;
    const text = await (await fetch(url + file)).text();
    scripts.set(file, text);
    for (const [, next] of text.matchAll(/(?:from|import)\s*["'](\.\/[^"']+\.js)["']/g)) queue.push(new URL(next!, url + file).pathname);
  }
  const styles = await Promise.all([...html.matchAll(/href="(\/assets\/[^"]+\.css)"/g)].map(async ([, file]) => (await fetch(url + file!)).text()));
  return { scripts, styles };
}

test.each(["stones", "stones/MQ-26-0015-1", "stones/MQ-26-0015-1/conclusion", "stones/MQ-26-0013-1/spectra", "stones/MQ-26-0013-1/inclusions", "take-ins/new", "stones/MQ-26-0008-1/valuation", "reports/MQ-R-26-00005", "invoices", "settings/prices"])("%s loads little before it works", async (page) => {
  const { scripts, styles } = await firstLoad(`/lab/marram-quay/${page}`);
  expect(scripts.size).toBeGreaterThan(3);
  const sizes = [...scripts].map(([file, text]) => ({ file, bytes: gzippedBytes(text) }));
  expect(sizes.reduce((sum, { bytes }) => sum + bytes, 0)).toBeLessThanOrEqual(1.5 * bareBytes);
  const own = sizes.filter(({ file }) => !/entry\.client|jsx-runtime|client-|hooks-|manifest/.test(file));
  for (const { file, bytes } of own) expect(bytes, file).toBeLessThanOrEqual(20 * 1024);
  expect(styles.reduce((sum, text) => sum + gzippedBytes(text), 0)).toBeLessThanOrEqual(12 * 1024);
  // Full zod, PDF and pictures are the server's.
  for (const [file, text] of scripts) expect(text, file).not.toMatch(/ZodError|PDFDocument|"%PDF|limitInputPixels/);
});
