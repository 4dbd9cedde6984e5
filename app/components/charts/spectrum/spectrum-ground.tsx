import { useId, useMemo } from "react";
import { spectralColour } from "#app/domain/spectral-colour.ts";
import { drawnSpectrumNm, shareAtNm, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

const stepNm = 10;

/** The colours of the spectrum as a rectangle as wide as its picture, spread as the view says; dimmed in the dim room. */
export function SpectrumGround({ view, top, height }: { view: SpectrumView; top: number; height: number }) {
  const id = useId();
  const stops = useMemo(() => {
    const nms = Array.from({ length: (drawnSpectrumNm.to - drawnSpectrumNm.from) / stepNm + 1 }, (_, at) => drawnSpectrumNm.from + at * stepNm);
    return nms.map((nm) => ({ share: shareAtNm(nm, view), colour: hex(spectralColour(nm)) })).sort((a, b) => a.share - b.share);
  }, [view]);
  return (
    <>
      <linearGradient id={id}>
        {stops.map(({ share, colour }) => (
          <stop key={share} offset={`${(share * 100).toFixed(2)}%`} stopColor={colour} />
        ))}
      </linearGradient>
      <rect width="100%" y={top} height={height} fill="black" />
      <rect width="100%" y={top} height={height} fill={`url(#${id})`} className="spectrum-light" />
    </>
  );
}

const hex = ({ red, green, blue }: { red: number; green: number; blue: number }) => `#${[red, green, blue].map((part) => Math.round(part * 255).toString(16).padStart(2, "0")).join("")}`;
