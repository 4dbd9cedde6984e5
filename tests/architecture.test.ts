import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { expect, test } from "vitest";

/** A layer may import itself, packages, and what its line names. Nothing else. */
const mayImport: Record<string, readonly string[]> = {
  gemmology: [],
  domain: ["gemmology"],
  db: ["gemmology", "domain"],
  reports: ["gemmology", "domain"],
  emails: ["gemmology", "domain"],
  integrations: ["gemmology", "domain"],
  features: ["gemmology", "domain", "db", "reports", "emails", "integrations"],
  web: ["gemmology", "domain", "db", "features", "integrations", "env.server.ts"],
  components: ["gemmology", "domain", "features"],
  routes: ["gemmology", "domain", "features", "web", "components", "root.tsx"],
};

/** The pure core knows no I/O, clock, randomness, React or zod. */
const impure = /\b(Date\.now|new Date\(\)|Math\.random|performance\.now|process\.|fetch\(|console\.|crypto\.|setTimeout|setInterval)/;

function filesBelow(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const file = path.join(folder, entry.name);
    return entry.isDirectory() ? filesBelow(file) : /\.tsx?$/.test(entry.name) ? [file] : [];
  });
}

type Import = { from: string; isType: boolean };

function importsOf(file: string): Import[] {
  const text = readFileSync(file, "utf8");
  return [...text.matchAll(/^\s*(?:import|export)\s+(type\s)?(?:[^'";]*?\sfrom\s+)?["']([^"']+)["']/gm), ...text.matchAll(/(?:)()import\(\s*["']([^"']+)["']\s*\)/g)].map((match) => ({
    from: match[2]!,
    isType: Boolean(match[1]),
  }));
}

/** The path below app/ that an import leads to; undefined for a package. */
function targetOf(file: string, specifier: string): string | undefined {
  if (specifier.startsWith("#app/")) return specifier.slice("#app/".length);
  if (specifier.startsWith(".")) {
    const below = path.relative("app", path.join(path.dirname(file), specifier.replace(/\?.*$/, "")));
    return below.startsWith("..") ? undefined : below;
  }
  return undefined;
}

const layerOf = (below: string) => below.split(path.sep)[0]!;
const appFiles = filesBelow("app");

test("arrows between layers run one way", () => {
  const wrong = appFiles.flatMap((file) => {
    const layer = layerOf(path.relative("app", file));
    const allowed = mayImport[layer];
    if (!allowed) return [];
    return importsOf(file).flatMap(({ from }) => {
      if (from.startsWith("./+types/")) return [];
      const target = targetOf(file, from);
      if (target === undefined || target.startsWith("..")) return [];
      const targetLayer = layerOf(target);
      return targetLayer === layer || allowed.includes(targetLayer) ? [] : [`${file} → ${targetLayer}`];
    });
  });
  expect(wrong).toEqual([]);
});

test("the pure core knows no I/O, clock, randomness, React or zod", () => {
  const wrong = appFiles
    .filter((file) => /^app\/(gemmology|domain)\//.test(file))
    .flatMap((file) => {
      const code = readFileSync(file, "utf8").replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, "");
      const packages = importsOf(file).map(({ from }) => from).filter((from) => !from.startsWith(".") && !from.startsWith("#app/"));
      return [...packages.map((name) => `${file} → ${name}`), ...(impure.test(code) ? [`${file}: ${impure.exec(code)![0]}`] : [])];
    });
  expect(wrong).toEqual([]);
});

test("features know no requests, responses, redirects or cookies", () => {
  const wrong = appFiles
    .filter((file) => file.startsWith("app/features/"))
    .filter((file) => importsOf(file).some(({ from }) => from === "react-router" && !file.includes("/components/")) || /\bnew Response\(|\bredirect\(|Set-Cookie/.test(readFileSync(file, "utf8")));
  expect(wrong).toEqual([]);
});

test("routes write no SQL", () => {
  const wrong = appFiles.filter((file) => file.startsWith("app/routes/")).filter((file) => importsOf(file).some(({ from }) => from.startsWith("drizzle-orm") || from.startsWith("#app/db/")));
  expect(wrong).toEqual([]);
});

test("components take only what is safe in a browser", () => {
  const wrong = appFiles
    .filter((file) => file.startsWith("app/components/") || file.includes("/components/"))
    .flatMap((file) => importsOf(file).filter(({ from, isType }) => /\.server(\.tsx?)?$/.test(from) && !isType).map(({ from }) => `${file} → ${from}`));
  expect(wrong).toEqual([]);
});

test("no statement counts all rows or skips them by OFFSET", () => {
  const wrong = appFiles.filter((file) => /\.offset\(|\bcount\(\*\)|\$count\(|\bcount\(\)/.test(readFileSync(file, "utf8").replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, "")));
  expect(wrong).toEqual([]);
});

test("every file of a feature that reads or writes rows names the laboratory, or says that it does not", () => {
  // Accounts, mail, rate limits and the public register exist outside laboratories.
  const outside = /^app\/features\/(accounts|mail|rate-limits|register|species|client-area|laboratories)\/|check-health|\/unscoped-|render-queued-reports|handle-stripe-event|start-checkout|get-pay-page/;
  const wrong = appFiles
    .filter((file) => file.startsWith("app/features/") && file.endsWith(".server.ts") && !outside.test(file))
    .filter((file) => {
      const text = readFileSync(file, "utf8");
      return /\.(from|update|delete|insert)\(/.test(text) && /#app\/db\/schema/.test(text) && !/laboratoryId/.test(text);
    });
  expect(wrong).toEqual([]);
});
