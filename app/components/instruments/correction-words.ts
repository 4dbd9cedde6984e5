import { scaleUnitSigns, type ScaleUnit } from "#app/domain/instrument-scale.ts";
import { asLine, type Correction } from "#app/gemmology/calibration/correction.ts";

/** "+0.0004 ± 0.0006", or with a slope "−0.0312 + 0.0187 · reading". */
export function correctionWords(correction: Correction, unit: ScaleUnit | null): string {
  const decimals = decimalsFor(correction.uOffset);
  const behind = unit && scaleUnitSigns[unit] ? ` ${scaleUnitSigns[unit]}` : "";
  if (correction.model === "offset") return `${signed(correction.offset, decimals)} ± ${correction.uOffset.toFixed(decimals)}${behind}`;
  const { a, b } = asLine(correction);
  return `${signed(a, decimals)} ${b < 0 ? "−" : "+"} ${Math.abs(b).toFixed(5)} · reading${behind}`;
}

export function signed(value: number, decimals: number): string {
  return `${value < 0 ? "−" : "+"}${Math.abs(value).toFixed(decimals)}`;
}

/** Two figures of an uncertainty. */
export function decimalsFor(uncertainty: number): number {
  return uncertainty > 0 ? Math.min(7, Math.max(0, 1 - Math.floor(Math.log10(uncertainty)))) : 4;
}
