import { useRef, useState, type KeyboardEvent, type PointerEvent } from "react";
import { SpectrumAxis } from "#app/components/charts/spectrum/spectrum-axis.tsx";
import { SpectrumGround } from "#app/components/charts/spectrum/spectrum-ground.tsx";
import { percent, reachOf, SpectrumMarks } from "#app/components/charts/spectrum/spectrum-marks.tsx";
import { spectrumLineWords } from "#app/domain/bench-tests/spectrum-line-words.ts";
import type { SpectrumLine } from "#app/domain/bench-tests/spectrum-lines.ts";
import { drawnSpectrumNm, nmAtShare, shareAtNm, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";
import { spectrumKeyAct } from "./spectrum-keys.ts";

type SpectrumPadProps = {
  id: string;
  lines: readonly SpectrumLine[];
  view: SpectrumView;
  /** Which of the lines is in hand. */
  selected: number | null;
  onSelect: (at: number | null) => void;
  onAdd: (line: SpectrumLine) => void;
  onChange: (at: number, line: SpectrumLine) => void;
  onRemove: (at: number) => void;
  describedBy: string;
};

const top = 10;
const height = 56;
/** A finger is not finer than this. */
const nearPx = 9;
/** A drag shorter than this is a tap. */
const leastDragPx = 8;
const newLine = (nm: number): SpectrumLine => ({ nm, halfWidthNm: 0, kind: "line", strength: null, isEmission: false });
const newBand = (one: number, other: number): SpectrumLine => ({ nm: (one + other) / 2, halfWidthNm: Math.max(1, Math.abs(one - other) / 2), kind: "band", strength: null, isEmission: false });

/** The drawn spectrum as something to point at: a tap sets a line, a drag a band; the same by keys, as on a slider. */
export function SpectrumPad({ id, lines, view, selected, onSelect, onAdd, onChange, onRemove, describedBy }: SpectrumPadProps) {
  const svg = useRef<SVGSVGElement>(null);
  const [cursorNm, setCursorNm] = useState(550);
  const [hasFocus, setHasFocus] = useState(false);
  const [bandFromNm, setBandFromNm] = useState<number | null>(null);
  const [drag, setDrag] = useState<{ fromNm: number; toNm: number; fromX: number; isLong: boolean } | null>(null);
  const lineAt = (nm: number, reachNm: number) => lines.findIndex((line) => Math.abs(line.nm - nm) <= Math.max(reachNm, line.halfWidthNm));
  const inHand = selected ?? (lineAt(cursorNm, 0.5) >= 0 ? lineAt(cursorNm, 0.5) : null);

  const nmOf = (event: PointerEvent) => {
    const box = svg.current!.getBoundingClientRect();
    return Math.round(nmAtShare((event.clientX - box.left) / box.width, view));
  };
  const onPointerDown = (event: PointerEvent<SVGSVGElement>) => {
    if (event.button !== 0) return;
    const nm = nmOf(event);
    setDrag({ fromNm: nm, toNm: nm, fromX: event.clientX, isLong: false });
    event.currentTarget.setPointerCapture(event.pointerId);
  };
  const onPointerMove = (event: PointerEvent<SVGSVGElement>) => {
    if (drag) setDrag({ ...drag, toNm: nmOf(event), isLong: drag.isLong || Math.abs(event.clientX - drag.fromX) > leastDragPx });
  };
  const onPointerUp = (event: PointerEvent<SVGSVGElement>) => {
    if (!drag) return;
    setDrag(null);
    const nm = nmOf(event);
    setCursorNm(nm);
    if (drag.isLong && Math.abs(drag.fromNm - nm) >= 2) return onAdd(newBand(drag.fromNm, nm));
    const box = svg.current!.getBoundingClientRect();
    const reachNm = Math.abs(nmAtShare((event.clientX - box.left + nearPx) / box.width, view) - nmAtShare((event.clientX - box.left - nearPx) / box.width, view)) / 2;
    const met = lines.findIndex((line) => line.kind === "line" && Math.abs(line.nm - nm) <= reachNm);
    if (met >= 0) onSelect(met);
    else onAdd(newLine(nm));
  };

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const act = spectrumKeyAct(event.key, event.shiftKey, cursorNm, view);
    if (!act) return;
    const line = inHand === null ? undefined : lines[inHand];
    if (act.act === "move") {
      setCursorNm(act.toNm);
      onSelect(null);
    } else if (act.act === "set") {
      if (bandFromNm !== null) endBand(bandFromNm);
      else if (lineAt(cursorNm, 0.5) < 0) onAdd(newLine(cursorNm));
      else onSelect(lineAt(cursorNm, 0.5));
    } else if (act.act === "band") {
      if (bandFromNm === null) setBandFromNm(cursorNm);
      else endBand(bandFromNm);
    } else if (act.act === "leave") {
      if (bandFromNm === null && selected === null) return;
      setBandFromNm(null);
      onSelect(null);
    } else if (line && inHand !== null) {
      if (act.act === "remove") onRemove(inHand);
      else onChange(inHand, act.act === "strength" ? { ...line, strength: act.strength } : { ...line, isEmission: !line.isEmission });
    }
    event.preventDefault();
  };
  const endBand = (fromNm: number) => {
    setBandFromNm(null);
    if (fromNm !== cursorNm) onAdd(newBand(fromNm, cursorNm));
  };

  const growing = drag?.isLong ? newBand(drag.fromNm, drag.toNm) : bandFromNm !== null ? newBand(bandFromNm, cursorNm) : null;
  const here = inHand === null ? undefined : lines[inHand];
  return (
    <svg
      ref={svg}
      id={id}
      width="100%"
      height={top + height + 26}
      role="slider"
      tabIndex={0}
      aria-label="Place on the spectrum"
      aria-describedby={describedBy}
      aria-valuemin={drawnSpectrumNm.from}
      aria-valuemax={drawnSpectrumNm.to}
      aria-valuenow={cursorNm}
      aria-valuetext={`${cursorNm} nm${bandFromNm === null ? "" : `, band from ${bandFromNm} nm`}${here ? `, ${spectrumLineWords(here)}` : ""}`}
      className="block cursor-crosshair touch-pan-y overflow-visible rounded-sm outline-none select-none focus-visible:outline-2 focus-visible:outline-offset-2 focus-visible:outline-tint"
      onKeyDown={onKeyDown}
      onFocus={() => setHasFocus(true)}
      onBlur={() => setHasFocus(false)}
      onPointerDown={onPointerDown}
      onPointerMove={onPointerMove}
      onPointerUp={onPointerUp}
      onPointerCancel={() => setDrag(null)}
    >
      <SpectrumGround view={view} top={top} height={height} />
      <SpectrumMarks marks={growing ? [...lines, growing] : lines} view={view} top={top} height={height} />
      <SpectrumAxis view={view} top={top + height} />
      {lines.map((line, at) => {
        const reach = reachOf(line, view);
        return reach ? (
          <svg key={at} x={percent(reach.middle)} y="0" width="1" height={top} overflow="visible" aria-hidden="true" className={at === inHand ? "fill-tint" : "fill-ink-2"}>
            <path d={at === inHand ? "M-6 0H6L0 9Z" : "M-4 3H4L0 9Z"} />
          </svg>
        ) : null;
      })}
      {hasFocus ? <line x1={percent(shareAtNm(cursorNm, view))} x2={percent(shareAtNm(cursorNm, view))} y1={top - 4} y2={top + height + 6} className="stroke-tint" strokeWidth="2" strokeDasharray="3 2" aria-hidden="true" /> : null}
    </svg>
  );
}
