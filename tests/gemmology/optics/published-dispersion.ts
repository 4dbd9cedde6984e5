import rows from "#fixtures/worked/dispersion.json" with { type: "json" };
import type { DispersionFormula } from "#app/gemmology/optics/dispersion-formula.ts";

export type PublishedDispersion = Readonly<{ id: string; ray: string; formula: string; formula_type: string; coefficients: readonly number[] | null; range_um: readonly number[]; table?: readonly (readonly number[])[]; source: string; database: string; n_589_3: number; n_430_8: number | null; n_686_7: number | null; dispersion_BG: number | null; conventional_BG: number }>;

export const publishedDispersions = rows as unknown as readonly PublishedDispersion[];

/** The database's numbering of coefficients, read as our formulas. */
export function formulaOf({ formula_type, coefficients, range_um, table }: PublishedDispersion): DispersionFormula {
  const range = { fromNm: Math.max(range_um[0]! * 1000, (table?.[0]?.[0] ?? 0) * 1000), toNm: Math.min(range_um[1]! * 1000, (table?.at(-1)?.[0] ?? Infinity) * 1000) };
  if (table) return { kind: "table", ...range, points: table.map(([um, n]) => ({ nm: um! * 1000, n: n! })) };
  const c = coefficients!;
  if (formula_type === "formula 4") {
    const resonances = [1, 5].filter((at) => c[at] !== undefined).map((at) => ({ strength: c[at]!, power: c[at + 1]!, pole: c[at + 2]! ** c[at + 3]! }));
    const powers = [9, 11, 13, 15].filter((at) => c[at] !== undefined).map((at) => ({ strength: c[at]!, power: c[at + 1]! }));
    return { kind: "powers", ...range, constant: c[0]!, resonances, powers };
  }
  const terms = c.slice(1).flatMap((strength, at, all) => (at % 2 === 0 ? [{ strength, pole: formula_type === "formula 1" ? all[at + 1]! ** 2 : all[at + 1]! }] : []));
  return { kind: "sellmeier", ...range, constant: 1 + c[0]!, terms };
}

/** One formula by material, ray and the file it comes from. */
export function published(id: string, { ray, file }: { ray?: string; file?: string } = {}): DispersionFormula {
  const row = publishedDispersions.find((each) => each.id === id && (!ray || each.ray === ray) && (!file || each.database.includes(file)));
  if (!row) throw new Error(`no dispersion formula for ${id} ${ray ?? ""}`);
  return formulaOf(row);
}
