import { useId } from "react";
import { percent } from "#app/components/charts/spectrum/spectrum-marks.tsx";
import { spectralColour } from "#app/domain/spectral-colour.ts";

const visibleNm = { from: 400, to: 700 } as const;

/** Where on a measured spectrum's axis the visible light lies, in its colours; nothing where none of it does. */
export function VisibleStrip({ shareOfNm, top, height }: { shareOfNm: (nm: number) => number; top: number; height: number }) {
  const id = useId();
  const [from, to] = [shareOfNm(visibleNm.from), shareOfNm(visibleNm.to)];
  if (to <= 0 || from >= 1) return null;
  const stops = Array.from({ length: 16 }, (_, at) => visibleNm.from + at * 20);
  const colour = (nm: number) => {
    const { red, green, blue } = spectralColour(nm);
    return `rgb(${[red, green, blue].map((part) => Math.round(part * 255)).join(" ")})`;
  };
  return (
    <>
      <linearGradient id={id}>
        {stops.map((nm) => (
          <stop key={nm} offset={percent((shareOfNm(nm) - from) / (to - from))} stopColor={colour(nm)} />
        ))}
      </linearGradient>
      <rect x={percent(from)} width={percent(to - from)} y={top} height={height} fill={`url(#${id})`} className="spectrum-light" />
    </>
  );
}
