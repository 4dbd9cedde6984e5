import type { Range, SpeciesRow } from "./species-row.ts";

const indexSpan = { low: 1, high: 4 } as const;
const sgSpan = { low: 0.9, high: 8 } as const;
/** Indices and birefringence are rounded to the third decimal, each. */
const rounding = 0.0035;

/**
 * What is wrong with the species file, by physics: ranges in order, indices in order, birefringence within what the
 * indices allow, sign after the indices, no birefringence of singly refractive material, every row with its sources.
 * @returns a sentence a fault; empty when there is none
 */
export function checkSpeciesRows(rows: readonly SpeciesRow[]): string[] {
  const faults: string[] = [];
  const ids = new Set<string>();
  for (const row of rows) {
    const fault = (text: string) => faults.push(`${row.id}: ${text}`);
    if (ids.has(row.id)) fault("stands twice");
    ids.add(row.id);
    if (row.sources.length === 0) fault("has no source");
    if (!(row.prevalence >= 1 && row.prevalence <= 5)) fault(`prevalence ${row.prevalence} is not 1 to 5`);
    for (const [name, range] of Object.entries(row.ri ?? {})) if (range && !isOrdered(range, indexSpan)) fault(`index ${name} is out of order or of bounds`);
    if (row.sg && !isOrdered(row.sg, sgSpan)) fault("density is out of order or of bounds");
    if (row.birefringence && !isOrdered(row.birefringence, { low: 0, high: 0.5 })) fault("birefringence is out of order or of bounds");
    checkOptics(row, fault);
  }
  for (const row of rows) for (const { id } of row.separated_from) if (!ids.has(id)) faults.push(`${row.id}: is separated from ${id}, which is not there`);
  return faults;
}

function checkOptics(row: SpeciesRow, fault: (text: string) => void): void {
  const { ri, birefringence } = row;
  if (!ri) return;
  if (ri.alpha && ri.beta && ri.gamma && (ri.alpha.typ > ri.beta.typ || ri.beta.typ > ri.gamma.typ)) fault("α ≤ β ≤ γ does not hold");
  const [low, high] = ri.alpha && ri.gamma ? [ri.alpha, ri.gamma] : ri.omega && ri.epsilon ? (ri.omega.typ <= ri.epsilon.typ ? [ri.omega, ri.epsilon] : [ri.epsilon, ri.omega]) : [undefined, undefined];
  if (low && high && birefringence) {
    if (birefringence.max > high.max - low.min + rounding) fault("birefringence is more than its indices allow");
    if (Math.abs(birefringence.typ - (high.typ - low.typ)) > Math.max(rounding, 0.35 * (high.typ - low.typ))) fault(`birefringence ${birefringence.typ} does not fit its indices (${(high.typ - low.typ).toFixed(4)})`);
  }
  const characters = typeof row.optic_character === "string" ? [row.optic_character] : row.optic_character;
  if (ri.omega && ri.epsilon && characters.includes("uniaxial")) {
    const sign = ri.epsilon.typ - ri.omega.typ;
    if ((row.optic_sign === "+" && sign < -0.0005) || (row.optic_sign === "-" && sign > 0.0005)) fault("its sign is not that of its indices");
  }
  if (characters.every((character) => character === "isotropic" || character === "amorphous") && birefringence && birefringence.max > 0) fault("is singly refractive and has a birefringence");
}

function isOrdered({ min, typ, max }: Range, { low, high }: { low: number; high: number }): boolean {
  return min <= typ && typ <= max && min >= low && max <= high;
}
