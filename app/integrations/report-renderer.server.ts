import { existsSync } from "node:fs";
import path from "node:path";
import { Worker } from "node:worker_threads";

type Answer = { id: number; pdf?: Uint8Array; error?: string };
type Asker = { resolve: (pdf: Uint8Array) => void; reject: (error: Error) => void; timer: NodeJS.Timeout };

type Options = {
  workerFile?: string;
  timeoutMs?: number;
  /** Used where no worker is built, as under the development server; without it such a render is refused. */
  renderInProcess?: (view: unknown) => Promise<Uint8Array>;
};

/** A report is a few pages; one that needs more than this is a fault, and must not take the server's memory with it. */
const mostHeapMb = 512;

/**
 * Renders PDFs in a worker thread, so that a page never waits for one. The worker is built beside the server; it is
 * started when first asked and again after a crash, and one that hangs is ended: both reject with a reason.
 */
export function createReportRenderer({ workerFile = path.resolve("build/workers/render-report-worker.js"), timeoutMs = 60_000, renderInProcess }: Options = {}) {
  let worker: Worker | null = null;
  let lastId = 0;
  const waiting = new Map<number, Asker>();

  function settle(id: number): Asker | undefined {
    const asker = waiting.get(id);
    if (asker) clearTimeout(asker.timer);
    waiting.delete(id);
    // An idle worker must not keep the process alive.
    if (waiting.size === 0) worker?.unref();
    return asker;
  }

  /** Everything that waits for a worker ends with it. A worker already replaced has nobody waiting. */
  function drop(ended: Worker, reason: string): void {
    if (worker !== ended) return;
    worker = null;
    for (const id of [...waiting.keys()]) settle(id)?.reject(new Error(reason));
    void ended.terminate();
  }

  function start(): Worker {
    const started = new Worker(workerFile, { resourceLimits: { maxOldGenerationSizeMb: mostHeapMb } });
    started.on("message", ({ id, pdf, error }: Answer) => {
      const asker = settle(id);
      if (pdf) asker?.resolve(pdf);
      else asker?.reject(new Error(error ?? "the PDF worker gave no answer"));
    });
    started.on("error", (error) => drop(started, `the PDF worker failed: ${error instanceof Error ? error.message : String(error)}`));
    started.on("exit", (code) => drop(started, `the PDF worker ended (${code})`));
    return started;
  }

  return {
    async render(view: unknown): Promise<Uint8Array> {
      if (!worker && !existsSync(workerFile)) {
        if (renderInProcess) return renderInProcess(view);
        throw new Error("the PDF worker is not built: run the build");
      }
      const asked = (worker ??= start());
      asked.ref();
      const id = ++lastId;
      return new Promise((resolve, reject) => {
        const timer = setTimeout(() => drop(asked, `the PDF took longer than ${timeoutMs / 1000} s`), timeoutMs);
        waiting.set(id, { resolve, reject, timer });
        try {
          asked.postMessage({ id, view });
        } catch (error) {
          settle(id);
          reject(error as Error);
        }
      });
    },
    async close(): Promise<void> {
      const ended = worker;
      if (!ended) return;
      drop(ended, "the PDF worker was closed");
      await ended.terminate();
    },
  };
}
