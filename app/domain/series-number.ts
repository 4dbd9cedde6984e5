/** Letter between prefix and year: MQ-T-26-0231; stones' items have none: MQ-26-0417. */
const letterOf = { item: "", takeIn: "T-" } as const;

/** A number that people see. Four digits, more when a year needs them. */
export function seriesNumber({ prefix, series, year, value }: { prefix: string; series: keyof typeof letterOf; year: number; value: number }): string {
  return `${prefix}-${letterOf[series]}${String(year % 100).padStart(2, "0")}-${String(value).padStart(4, "0")}`;
}
