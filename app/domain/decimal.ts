/**
 * Reads a decimal as a person types it: "1.762", "1,762", " 4 ", "−0.5". No exponents, no thousands marks.
 * @returns undefined when the text is no such number or has more than 12 digits before or 10 after the point
 */
export function parseDecimal(text: string): number | undefined {
  const compact = text.trim().replace("−", "-").replace(",", ".");
  if (!/^[+-]?(\d{1,12}(\.\d{0,10})?|\.\d{1,10})$/.test(compact)) return undefined;
  const value = Number(compact);
  return Number.isFinite(value) ? value : undefined;
}

/** How many digits were typed after the decimal mark: "1.540" has three, and "1.54" does not say the same. */
export function decimalPlaces(text: string): number {
  return /[.,](\d*)\s*$/.exec(text.trim())?.[1]?.length ?? 0;
}
