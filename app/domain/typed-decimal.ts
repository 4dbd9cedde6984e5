/** The digits of a decimal as typed, with a point: "2,140" is kept as 2.140, which is what the instrument showed. */
export function typedDecimal(text: string): string {
  return text.trim().replace(",", ".").replace("\u2212", "-");
}
