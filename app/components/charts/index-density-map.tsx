export type MapSpecies = {
  id: string;
  name: string;
  riLow: number;
  riHigh: number;
  sgLow: number;
  sgHigh: number;
  /** "candidate" is drawn strong and named, "contradicted" faint; the rest lie between. */
  standing?: "candidate" | "open" | "contradicted";
};

/** What was measured, with standard uncertainties. A missing half leaves a band instead of an ellipse. */
export type MapReading = { ri?: number; riU?: number; sg?: number; sgU?: number };

type IndexDensityMapProps = {
  species: readonly MapSpecies[];
  reading?: MapReading;
  riMin?: number;
  riMax?: number;
  sgMin?: number;
  sgMax?: number;
  /** How many candidates are named in the picture. */
  mostNames?: number;
};

const width = 480;
const height = 320;
const plot = { left: 36, right: 468, top: 12, bottom: 284 };

const looks = {
  candidate: "fill-tint/35 stroke-tint",
  open: "fill-ink-3/35 stroke-none",
  contradicted: "fill-ink-3/15 stroke-none",
} as const;

/** Every species by refractive index and density, and where the stone falls: an ellipse of ±2u about the reading. */
export function IndexDensityMap(props: IndexDensityMapProps) {
  const { species, reading = {}, riMin = 1.4, riMax = 2.5, sgMin = 1, sgMax = 7, mostNames = 5 } = props;
  const { ri, riU = 0, sg, sgU = 0 } = reading;
  const x = (value: number) => plot.left + ((plot.right - plot.left) * (clamp(value, riMin, riMax) - riMin)) / (riMax - riMin);
  const y = (value: number) => plot.bottom - ((plot.bottom - plot.top) * (clamp(value, sgMin, sgMax) - sgMin)) / (sgMax - sgMin);

  // Faint first, so that the candidates lie on top.
  const order = { contradicted: 0, open: 1, candidate: 2 } as const;
  const drawn = species
    .filter((one) => one.riHigh >= riMin && one.riLow <= riMax && one.sgHigh >= sgMin && one.sgLow <= sgMax)
    .toSorted((a, b) => order[a.standing ?? "open"] - order[b.standing ?? "open"]);
  const names = placeNames(drawn.filter((one) => one.standing === "candidate").slice(0, mostNames), { x, y });

  return (
    <svg viewBox={`0 0 ${width} ${height}`} className="mx-auto block h-auto w-full max-w-2xl" role="img" aria-label={description(drawn, reading)}>
      {ticks(sgMin, sgMax, 1).map((tick) => (
        <g key={tick}>
          <line x1={plot.left} x2={plot.right} y1={y(tick)} y2={y(tick)} className="stroke-rule" strokeDasharray={tick === sgMin ? undefined : "2 3"} />
          <text x={plot.left - 7} y={y(tick) + 3.5} textAnchor="end" className="fill-ink-3 font-mono text-[10.5px]">
            {tick.toFixed(1)}
          </text>
        </g>
      ))}
      {ticks(riMin, riMax, 0.2).map((tick) => (
        <g key={tick}>
          <line x1={x(tick)} x2={x(tick)} y1={plot.bottom} y2={plot.bottom + 4} className="stroke-rule-2" />
          <text x={x(tick)} y={plot.bottom + 16} textAnchor="middle" className="fill-ink-3 font-mono text-[10.5px]">
            {tick.toFixed(2)}
          </text>
        </g>
      ))}
      <path d={`M${plot.left} ${plot.top}V${plot.bottom}H${plot.right}`} className="fill-none stroke-rule-2" />
      <text x={plot.right} y={height - 6} textAnchor="end" className="fill-ink-2 text-[11px]">
        refractive index
      </text>
      <text x={plot.left + 6} y={plot.top + 6} className="fill-ink-2 text-[11px]">
        density
      </text>

      {drawn.map((one) => (
        <rect
          key={one.id}
          x={x(one.riLow)}
          y={y(one.sgHigh)}
          width={Math.max(4, x(one.riHigh) - x(one.riLow))}
          height={Math.max(4, y(one.sgLow) - y(one.sgHigh))}
          rx="1.5"
          className={looks[one.standing ?? "open"]}
        >
          <title>{`${one.name}: ${one.riLow}–${one.riHigh}, ${one.sgLow}–${one.sgHigh}`}</title>
        </rect>
      ))}

      {ri !== undefined ? <rect x={x(ri - 2 * riU)} width={Math.max(1, x(ri + 2 * riU) - x(ri - 2 * riU))} y={plot.top} height={plot.bottom - plot.top} className="fill-tint/20" /> : null}
      {sg !== undefined ? <rect x={plot.left} width={plot.right - plot.left} y={y(sg + 2 * sgU)} height={Math.max(1, y(sg - 2 * sgU) - y(sg + 2 * sgU))} className="fill-tint/20" /> : null}
      {ri !== undefined && sg !== undefined ? (
        <ellipse cx={x(ri)} cy={y(sg)} rx={Math.max(6, x(ri + 2 * riU) - x(ri))} ry={Math.max(6, y(sg - 2 * sgU) - y(sg))} strokeWidth="2" className="fill-none stroke-tint" />
      ) : null}

      {names.map(({ id, name, nameX, nameY, boxX, boxY }) => (
        <g key={id}>
          <line x1={boxX} y1={boxY} x2={nameX - 4} y2={nameY - 4} className="stroke-tint" strokeWidth="0.8" />
          <text x={nameX} y={nameY} strokeWidth="4" className="fill-ink stroke-sheet font-serif text-[12px] [paint-order:stroke]">
            {name}
          </text>
        </g>
      ))}
    </svg>
  );
}

function clamp(value: number, low: number, high: number): number {
  return Math.min(high, Math.max(low, value));
}

function ticks(low: number, high: number, step: number): number[] {
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, i) => (first + i) * step);
}

/** Names in a column to the lower right, which the diagonal of index and density leaves free; in the boxes' own order, so that no leader crosses another. */
function placeNames(candidates: readonly MapSpecies[], { x, y }: { x: (ri: number) => number; y: (sg: number) => number }) {
  const boxes = candidates
    .map((one) => ({ id: one.id, name: one.name, boxX: x(one.riHigh), boxY: (y(one.sgLow) + y(one.sgHigh)) / 2 }))
    .toSorted((one, other) => one.boxY - other.boxY);
  const nameX = Math.min(plot.right - 116, Math.max(...boxes.map(({ boxX }) => boxX)) + 44);
  const lineHeight = 16;
  const lowest = plot.bottom - 6 - lineHeight * (boxes.length - 1);
  const firstY = Math.min(lowest, (boxes[0]?.boxY ?? 0) + 22);
  return boxes.map((box, index) => ({ ...box, nameX, nameY: firstY + index * lineHeight }));
}

function description(drawn: readonly MapSpecies[], { ri, sg }: MapReading): string {
  const named = drawn.filter((one) => one.standing === "candidate").map((one) => one.name);
  const where = [ri !== undefined ? `refractive index ${ri.toFixed(3)}` : "", sg !== undefined ? `density ${sg.toFixed(2)}` : ""].filter(Boolean).join(", ");
  return `${drawn.length} species by refractive index and density. ${where ? `The stone: ${where}.` : "The stone has neither yet."}${named.length > 0 ? ` Candidates near it: ${named.join(", ")}.` : ""}`;
}
