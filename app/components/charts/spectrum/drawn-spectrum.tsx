import { spectrumLineWords } from "#app/domain/bench-tests/spectrum-line-words.ts";
import type { SpectrumLine } from "#app/domain/bench-tests/spectrum-lines.ts";
import type { SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";
import { SpectrumAxis } from "./spectrum-axis.tsx";
import { SpectrumGround } from "./spectrum-ground.tsx";
import { SpectrumMarks } from "./spectrum-marks.tsx";

/** Lines and bands as a hand spectroscope shows them, with a scale; in words for those who do not see it. */
export function DrawnSpectrum({ lines, view, heightPx = 44 }: { lines: readonly SpectrumLine[]; view: SpectrumView; heightPx?: number }) {
  return (
    <svg width="100%" height={heightPx + 24} role="img" aria-label={lines.length > 0 ? `Spectrum with a ${lines.map(spectrumLineWords).join("; a ")}` : "Spectrum without lines"} className="block overflow-visible [print-color-adjust:exact]">
      <SpectrumGround view={view} top={0} height={heightPx} />
      <SpectrumMarks marks={lines} view={view} top={0} height={heightPx} />
      <SpectrumAxis view={view} top={heightPx} />
    </svg>
  );
}
