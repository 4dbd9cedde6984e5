/** What a laboratory's instrument can be; sets of liquids are kept as instruments, since they are checked like them. */
export const instrumentKinds = [
  "refractometer", "angleRefractometer", "polariscope", "balance", "gauge", "thermometer", "microscope",
  "dichroscope", "spectroscope", "uvLamp", "colourFilter", "thermalProbe", "conductivityMeter", "magnet", "immersionSet", "reflectivityMeter", "brewsterMeter", "heavyLiquids", "other",
] as const;
export type InstrumentKind = (typeof instrumentKinds)[number];

/** Kinds that give numbers which only a check bears out; the others show or do not, and are checked as their laboratory wishes. */
const measuring: ReadonlySet<InstrumentKind> = new Set(["refractometer", "angleRefractometer", "balance", "gauge", "reflectivityMeter", "brewsterMeter", "heavyLiquids"]);

/** Whether an instrument's readings stand without a passed check that is still good. `nextDueOn` and `today` are calendar dates; null: never passed. */
export function isOutOfCheck({ kind, nextDueOn, today }: { kind: InstrumentKind; nextDueOn: string | null; today: string }): boolean {
  return nextDueOn === null ? measuring.has(kind) : nextDueOn < today;
}
