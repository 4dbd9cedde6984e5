import { parseDecimal } from "#app/domain/decimal.ts";
import type { Measured } from "#app/features/identification/bench-ranking.ts";
import { usualUncertainty } from "#app/features/readings/usual-uncertainty.ts";

const fields = { n: { low: 1, high: 4 }, nU: { low: 0.0001, high: 0.1 }, d: { low: 0.5, high: 20 }, dU: { low: 0.001, high: 2 } } as const;
type Field = keyof typeof fields;

/** Standard uncertainties where none is typed: an edge on the scale; a stone of a carat or two weighed in water. */
export const placedUncertainty = { index: usualUncertainty.edge, sg: 0.03 } as const;

export type PlacedReading = Readonly<{ index: Measured | null; sg: Measured | null; typed: Readonly<Record<Field, string>>; errors: Readonly<Partial<Record<Field, string>>> }>;

/** A reading that is placed by its address: `?n=1.718&nU=0.002&d=3.60&dU=0.02`. */
export function readPlacedReading(params: URLSearchParams): PlacedReading {
  const errors: Partial<Record<Field, string>> = {};
  const typed = Object.fromEntries((Object.keys(fields) as Field[]).map((name) => [name, (params.get(name) ?? "").trim().slice(0, 12)])) as Record<Field, string>;
  const value = (name: Field): number | undefined => {
    if (typed[name] === "") return undefined;
    const number = parseDecimal(typed[name]);
    const { low, high } = fields[name];
    if (number !== undefined && number >= low && number <= high) return number;
    errors[name] = `“${typed[name]}” is not a number from ${low} to ${high}.`;
    return undefined;
  };
  const [n, nU, d, dU] = [value("n"), value("nU"), value("d"), value("dU")];
  return {
    index: n === undefined ? null : { value: n, u: nU ?? placedUncertainty.index },
    sg: d === undefined ? null : { value: d, u: dU ?? placedUncertainty.sg },
    typed,
    errors,
  };
}
