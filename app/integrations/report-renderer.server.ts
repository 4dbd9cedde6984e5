import { existsSync } from "node:fs";
import path from "node:path";
import { Worker } from "node:worker_threads";

const timeoutMs = 60_000;
type Answer = { id: number; pdf?: Uint8Array; error?: string };

/**
 * Renders PDFs in a worker thread, so that a page never waits for one. The worker is built beside the server; it is
 * started when first asked and again after a crash, and one that hangs is ended: both reject with a reason.
 */
export function createReportRenderer({ workerFile = path.resolve("build/workers/render-report-worker.js") } = {}) {
  let worker: Worker | null = null;
  let lastId = 0;
  const waiting = new Map<number, { resolve: (pdf: Uint8Array) => void; reject: (error: Error) => void; timer: NodeJS.Timeout }>();

  function settle(id: number): { resolve: (pdf: Uint8Array) => void; reject: (error: Error) => void } | undefined {
    const asker = waiting.get(id);
    if (asker) clearTimeout(asker.timer);
    waiting.delete(id);
    if (waiting.size === 0) worker?.unref();
    return asker;
  }

  function failAll(error: Error): void {
    worker = null;
    for (const id of [...waiting.keys()]) settle(id)?.reject(error);
  }

  function start(): Worker {
    if (!existsSync(workerFile)) throw new Error("the PDF worker is not built: run the build");
    const started = new Worker(workerFile);
    started.on("message", ({ id, pdf, error }: Answer) => {
      const asker = settle(id);
      if (pdf) asker?.resolve(pdf);
      else asker?.reject(new Error(error ?? "the PDF worker gave no answer"));
    });
    started.on("error", failAll);
    started.on("exit", (code) => {
      if (worker === started) failAll(new Error(`the PDF worker ended (${code})`));
    });
    return started;
  }

  return {
    async render(view: unknown): Promise<Uint8Array> {
      worker ??= start();
      worker.ref();
      const id = ++lastId;
      return new Promise((resolve, reject) => {
        const timer = setTimeout(() => {
          const hung = worker;
          failAll(new Error("the PDF took longer than a minute"));
          void hung?.terminate();
        }, timeoutMs);
        waiting.set(id, { resolve, reject, timer });
        worker!.postMessage({ id, view });
      });
    },
    close: async () => {
      const ended = worker;
      worker = null;
      await ended?.terminate();
    },
  };
}
