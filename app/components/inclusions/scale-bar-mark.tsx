import { scaleBar } from "#app/domain/scale-bar.ts";

/** The length of a piece of a photograph, in its lower right corner, on a ground of its own so that it shows on any picture. */
export function ScaleBarMark({ pictureWidthMm }: { pictureWidthMm: number }) {
  const { text, share } = scaleBar(pictureWidthMm);
  return (
    <svg width="100%" height="34" role="img" aria-label={`Scale bar of ${text}`} className="absolute right-0 bottom-0 left-0 [print-color-adjust:exact]">
      <rect x={`${(100 * (1 - share) - 5).toFixed(2)}%`} y="2" width={`${(100 * share + 4).toFixed(2)}%`} height="28" rx="4" fill="white" fillOpacity="0.82" />
      <line x1={`${(100 * (1 - share) - 3).toFixed(2)}%`} x2="97%" y1="23" y2="23" stroke="black" strokeWidth="3" />
      <text x={`${(100 * (1 - share / 2) - 3).toFixed(2)}%`} y="16" textAnchor="middle" fill="black" className="font-mono text-[11px]">
        {text}
      </text>
    </svg>
  );
}
