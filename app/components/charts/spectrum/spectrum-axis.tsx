import { shareAtNm, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";
import { percent } from "./spectrum-marks.tsx";

const labelled = [400, 450, 500, 550, 600, 650, 700];
const fine = Array.from({ length: 31 }, (_, at) => 400 + at * 10);
/** Labels nearer to each other than this share of the width would touch on a telephone. */
const leastGap = 0.1;

/** Nanometres along the drawn spectrum, crowded in the red where a prism crowds them. */
export function SpectrumAxis({ view, top }: { view: SpectrumView; top: number }) {
  return (
    <g aria-hidden="true">
      {fine.map((nm) => (
        <line key={nm} x1={percent(shareAtNm(nm, view))} x2={percent(shareAtNm(nm, view))} y1={top} y2={top + (nm % 50 === 0 ? 7 : 4)} className="stroke-edge" />
      ))}
      {labelled.map((nm, at) => {
        const share = shareAtNm(nm, view);
        const isNear = at > 0 && at < labelled.length - 1 && Math.abs(share - shareAtNm(labelled[at + 1]!, view)) < leastGap;
        return (
          <text key={nm} x={percent(share)} y={top + 19} textAnchor={share < 0.01 ? "start" : share > 0.99 ? "end" : "middle"} className={`fill-ink-3 font-mono text-[11px] ${isNear ? "max-sm:hidden" : ""}`}>
            {nm}
          </text>
        );
      })}
    </g>
  );
}
