import type { SpectrumLine } from "#app/domain/bench-tests/spectrum-lines.ts";
import { drawnSpectrumNm, shareAtNm, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

type Mark = Pick<SpectrumLine, "nm" | "halfWidthNm" | "isEmission" | "strength">;
const opacity = { strong: 1, medium: 0.8, weak: 0.55, faint: 0.32, unsaid: 0.8 } as const;

type SpectrumMarksProps = { marks: readonly Mark[]; view: SpectrumView; top: number; height: number; /** Of a spectrum without colours behind it. */ isFaint?: boolean };

/** Lines and bands, dark or shining, as wide and as strong as they are; what lies outside what is drawn is left out. */
export function SpectrumMarks({ marks, view, top, height, isFaint = false }: SpectrumMarksProps) {
  return marks.map(({ nm, halfWidthNm, isEmission, strength }, at) => {
    const reach = reachOf({ nm, halfWidthNm }, view);
    if (!reach) return null;
    // A picture of light: what is dark is black in every room.
    const paint = isFaint ? "var(--color-ink-3)" : isEmission ? "white" : "black";
    const fillOpacity = opacity[strength ?? "unsaid"] * (isFaint ? 0.7 : halfWidthNm > 0 && !isEmission ? 0.85 : 1);
    if (halfWidthNm === 0) return <line key={at} x1={reach.left} x2={reach.left} y1={top} y2={top + height} strokeWidth={isFaint ? 1.5 : 2} stroke={paint} strokeOpacity={fillOpacity} />;
    return <rect key={at} x={reach.left} width={reach.width} y={top} height={height} fill={paint} fillOpacity={fillOpacity} />;
  });
}

/** Left end and width of a mark in percent of the picture; null where nothing of it is drawn. */
export function reachOf({ nm, halfWidthNm }: Pick<SpectrumLine, "nm" | "halfWidthNm">, view: SpectrumView): { left: string; width: string; middle: number } | null {
  const { from, to } = drawnSpectrumNm;
  if (nm + halfWidthNm < from || nm - halfWidthNm > to) return null;
  const [one, other] = [shareAtNm(Math.max(from, nm - halfWidthNm), view), shareAtNm(Math.min(to, nm + halfWidthNm), view)];
  const left = Math.min(one, other);
  return { left: percent(left), width: percent(Math.abs(one - other)), middle: (one + other) / 2 };
}

export const percent = (share: number) => `${(share * 100).toFixed(2)}%`;
