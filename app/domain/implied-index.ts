/** "1762" as it is read off a scale from 1.3 to 2.1: the mark after the first digit goes without saying. Anything else stays. */
export function impliedIndex(text: string): string {
  const digits = text.trim();
  return /^[12]\d{2,4}$/.test(digits) ? `${digits[0]}.${digits.slice(1)}` : text;
}
