import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { build } from "vite";
import { afterAll, beforeAll, expect, test } from "vitest";
import { createReportRenderer } from "#app/integrations/report-renderer.server.ts";
import { renderReport } from "#app/reports/render-report.ts";
import { aReportView } from "../setup/a-report-view.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), "isogyre-renderer-"));
});
afterAll(() => rmSync(folder, { recursive: true }));

function rendererOf(answer: string, options: { timeoutMs?: number } = {}) {
  const workerFile = path.join(folder, `${Math.random()}.mjs`);
  writeFileSync(workerFile, `import { parentPort } from "node:worker_threads";\nparentPort.on("message", ({ id, view }) => { ${answer} });`);
  const renderer = createReportRenderer({ workerFile, ...options });
  return { ...renderer, [Symbol.asyncDispose]: renderer.close };
}

test("answers find their askers, in whatever order they come", async () => {
  await using renderer = rendererOf(`setTimeout(() => parentPort.postMessage({ id, pdf: new Uint8Array([view.n]) }), 30 / view.n);`);
  const pdfs = await Promise.all([1, 2, 3].map((n) => renderer.render({ n })));
  expect(pdfs.map(([n]) => n)).toEqual([1, 2, 3]);
});

test("a view that cannot be rendered is refused with its reason, and the next one is rendered", async () => {
  await using renderer = rendererOf(`parentPort.postMessage(view.isBad ? { id, error: "SOI not found in JPEG" } : { id, pdf: new Uint8Array(1) });`);
  await expect(renderer.render({ isBad: true })).rejects.toThrow("SOI not found in JPEG");
  expect(await renderer.render({})).toHaveLength(1);
});

test("a crash rejects all who wait, and the next render starts another worker", async () => {
  await using renderer = rendererOf(`if (view.isBad) setTimeout(() => { throw new Error("out of ink"); }); else if (!view.isMute) parentPort.postMessage({ id, pdf: new Uint8Array(1) });`);
  const outcomes = await Promise.allSettled([renderer.render({ isMute: true }), renderer.render({ isBad: true })]);
  for (const outcome of outcomes) expect(outcome).toMatchObject({ status: "rejected", reason: { message: "the PDF worker failed: out of ink" } });
  expect(await renderer.render({})).toHaveLength(1);
});

test("a worker that ends itself rejects too", async () => {
  await using renderer = rendererOf(`process.exit(3);`);
  await expect(renderer.render({})).rejects.toThrow("the PDF worker ended (3)");
});

test("a worker that hangs is ended, and its late death does not touch the one after it", async () => {
  await using renderer = rendererOf(`if (view.isBad) for (;;); parentPort.postMessage({ id, pdf: new Uint8Array(1) });`, { timeoutMs: 2_000 });
  await expect(renderer.render({ isBad: true })).rejects.toThrow("the PDF took longer than 2 s");
  expect(await renderer.render({})).toHaveLength(1);
});

test("closing rejects who still waits", async () => {
  const renderer = rendererOf("");
  const outcome = expect(renderer.render({})).rejects.toThrow("the PDF worker was closed");
  await renderer.close();
  await outcome;
});

test("a view that cannot be sent to a worker is refused at once", async () => {
  await using renderer = rendererOf("");
  await expect(renderer.render({ toString: () => "no data" })).rejects.toThrow("could not be cloned");
});

test("without a worker the caller's own renderer is used, or the render is refused", async () => {
  const workerFile = path.join(folder, "not-there.js");
  const pdf = new Uint8Array(1);
  expect(await createReportRenderer({ workerFile, renderInProcess: async () => pdf }).render({})).toBe(pdf);
  await expect(createReportRenderer({ workerFile }).render({})).rejects.toThrow("not built");
});

test("the built worker gives the same bytes as the process itself", async () => {
  // Inside the project, so that the bundle finds its packages.
  const outDir = mkdtempSync(path.resolve("node_modules/.isogyre-workers-"));
  try {
    await build({ configFile: "vite.workers.config.ts", logLevel: "error", build: { outDir } });
    const renderer = createReportRenderer({ workerFile: path.join(outDir, "render-report-worker.js") });
    try {
      const fromWorker = await renderer.render(aReportView());
      expect(Buffer.from(fromWorker).equals(Buffer.from(await renderReport(aReportView())))).toBe(true);
    } finally {
      await renderer.close();
    }
  } finally {
    rmSync(outDir, { recursive: true });
  }
}, 60_000);
