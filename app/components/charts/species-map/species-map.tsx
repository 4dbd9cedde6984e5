import { scaleLinear } from "@visx/scale";
import { useEffect, useId, useMemo, useRef, useState, type KeyboardEvent, type PointerEvent } from "react";
import type { Measured } from "#app/features/identification/bench-ranking.ts";
import type { SpeciesBox } from "#app/features/species/species-boxes.ts";
import { centreOf, panView, viewShowing, wholeView, zoomView, type MapView } from "./map-view.ts";
import { nextBox, type Direction } from "./next-box.ts";
import { placeNames } from "./place-names.ts";

export type Standing = "chosen" | "candidate" | "near" | "open" | "contradicted";
export type MapReading = Readonly<{ index: Measured | null; sg: Measured | null }>;

type SpeciesMapProps = {
  boxes: readonly SpeciesBox[];
  standingOf: (id: string) => Standing;
  reading: MapReading;
  view: MapView;
  onView: (view: MapView) => void;
  activeId: string | null;
  onActive: (id: string | null) => void;
  onOpen: (id: string) => void;
  /** Script has taken over: it can be moved in and answers keys. */
  isLive: boolean;
  /** Says the keys, for those who hear the page. */
  describedBy: string;
};

const width = 960;
const height = 560;
const plot = { left: 46, right: 950, top: 14, bottom: 516 } as const;
const looks: Readonly<Record<Standing, string>> = {
  chosen: "fill-blue stroke-blue",
  candidate: "fill-tint stroke-tint",
  near: "fill-green stroke-green",
  open: "fill-ink-3 stroke-ink-3/60",
  contradicted: "fill-ink-3 stroke-ink-3/30",
};
const rank: Readonly<Record<Standing, number>> = { contradicted: 0, open: 1, near: 2, candidate: 3, chosen: 4 };
const isStrong = (standing: Standing) => rank[standing] > 1;
const mostNames = 26;
const directions: Readonly<Record<string, Direction>> = { ArrowLeft: "left", ArrowRight: "right", ArrowUp: "up", ArrowDown: "down" };
const pans: Readonly<Record<Direction, { right: number; up: number }>> = { left: { right: -0.2, up: 0 }, right: { right: 0.2, up: 0 }, up: { right: 0, up: 0.2 }, down: { right: 0, up: -0.2 } };

/** Every species as a box of index and density, and the reading as an ellipse of ±2u. The table beneath says the same. */
export function SpeciesMap({ boxes, standingOf, reading, view, onView, activeId, onActive, onOpen, isLive, describedBy }: SpeciesMapProps) {
  const clipId = useId();
  const svg = useRef<SVGSVGElement>(null);
  const drag = useRef<{ x: number; y: number; view: MapView } | null>(null);
  const [isDragging, setDragging] = useState(false);
  const x = useMemo(() => scaleLinear<number>({ domain: [view.indexMin, view.indexMax], range: [plot.left, plot.right] }), [view]);
  const y = useMemo(() => scaleLinear<number>({ domain: [view.sgMin, view.sgMax], range: [plot.bottom, plot.top] }), [view]);

  const drawn = useMemo(
    () =>
      boxes
        .filter(({ index, sg }) => index[1] >= view.indexMin && index[0] <= view.indexMax && sg[1] >= view.sgMin && sg[0] <= view.sgMax)
        .map((box) => {
          const standing = standingOf(box.id);
          const grow = (low: number, high: number) => (high - low < 5 ? [(low + high) / 2 - 2.5, (low + high) / 2 + 2.5] : [low, high]) as [number, number];
          const [left, right] = grow(x(box.index[0]), x(box.index[1]));
          const [top, bottom] = grow(y(box.sg[1]), y(box.sg[0]));
          return { ...box, standing, left, right, top, bottom };
        })
        // Large ones first, so that small ones can be met by the pointer; what matters lies on top.
        .sort((a, b) => rank[a.standing] - rank[b.standing] || (b.right - b.left) * (b.bottom - b.top) - (a.right - a.left) * (a.bottom - a.top) || (a.id < b.id ? -1 : 1)),
    [boxes, standingOf, view, x, y],
  );
  const active = drawn.find(({ id }) => id === activeId);
  const { index, sg } = reading;
  const ellipse = useMemo(
    () => (index && sg ? { cx: x(index.value), cy: y(sg.value), rx: Math.max(5, x(index.value + 2 * index.u) - x(index.value)), ry: Math.max(5, y(sg.value - 2 * sg.u) - y(sg.value)) } : null),
    [index, sg, x, y],
  );
  const names = useMemo(() => {
    const claim = drawn.toSorted((a, b) => Number(b.id === activeId) - Number(a.id === activeId) || rank[b.standing] - rank[a.standing] || b.weight - a.weight || (a.id < b.id ? -1 : 1));
    return placeNames(claim, plot, { most: mostNames, kept: ellipse ? [{ left: ellipse.cx - ellipse.rx, right: ellipse.cx + ellipse.rx, top: ellipse.cy - ellipse.ry, bottom: ellipse.cy + ellipse.ry }] : [] });
  }, [drawn, activeId, ellipse]);

  const pointOf = ({ clientX, clientY }: { clientX: number; clientY: number }) => {
    const box = svg.current!.getBoundingClientRect();
    return { px: ((clientX - box.left) * width) / box.width, py: ((clientY - box.top) * height) / box.height };
  };
  const boxAt = ({ px, py }: { px: number; py: number }) => drawn.findLast(({ left, right, top, bottom }) => px >= left - 2 && px <= right + 2 && py >= top - 2 && py <= bottom + 2);

  // React listens to the wheel passively; only with the zoom key held is the page kept from scrolling.
  const latest = useRef({ view, onView, x, y });
  useEffect(() => {
    latest.current = { view, onView, x, y };
  });
  useEffect(() => {
    const element = svg.current;
    if (!element) return;
    const onWheel = (event: WheelEvent) => {
      if (!event.ctrlKey && !event.metaKey) return;
      event.preventDefault();
      const now = latest.current;
      const box = element.getBoundingClientRect();
      const about = { index: now.x.invert(((event.clientX - box.left) * width) / box.width), sg: now.y.invert(((event.clientY - box.top) * height) / box.height) };
      now.onView(zoomView(now.view, Math.exp(Math.max(-60, Math.min(60, event.deltaY)) / 200), about));
    };
    element.addEventListener("wheel", onWheel, { passive: false });
    return () => element.removeEventListener("wheel", onWheel);
  }, []);

  const onPointerDown = (event: PointerEvent<SVGSVGElement>) => {
    if (event.button !== 0) return;
    drag.current = { x: event.clientX, y: event.clientY, view };
  };
  const onPointerMove = (event: PointerEvent<SVGSVGElement>) => {
    const start = drag.current;
    if (!start) {
      if (event.pointerType === "mouse") onActive(boxAt(pointOf(event))?.id ?? null);
      return;
    }
    const box = svg.current!.getBoundingClientRect();
    const [dx, dy] = [event.clientX - start.x, event.clientY - start.y];
    if (!isDragging) {
      if (Math.hypot(dx, dy) < 5) return;
      setDragging(true);
      event.currentTarget.setPointerCapture(event.pointerId);
    }
    onView(panView(start.view, { right: (-dx / box.width) * (width / (plot.right - plot.left)), up: (dy / box.height) * (height / (plot.bottom - plot.top)) }));
  };
  const onPointerUp = (event: PointerEvent<SVGSVGElement>) => {
    if (drag.current && !isDragging) {
      const met = boxAt(pointOf(event));
      // A finger has no hover: its first touch says what is there, the second opens it.
      if (met && (event.pointerType === "mouse" || met.id === activeId)) onOpen(met.id);
      else onActive(met?.id ?? null);
    }
    drag.current = null;
    setDragging(false);
  };

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const direction = directions[event.key];
    if (direction && event.shiftKey) onView(panView(view, pans[direction]));
    else if (direction) goOn(direction);
    else if (event.key === "+" || event.key === "=") onView(zoomView(view, 1 / 1.5, active ? middleOf(active) : undefined));
    else if (event.key === "-") onView(zoomView(view, 1.5, active ? middleOf(active) : undefined));
    else if (event.key === "0") onView(wholeView);
    else if (event.key === "Enter" && active) onOpen(active.id);
    else if (event.key === "Escape" && active) onActive(null);
    else return;
    event.preventDefault();
  };
  const middleOf = ({ index, sg }: SpeciesBox) => ({ index: (index[0] + index[1]) / 2, sg: (sg[0] + sg[1]) / 2 });
  const goOn = (direction: Direction) => {
    const middles = boxes.map((box) => {
      const middle = middleOf(box);
      return { id: box.id, x: x(middle.index), y: y(middle.sg) };
    });
    const current = middles.find(({ id }) => id === activeId);
    const centre = centreOf(view);
    const start = { x: x(reading.index?.value ?? centre.index), y: y(reading.sg?.value ?? centre.sg) };
    const next = current ? nextBox(middles, current, direction) : nearest(middles, start);
    if (!next) return;
    onActive(next.id);
    const box = boxes.find(({ id }) => id === next.id)!;
    onView(viewShowing(view, middleOf(box)));
  };

  return (
    <svg
      ref={svg}
      viewBox={`0 0 ${width} ${height}`}
      className={`block h-auto w-full touch-pan-y select-none ${isDragging ? "cursor-grabbing" : isLive ? "cursor-crosshair" : ""}`}
      aria-label={description(boxes.length, reading)}
      {...(isLive ? { role: "application", "aria-roledescription": "map", tabIndex: 0, "aria-describedby": describedBy, onKeyDown, onPointerDown, onPointerMove, onPointerUp, onPointerCancel: () => { drag.current = null; setDragging(false); }, onPointerLeave: () => { if (!isDragging) drag.current = null; } } : { role: "img" })}
    >
      <clipPath id={clipId}>
        <rect x={plot.left} y={plot.top} width={plot.right - plot.left} height={plot.bottom - plot.top} />
      </clipPath>
      <g aria-hidden="true">
        {y.ticks(7).map((tick) => (
          <g key={tick}>
            <line x1={plot.left} x2={plot.right} y1={y(tick)} y2={y(tick)} className="stroke-rule" strokeDasharray="2 3" />
            <text x={plot.left - 7} y={y(tick) + 4} textAnchor="end" className="fill-ink-3 font-mono text-[12px]">
              {tick.toFixed(sgDecimals(view.sgMax - view.sgMin))}
            </text>
          </g>
        ))}
        {x.ticks(9).map((tick) => (
          <g key={tick}>
            <line x1={x(tick)} x2={x(tick)} y1={plot.top} y2={plot.bottom} className="stroke-rule" strokeDasharray="2 3" />
            <text x={x(tick)} y={plot.bottom + 17} textAnchor="middle" className="fill-ink-3 font-mono text-[12px]">
              {tick.toFixed(indexDecimals(view.indexMax - view.indexMin))}
            </text>
          </g>
        ))}
        <path d={`M${plot.left} ${plot.top}V${plot.bottom}H${plot.right}`} className="fill-none stroke-rule-2" />
        <text x={plot.right} y={height - 8} textAnchor="end" className="fill-ink-2 text-[13px]">
          refractive index, 589.3 nm
        </text>
        <text x={plot.left + 8} y={plot.top + 13} strokeWidth="4" className="fill-ink-2 stroke-sheet text-[13px] [paint-order:stroke]">
          density
        </text>
        <g clipPath={`url(#${clipId})`}>
          {index ? <rect x={x(index.value - 2 * index.u)} width={Math.max(1, x(index.value + 2 * index.u) - x(index.value - 2 * index.u))} y={plot.top} height={plot.bottom - plot.top} className="fill-tint/15" /> : null}
          {sg ? <rect x={plot.left} width={plot.right - plot.left} y={y(sg.value + 2 * sg.u)} height={Math.max(1, y(sg.value - 2 * sg.u) - y(sg.value + 2 * sg.u))} className="fill-tint/15" /> : null}
          {drawn.map(({ id, standing, left, right, top, bottom }) => (
            <rect key={id} data-species={id} x={left} y={top} width={right - left} height={bottom - top} rx="1.5" strokeWidth={isStrong(standing) ? 1.4 : 0.7} fillOpacity={fillShare((right - left) * (bottom - top)) * (standing === "contradicted" ? 0.4 : 1)} className={looks[standing]} />
          ))}
          {active ? <rect x={active.left - 2} y={active.top - 2} width={active.right - active.left + 4} height={active.bottom - active.top + 4} rx="3" strokeWidth="2" className="fill-none stroke-ink" /> : null}
          {ellipse ? <ellipse data-reading="" {...ellipse} strokeWidth="2.5" className="fill-none stroke-tint" /> : null}
        </g>
        {names.map(({ id, name, x: nameX, y: nameY, anchor }) => (
          <text key={id} x={nameX} y={nameY} textAnchor={anchor} strokeWidth="4" className={`stroke-sheet font-serif text-[12.5px] [paint-order:stroke] ${id === activeId ? "fill-ink font-semibold" : standingOf(id) === "contradicted" ? "fill-ink-3" : "fill-ink"}`}>
            {name}
          </text>
        ))}
      </g>
    </svg>
  );
}

function nearest<T extends { x: number; y: number }>(points: readonly T[], to: { x: number; y: number }): T | undefined {
  return points.reduce<T | undefined>((best, point) => (!best || Math.hypot(point.x - to.x, point.y - to.y) < Math.hypot(best.x - to.x, best.y - to.y) ? point : best), undefined);
}

const plotArea = (plot.right - plot.left) * (plot.bottom - plot.top);
/** A large box is all but empty, so that many can lie on one another and small ones still be seen. */
const fillShare = (area: number) => Math.min(0.4, Math.max(0.02, 0.02 * Math.sqrt(plotArea / Math.max(1, area))));

const sgDecimals = (span: number) => (span > 0.7 ? 1 : span > 0.1 ? 2 : 3);
const indexDecimals = (span: number) => (span > 0.3 ? 2 : span > 0.02 ? 3 : 4);

function description(count: number, { index, sg }: MapReading): string {
  const where = [index ? `index ${index.value.toFixed(3)}` : "", sg ? `density ${sg.value.toFixed(2)}` : ""].filter(Boolean).join(" and ");
  return `Map of ${count} species by refractive index and density.${where ? ` The reading stands at ${where}.` : ""}`;
}
