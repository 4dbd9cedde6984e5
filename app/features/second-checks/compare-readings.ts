import { formatWithUncertainty } from "#app/domain/format-uncertainty.ts";
import type { ReadingValueName } from "#app/domain/reading.ts";
import { characterOf, characterWords } from "#app/features/readings/optic-character.ts";
import type { ReadingView } from "#app/features/readings/reading-view.ts";

export type ComparedRow = Readonly<{ what: string; unit: string; first: string; second: string; difference: string; allowed: string; isWithin: boolean }>;
type Quantity = { what: string; names: readonly ReadingValueName[]; unit: string; decimals: number; allowed: (u: number) => number };

/** How far two people's readings of one stone may differ (workflow 1.8, house rules after common practice). */
const quantities: readonly Quantity[] = [
  { what: "Low index", names: ["low"], unit: "", decimals: 4, allowed: () => 0.003 },
  { what: "High index", names: ["high"], unit: "", decimals: 4, allowed: () => 0.003 },
  { what: "Index", names: ["n"], unit: "", decimals: 4, allowed: (u) => Math.max(0.003, 3 * u) },
  { what: "Density", names: ["sg"], unit: "", decimals: 3, allowed: (u) => 3 * u },
  { what: "Weight", names: ["weightCt"], unit: "ct", decimals: 4, allowed: (u) => Math.max(0.01, 3 * u) },
  { what: "Length", names: ["lengthMm"], unit: "mm", decimals: 3, allowed: () => 0.02 },
  { what: "Width", names: ["widthMm"], unit: "mm", decimals: 3, allowed: () => 0.02 },
  { what: "Depth", names: ["depthMm"], unit: "mm", decimals: 3, allowed: () => 0.02 },
];

/** What both people measured, side by side; what only one of them measured cannot be compared and is left out. */
export function compareReadings(first: readonly ReadingView[], second: readonly ReadingView[]): ComparedRow[] {
  const rows = quantities.flatMap(({ what, names, unit, decimals, allowed }): ComparedRow[] => {
    const [theirs, own] = [lastValue(first, names), lastValue(second, names)];
    if (!theirs || !own) return [];
    const limit = allowed(Math.hypot(theirs.standardUncertainty ?? 0, own.standardUncertainty ?? 0));
    const difference = own.value - theirs.value;
    const write = (value: typeof own) => formatWithUncertainty(value.value, value.standardUncertainty, { mostDecimals: decimals });
    return [{ what, unit, first: write(theirs), second: write(own), difference: signed(difference, decimals), allowed: `± ${limit.toFixed(3)}`, isWithin: Math.abs(difference) <= limit + 1e-9 }];
  });
  const [theirs, own] = [lastCharacter(first), lastCharacter(second)];
  if (theirs && own) rows.push({ what: "Polariscope", unit: "", first: characterWords(theirs), second: characterWords(own), difference: theirs === own ? "none" : "differs", allowed: "the same", isWithin: areCompatible(theirs, own) });
  return rows;
}

const standing = (readings: readonly ReadingView[]) => readings.filter(({ quality, strike }) => quality !== "noResult" && !strike);

function lastValue(readings: readonly ReadingView[], names: readonly ReadingValueName[]) {
  const having = standing(readings).filter(({ values }) => values.some(({ name }) => names.includes(name)));
  const best = having.findLast(({ quality }) => quality === "good") ?? having.at(-1);
  return best?.values.find(({ name }) => names.includes(name));
}

function lastCharacter(readings: readonly ReadingView[]) {
  return standing(readings).flatMap(({ detail }) => (detail.kind === "polariscope" ? (characterOf(detail) ?? []) : [])).at(-1);
}

/** "Doubly refractive" says less than "uniaxial", not otherwise. */
function areCompatible(a: string, b: string): boolean {
  const doubly = ["anisotropic", "uniaxial", "biaxial"];
  return a === b || ((a === "anisotropic" || b === "anisotropic") && doubly.includes(a) && doubly.includes(b));
}

function signed(difference: number, decimals: number): string {
  const text = Math.abs(difference).toFixed(decimals);
  return Number(text) === 0 ? text : `${difference > 0 ? "+" : "−"}${text}`;
}
