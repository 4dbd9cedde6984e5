import type { SpectrumLine } from "./spectrum-lines.ts";

/** Lines and bands as readSpectrumLines reads them: "694 strong e, 540-580 weak". Places to a tenth of a nanometre. */
export function writeSpectrumLines(lines: readonly SpectrumLine[]): string {
  return lines.map(writeSpectrumLine).join(", ");
}

export function writeSpectrumLine({ nm, halfWidthNm, kind, strength, isEmission }: SpectrumLine): string {
  const place = kind === "band" ? `${tenth(nm - halfWidthNm)}-${tenth(nm + halfWidthNm)}` : tenth(nm);
  return [place, strength, isEmission ? "e" : ""].filter(Boolean).join(" ");
}

const tenth = (nm: number) => String(Number(nm.toFixed(1)));
