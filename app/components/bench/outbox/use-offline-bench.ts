import { useEffect } from "react";
import { loadOutbox } from "./load-outbox.ts";

const worker = "/bench-worker.js";

/** Lets a stone's page open without the line: its data and its files are kept on the device. */
export function useOfflineBench({ labSlug, stoneCode, person, loaderData }: { labSlug: string; stoneCode: string; person: string; /** Null: nothing to keep. */ loaderData: object | null }): void {
  const isKept = loaderData !== null;
  useEffect(() => {
    if (loaderData) void loadOutbox().then(({ keepPage }) => keepPage({ labSlug, stoneCode, person, loaderData }));
  }, [labSlug, stoneCode, person, loaderData]);
  useEffect(() => {
    if (!isKept || !("serviceWorker" in navigator)) return;
    void keepFiles().catch(() => {
      // A browser that has no room for it, or may not: the page works with the line alone.
    });
  }, [labSlug, stoneCode, isKept]);
}

/** Parts that come only when they are asked for are asked for now, so that they are there later. */
const warmParts = () =>
  Promise.all([
    import("../live-bench.tsx"),
    import("../rotation-editor.tsx"),
    import("../spectrum/spectrum-drawing.tsx"),
    import("#app/features/readings/compose-reading.ts"),
    import("../waiting-reading.ts"),
    import("#app/components/charts/index-density-map.tsx"),
    import("#app/features/identification/rank-readings.ts"),
    import("#app/features/readings/evidence-from-readings.ts"),
    import("#app/features/readings/compose-any-reading.ts"),
  ]);

async function keepFiles(): Promise<void> {
  await navigator.serviceWorker.register(worker, { scope: "/lab/" });
  const { active } = await navigator.serviceWorker.ready;
  await warmParts();
  const files = performance.getEntriesByType("resource").map(({ name }) => name);
  active?.postMessage({ keep: [location.href, ...files] });
}
