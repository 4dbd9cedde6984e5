import { defineConfig } from "vite";

// Worker threads of the server, each one file: what they import from packages stays in node_modules.
export default defineConfig({
  build: {
    ssr: true,
    outDir: "build/workers",
    emptyOutDir: true,
    copyPublicDir: false,
    rollupOptions: { input: { "render-report-worker": "app/reports/render-report-worker.ts" } },
  },
});
