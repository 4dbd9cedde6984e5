import { Button } from "#app/components/ui/button.tsx";
import type { SpectrumLine } from "#app/domain/bench-tests/spectrum-lines.ts";
import { spectrumLineWords } from "#app/domain/bench-tests/spectrum-line-words.ts";
import { SegmentedChoice } from "./segmented-choice.tsx";

type LineEditorProps = { line: SpectrumLine; onChange: (line: SpectrumLine) => void; onRemove: () => void; onClose: () => void };

const strengths = { strong: "Strong", medium: "Medium", weak: "Weak", faint: "Faint" } as const;
/** A line that becomes a band begins as wide as the words "550 band" mean. */
const usualHalfNm = 10;

/** One line or band in hand: where it is, how strong, whether it shines. Buttons large enough for gloves. */
export function LineEditor({ line, onChange, onRemove, onClose }: LineEditorProps) {
  const { nm, halfWidthNm, kind, strength, isEmission } = line;
  const move = (by: number) => onChange({ ...line, nm: Math.round((nm + by) * 10) / 10 });
  const widen = (by: number) => onChange({ ...line, halfWidthNm: Math.max(1, halfWidthNm + by) });
  return (
    <div className="grid gap-2.5 rounded-md border border-rule-2 bg-sunken p-3">
      <p className="flex items-baseline justify-between gap-3 text-sm">
        <strong className="font-semibold first-letter:uppercase">{spectrumLineWords(line)}</strong>
        <Button type="button" look="plain" size="small" onClick={onClose}>
          Done
        </Button>
      </p>
      <div className="flex flex-wrap items-center gap-2">
        <Button type="button" look="quiet" size="small" aria-label="1 nm shorter" onClick={() => move(-1)}>
          −1 nm
        </Button>
        <Button type="button" look="quiet" size="small" aria-label="1 nm longer" onClick={() => move(1)}>
          +1 nm
        </Button>
        <SegmentedChoice label="Line or band" value={kind} options={{ line: "Line", band: "Band" }} onChoose={(chosen) => onChange({ ...line, kind: chosen, halfWidthNm: chosen === "line" ? 0 : Math.max(usualHalfNm, halfWidthNm) })} />
        {kind === "band" ? (
          <>
            <Button type="button" look="quiet" size="small" onClick={() => widen(-2.5)}>
              Narrower
            </Button>
            <Button type="button" look="quiet" size="small" onClick={() => widen(2.5)}>
              Wider
            </Button>
          </>
        ) : null}
      </div>
      <div className="flex flex-wrap items-center gap-2">
        <SegmentedChoice label="Strength" value={strength} options={strengths} onChoose={(chosen) => onChange({ ...line, strength: chosen === strength ? null : chosen })} />
        <Button type="button" look="quiet" size="small" aria-pressed={isEmission} onClick={() => onChange({ ...line, isEmission: !isEmission })}>
          {isEmission ? "Shines" : "Dark"}
        </Button>
        <Button type="button" look="quietDanger" size="small" onClick={onRemove}>
          Remove
        </Button>
      </div>
    </div>
  );
}
