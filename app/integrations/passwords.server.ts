import path from "node:path";
import { Worker } from "node:worker_threads";

type Answer = { id: number; result?: string | boolean; error?: string };

/** bcrypt in a worker thread; started when first asked, again after a crash. */
export function createPasswords({ workerFile = path.resolve("server/workers/password.mjs") } = {}) {
  let worker: Worker | null = null;
  let lastId = 0;
  const waiting = new Map<number, { resolve: (value: string | boolean) => void; reject: (error: Error) => void }>();

  function start(): Worker {
    const started = new Worker(workerFile);
    started.unref();
    started.on("message", ({ id, result, error }: Answer) => {
      const asker = waiting.get(id);
      waiting.delete(id);
      if (waiting.size === 0) started.unref();
      if (error !== undefined || result === undefined) asker?.reject(new Error(error ?? "no answer"));
      else asker?.resolve(result);
    });
    started.on("error", (error: Error) => {
      worker = null;
      for (const asker of waiting.values()) asker.reject(error);
      waiting.clear();
    });
    return started;
  }

  function ask(message: { task: "hash" | "matches"; password: string; hash?: string | null }): Promise<string | boolean> {
    worker ??= start();
    const id = ++lastId;
    worker.ref();
    return new Promise((resolve, reject) => {
      waiting.set(id, { resolve, reject });
      worker!.postMessage({ id, ...message });
    });
  }

  return {
    hash: async (password: string) => (await ask({ task: "hash", password })) as string,
    matches: async (password: string, hash: string | null) => (await ask({ task: "matches", password, hash })) as boolean,
    close: async () => {
      await worker?.terminate();
      worker = null;
    },
  };
}
