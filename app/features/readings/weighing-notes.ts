import type { ReadingDetail, ReadingValue } from "#app/domain/reading.ts";

const names = { air: ["massAirCt", "massAirCt2", "massAirCt3"], liquid: ["massLiquidCt", "massLiquidCt2", "massLiquidCt3"] } as const;
/** Less than this is the balance's own unrest, carats. */
const quietCt = 0.003;

/**
 * What several weighings of one stone say of each other: their spread, and whether those in water go one way. A weight
 * that climbs tells of bubbles leaving or of a porous stone that drinks; one that falls, of bubbles gathering.
 *
 * @returns null for anything but a density weighed more than once
 * Source: common practice; what one bubble lifts is in density/bubble-buoyancy-ct.ts.
 */
export function weighingNotes({ detail, values }: { detail: ReadingDetail; values: readonly ReadingValue[] }): { spread: string; drift: string | null } | null {
  if (detail.kind !== "density") return null;
  const series = (some: readonly string[]) => some.flatMap((name) => values.find((value) => value.name === name)?.value ?? []);
  const [air, liquid] = [series(names.air), series(names.liquid)];
  if (air.length < 2 && liquid.length < 2) return null;
  const spreads = [["in air", air], ["in water", liquid]] as const;
  const spread = spreads.flatMap(([where, all]) => (all.length > 1 ? [`${all.length} ${where}, spread ${(Math.max(...all) - Math.min(...all)).toFixed(3)} ct`] : [])).join("; ");
  return { spread, drift: driftOf(liquid, detail.method === "suspended") };
}

function driftOf(liquid: readonly number[], isHung: boolean): string | null {
  if (liquid.length < 3) return null;
  const steps = liquid.slice(1).map((value, at) => value - liquid[at]!);
  const whole = liquid.at(-1)! - liquid[0]!;
  const isOneWay = steps.every((step) => step > 0) || steps.every((step) => step < 0);
  if (!isOneWay || Math.abs(whole) <= quietCt) return null;
  // What a hung stone gains, a beaker on the pan loses.
  const isClimbing = isHung ? whole > 0 : whole < 0;
  return isClimbing
    ? `The weight in water climbs by ${Math.abs(whole).toFixed(3)} ct: bubbles are leaving, or the stone drinks. If it is porous, take it out and dry it; else brush it, wait and weigh again.`
    : `The weight in water falls by ${Math.abs(whole).toFixed(3)} ct: bubbles gather on the stone or the wire. Brush them off and weigh again.`;
}
