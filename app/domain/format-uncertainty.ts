/**
 * A value with its standard uncertainty in the last digit, "1.762(2)": the uncertainty rounded to one significant digit,
 * the value to the same place (JCGM 100:2008, 7.2.2, second form).
 *
 * @param mostDecimals digits beyond which nothing is written; an uncertainty that vanishes there is left out
 * @throws RangeError when the value is no finite number or the uncertainty is negative
 */
export function formatWithUncertainty(value: number, standardUncertainty: number | null, { mostDecimals = 4 } = {}): string {
  if (!Number.isFinite(value)) throw new RangeError(`value is not finite: ${value}`);
  if (standardUncertainty === null) return trim(value.toFixed(mostDecimals));
  if (!(standardUncertainty >= 0)) throw new RangeError(`standardUncertainty out of range: ${standardUncertainty}`);
  if (standardUncertainty === 0) return trim(value.toFixed(mostDecimals));
  const exponent = Math.floor(Math.log10(standardUncertainty) + 1e-12);
  let decimals = -exponent;
  let digit = Math.round(standardUncertainty * 10 ** decimals);
  if (digit === 10) {
    decimals -= 1;
    digit = 1;
  }
  if (decimals > mostDecimals) return value.toFixed(mostDecimals);
  if (decimals <= 0) return `${Math.round(value)}(${Math.round(digit * 10 ** -decimals)})`;
  return `${value.toFixed(decimals)}(${digit})`;
}

function trim(text: string): string {
  return text.includes(".") ? text.replace(/\.?0+$/, "") : text;
}
