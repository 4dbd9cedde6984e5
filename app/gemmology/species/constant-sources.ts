import type { SpeciesRow } from "./species-row.ts";

/** A source of a row and the constants that were compared with it. */
export type CheckedSource = Readonly<{ citation: string; constants: readonly Constant[] }>;
export type Constant = "index" | "birefringence" | "sg" | "hardness" | "dispersion" | "twoV";

const constantOf: Readonly<Record<string, Constant>> = { birefringence: "birefringence", sg: "sg", hardness: "hardness", dispersion_BG: "dispersion", two_v: "twoV" };

/**
 * The published sources that a row was compared with. What no source names is the compiler's knowledge, from memory.
 *
 * @returns in the row's order; constants empty where the row does not say which
 */
export function constantSources({ sources }: Pick<SpeciesRow, "sources">): CheckedSource[] {
  return sources.flatMap((source) => {
    if (source === "memory") return [];
    const [, citation = source, list = ""] = /^checked against: (.*) \(([a-zA-Z_, ]+)\)$/.exec(source) ?? [];
    const constants = list.split(", ").flatMap((key) => constantOf[key] ?? (key.startsWith("ri_") ? "index" : []));
    return [{ citation, constants: [...new Set(constants)] }];
  });
}
