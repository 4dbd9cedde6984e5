import { build } from "vite";

/** The ranking's timing as one script, bundled as the product's own code is for a browser. It leaves `scienceBench` behind. */
export async function bundleTiming(): Promise<string> {
  const built = await build({
    configFile: false,
    logLevel: "error",
    build: { write: false, minify: true, target: "es2022", lib: { entry: "scripts/science/time-ranking.ts", formats: ["iife"], name: "scienceBench" } },
  });
  const output = Array.isArray(built) ? built[0] : built;
  if (!output || !("output" in output)) throw new Error("the bundle was watched, not built");
  return output.output[0].code;
}
