import { useId, useState, type RefObject } from "react";
import { useIsHydrated } from "#app/components/layout/use-is-hydrated.ts";
import { keepSpectrumView } from "#app/components/charts/spectrum/keep-spectrum-view.ts";
import { DrawnSpectrum } from "#app/components/charts/spectrum/drawn-spectrum.tsx";
import { spectrumLineWords } from "#app/domain/bench-tests/spectrum-line-words.ts";
import { readSpectrumLines, type SpectrumLine } from "#app/domain/bench-tests/spectrum-lines.ts";
import { writeSpectrumLine, writeSpectrumLines } from "#app/domain/bench-tests/write-spectrum-lines.ts";
import type { AbsorbingSpecies } from "#app/features/species/absorption-lines.ts";
import { usualSpectrumView, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";
import { CandidateSpectra } from "./candidate-spectra.tsx";
import { LineEditor } from "./line-editor.tsx";
import { spectrumKeyHelp } from "./spectrum-keys.ts";
import { SpectrumPad } from "./spectrum-pad.tsx";
import { SpectrumViewChoice } from "./spectrum-view-choice.tsx";
import { typeInto } from "./type-into.ts";

export type SpectrumDrawingProps = {
  /** The field of words that is drawn, and that the drawing writes into. */
  field: RefObject<HTMLTextAreaElement | null>;
  /** What stands in it now. */
  text: string;
  id: string;
  maxLength: number;
  /** As this browser chose; see spectrum-view.server.ts. */
  view?: SpectrumView;
  /** Faintly above the spectrum; none where candidates are hidden. */
  candidates?: readonly AbsorbingSpecies[];
};

/** The lines and bands of a field of words, drawn: either changes the other. Without script it is a picture. */
export function SpectrumDrawing({ field, text, id, maxLength, view: initialView = usualSpectrumView, candidates = [] }: SpectrumDrawingProps) {
  const isLive = useIsHydrated();
  const helpId = useId();
  const [chosen, setChosen] = useState<{ at: number; text: string } | null>(null);
  const [chosenView, setChosenView] = useState<SpectrumView | null>(null);
  const view = chosenView ?? initialView;
  const { lines, problem } = readSpectrumLines(text);
  // What is in hand is so until other words are typed.
  const selected = chosen && chosen.text === text ? chosen.at : null;
  const setSelected = (at: number | null, of = text) => setChosen(at === null ? null : { at, text: of });

  const write = (changed: string) => field.current && typeInto(field.current, changed);
  const add = (line: SpectrumLine) => {
    const words = writeSpectrumLine(line);
    const changed = text.trim() === "" ? words : `${text.trim().replace(/[,;]$/, "")}, ${words}`;
    if (changed.length > maxLength) return;
    write(changed);
    const at = readSpectrumLines(changed).lines.findIndex(({ nm, kind }) => nm === line.nm && kind === line.kind);
    setSelected(at >= 0 ? at : null, changed);
  };
  const replace = (at: number, line: SpectrumLine | null) => {
    const changed = writeSpectrumLines(lines.flatMap((one, index) => (index === at ? (line ?? []) : one)));
    const { problem: refusal, lines: read } = readSpectrumLines(changed);
    if (refusal !== null || changed.length > maxLength) return;
    write(changed);
    const moved = line ? read.findIndex(({ nm, kind, halfWidthNm }) => nm === line.nm && kind === line.kind && halfWidthNm === line.halfWidthNm) : -1;
    setSelected(moved >= 0 ? moved : null, changed);
  };
  const choose = (chosen: SpectrumView) => {
    setChosenView(chosen);
    keepSpectrumView(chosen);
  };

  const inHand = selected === null ? undefined : lines[selected];
  return (
    <div className="grid gap-3">
      {isLive && problem !== null && text.trim() !== "" ? <p className="text-xs text-straw">{problem}</p> : null}
      <CandidateSpectra species={candidates} view={view} />
      {isLive ? (
        <>
          {problem === null ? (
            <SpectrumPad id={`${id}-drawn`} lines={lines} view={view} selected={selected} onSelect={setSelected} onAdd={add} onChange={(at, line) => replace(at, line)} onRemove={(at) => replace(at, null)} describedBy={helpId} />
          ) : (
            <DrawnSpectrum lines={[]} view={view} heightPx={56} />
          )}
          {inHand && selected !== null ? <LineEditor line={inHand} onChange={(line) => replace(selected, line)} onRemove={() => replace(selected, null)} onClose={() => setSelected(null)} /> : null}
          {lines.length > 0 ? (
            <ul aria-label="Lines and bands" className="flex flex-wrap gap-1.5">
              {lines.map((line, at) => (
                <li key={`${line.nm}-${line.kind}-${at}`}>
                  <button
                    type="button"
                    aria-pressed={at === selected}
                    aria-label={spectrumLineWords(line)}
                    onClick={() => setSelected(at === selected ? null : at)}
                    className={`min-h-7 cursor-pointer rounded-full border px-2.5 font-mono text-xs pointer-coarse:min-h-11 ${at === selected ? "border-tint bg-tint-bg text-tint" : "border-rule-2 bg-paper text-ink-2"}`}
                  >
                    {writeSpectrumLine(line)}
                  </button>
                </li>
              ))}
            </ul>
          ) : null}
          <SpectrumViewChoice view={view} onView={choose} />
          <p id={helpId} className="text-xs text-ink-3">
            Tap a line, draw across a band. {spectrumKeyHelp}
          </p>
          <p aria-live="polite" className="sr-only">
            {lines.length === 0 ? "" : `${lines.length} ${lines.length === 1 ? "line or band" : "lines and bands"}`}
          </p>
        </>
      ) : (
        <DrawnSpectrum lines={lines} view={view} heightPx={56} />
      )}
    </div>
  );
}
