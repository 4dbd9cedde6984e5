import { createHash } from "node:crypto";
import { z } from "zod";
import lookalikes from "#fixtures/species/lookalikes.json" with { type: "json" };
import nodes from "#fixtures/species/nodes.json" with { type: "json" };
import rows from "#fixtures/species/species.json" with { type: "json" };
import { buildSpeciesTable } from "#app/gemmology/species/build-species-table.ts";
import { checkSpeciesRows } from "#app/gemmology/species/check-species-rows.ts";
import type { LookalikeRow, NodeRow, SpeciesRow } from "#app/gemmology/species/species-row.ts";
import type { SpeciesTable } from "#app/gemmology/species/species-table.ts";

const range = z.object({ min: z.number(), typ: z.number(), max: z.number() });
const character = z.enum(["isotropic", "uniaxial", "biaxial", "aggregate", "amorphous"]);
const rowSchema = z.looseObject({
  id: z.string().regex(/^[a-z0-9-]+$/),
  name: z.string().min(1),
  kind: z.enum(["natural", "synthetic", "artificial", "composite", "organic", "rock"]),
  optic_character: z.union([character, z.array(character).min(1)]),
  optic_sign: z.enum(["+", "-", "±"]).nullable(),
  ri: z.partialRecord(z.enum(["n", "omega", "epsilon", "alpha", "beta", "gamma", "spot"]), range).nullable(),
  birefringence: range.nullable(),
  sg: range.nullable(),
  colours: z.array(z.string()),
  prevalence: z.number().int(),
  sources: z.array(z.string()).min(1),
});

export type LoadedSpecies = Readonly<{ table: SpeciesTable; rows: readonly SpeciesRow[]; lookalikes: readonly LookalikeRow[]; sha256: Buffer }>;
let loaded: LoadedSpecies | undefined;

/** The species table of this program, checked once a process by schema and by physics. @throws Error that lists what is wrong */
export function loadSpeciesTable(): LoadedSpecies {
  if (loaded) return loaded;
  const parsed = z.array(rowSchema).safeParse(rows);
  if (!parsed.success) throw new Error(`the species file is not sound:\n${z.prettifyError(parsed.error)}`);
  const typed = rows as unknown as SpeciesRow[];
  const faults = checkSpeciesRows(typed);
  if (faults.length > 0) throw new Error(`the species file is not sound:\n${faults.join("\n")}`);
  // The version is the content's own: two tables with the same one are the same.
  const sha256 = createHash("sha256").update(JSON.stringify([rows, nodes, lookalikes])).digest();
  const table = buildSpeciesTable({ version: sha256.toString("hex").slice(0, 12), rows: typed, nodes: nodes as NodeRow[], lookalikes: lookalikes as LookalikeRow[] });
  loaded = { table, rows: typed, lookalikes: lookalikes as LookalikeRow[], sha256 };
  return loaded;
}
