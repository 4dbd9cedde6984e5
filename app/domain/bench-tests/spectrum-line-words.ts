import type { SpectrumLine } from "./spectrum-lines.ts";

/** A line or band in words: "line at 694 nm, strong, shining". */
export function spectrumLineWords({ nm, halfWidthNm, kind, strength, isEmission }: SpectrumLine): string {
  const round = (place: number) => String(Number(place.toFixed(1)));
  const place = kind === "band" ? `band from ${round(nm - halfWidthNm)} to ${round(nm + halfWidthNm)} nm` : `line at ${round(nm)} nm`;
  return [place, strength, isEmission ? "shining" : ""].filter(Boolean).join(", ");
}
