import { cutOutline, type CutOutlineCode } from "#app/domain/cut-outline/cut-outline.ts";
import type { PlotSide } from "#app/domain/inclusion.ts";

/** The outline of a cut with a pattern of facets, filling its frame from edge to edge. */
export function CutDrawing({ outline: code, side }: { outline: CutOutlineCode; side: PlotSide }) {
  const { aspect, outline, lines } = cutOutline(code, side);
  const text = (points: ReadonlyArray<readonly [number, number]>) => points.map(([right, down]) => `${(right * aspect).toFixed(3)},${down.toFixed(3)}`).join(" ");
  return (
    <svg viewBox={`${-aspect} -1 ${2 * aspect} 2`} aria-hidden="true" className="block h-auto w-full overflow-visible [print-color-adjust:exact]">
      {lines.map((line, at) => (
        <polyline key={at} points={text(line)} className="fill-none stroke-edge" strokeOpacity="0.55" strokeWidth="0.006" />
      ))}
      <polygon points={text(outline)} className="fill-none stroke-ink-2" strokeWidth="0.014" strokeLinejoin="round" />
    </svg>
  );
}
