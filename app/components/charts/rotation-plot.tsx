import { scaleLinear } from "@visx/scale";
import { LinePath } from "@visx/shape";
import { edgesOfSolution } from "#app/gemmology/rotation/edges-of-solution.ts";
import type { RotationFit } from "#app/gemmology/rotation/rotation-fit.ts";
import type { RotationRun } from "#app/gemmology/rotation/rotation-run.ts";

const [width, height] = [480, 240];
const plot = { left: 46, right: 470, top: 12, bottom: 208 };
const stepDeg = 3;
type Point = Readonly<{ angleDeg: number; index: number }>;
const looks = [
  { line: "stroke-tint", dash: undefined },
  { line: "stroke-blue", dash: "5 3" },
] as const;

/** Both edges against rotation, a picture a facet: readings as rings, fitted crystals as lines, misfits crossed. */
export function RotationPlot({ run, fit }: { run: RotationRun; fit: RotationFit }) {
  const shown = fit.solutions.filter(({ deltaChiSquared }) => deltaChiSquared <= 9).slice(0, looks.length);
  const edges = run.facets.flatMap(({ readings }) => readings.flatMap(({ upper, lower }) => [upper, lower].filter((edge) => edge !== null)));
  const [least, most] = [Math.min(...edges), Math.max(...edges)];
  // A flat edge needs a scale as well.
  const pad = Math.max((most - least) * 0.15, 0.002);
  const angles = run.facets.flatMap(({ readings }) => readings.map(({ angleDeg }) => angleDeg));
  const [fromDeg, toDeg] = [Math.min(0, ...angles), Math.max(180, ...angles)];
  const x = scaleLinear({ domain: [fromDeg, toDeg], range: [plot.left, plot.right] });
  const y = scaleLinear({ domain: [least - pad, most + pad], range: [plot.bottom, plot.top] });
  const isMisfit = (facet: string, angleDeg: number, edge: "upper" | "lower") => fit.outliers.some((one) => one.facet === facet && one.angleDeg === angleDeg && one.edge === edge);
  return (
    <div className="grid gap-2">
      {run.facets.map(({ label, readings }) => (
        <svg key={label} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={`Edges on ${label} against rotation: ${readings.length} positions${shown.length > 1 ? ", two crystals that fit" : ", with the fitted crystal"}`} className="block h-auto w-full max-w-xl">
          {y.ticks(4).map((tick) => (
            <g key={tick}>
              <line x1={plot.left} x2={plot.right} y1={y(tick)} y2={y(tick)} className="stroke-rule" strokeDasharray="2 3" />
              <text x={plot.left - 6} y={y(tick) + 3.5} textAnchor="end" className="fill-ink-3 font-mono text-[10.5px]">
                {tick.toFixed(3)}
              </text>
            </g>
          ))}
          {[fromDeg, (fromDeg + toDeg) / 2, toDeg].map((angleDeg) => (
            <text key={angleDeg} x={x(angleDeg)} y={plot.bottom + 16} textAnchor={angleDeg === toDeg ? "end" : "middle"} className="fill-ink-3 font-mono text-[10.5px]">
              {Math.round(angleDeg)}°
            </text>
          ))}
          <path d={`M${plot.left} ${plot.top}V${plot.bottom}H${plot.right}`} className="fill-none stroke-rule-2" />
          <text x={plot.left + 6} y={plot.top + 8} className="fill-ink-2 text-[11px]">
            {label}
          </text>
          {shown.map((solution, at) => {
            const edgesAt = edgesOfSolution(solution, label);
            if (!edgesAt) return null;
            const curve = (edge: "upper" | "lower"): Point[] => Array.from({ length: Math.floor((toDeg - fromDeg) / stepDeg) + 1 }, (_, step) => ({ angleDeg: fromDeg + step * stepDeg, index: edgesAt(fromDeg + step * stepDeg)[edge] }));
            return (["upper", "lower"] as const).map((edge) => <LinePath key={`${at}-${edge}`} data={curve(edge)} x={({ angleDeg }) => x(angleDeg)} y={({ index }) => y(index)} className={`fill-none ${looks[at]!.line}`} strokeWidth={1.6} strokeDasharray={looks[at]!.dash} />);
          })}
          {readings.flatMap(({ angleDeg, upper, lower }) =>
            (["upper", "lower"] as const).map((edge) => {
              const index = edge === "upper" ? upper : lower;
              if (index === null) return null;
              const [px, py] = [x(angleDeg), y(index)];
              return isMisfit(label, angleDeg, edge) ? (
                <path key={`${angleDeg}-${edge}`} d={`M${px - 5} ${py - 5}L${px + 5} ${py + 5}M${px - 5} ${py + 5}L${px + 5} ${py - 5}`} className="fill-none stroke-red" strokeWidth={2} />
              ) : (
                <circle key={`${angleDeg}-${edge}`} cx={px} cy={py} r={3.2} className="fill-paper stroke-ink" strokeWidth={1.4} />
              );
            }),
          )}
        </svg>
      ))}
    </div>
  );
}
