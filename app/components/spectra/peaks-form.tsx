import { Button } from "#app/components/ui/button.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { writeSpectrumLine } from "#app/domain/bench-tests/write-spectrum-lines.ts";
import { xUnitSigns } from "#app/features/spectra/spectrum-words.ts";
import type { XUnit } from "#app/gemmology/spectrum/measured-spectrum.ts";
import { peakMethod, type SpectrumPeak } from "#app/gemmology/spectrum/spectrum-peaks.ts";

/** What the spectroscope's form takes, nm. */
const takenNm = { from: 380, to: 780 } as const;

type PeaksFormProps = { peaks: readonly SpectrumPeak[]; xUnit: XUnit; sequence: number; /** The bench, whose form of a reading begins with what is ticked; null where nothing can be recorded. */ benchHref: string | null };

/** The peaks of one spectrum, offered: those that are ticked go into a reading, which a person then records. */
export function PeaksForm({ peaks, xUnit, sequence, benchHref }: PeaksFormProps) {
  if (peaks.length === 0) return <p className="text-sm text-ink-2">No peak stands out from the noise.</p>;
  const isWavenumber = xUnit === "1/cm";
  return (
    <form method="get" action={benchHref ?? undefined} className="grid gap-2.5">
      <input type="hidden" name="test" value="spectroscope" />
      <Table caption={`Peaks of spectrum ${sequence}`} className="text-sm">
        <thead>
          <tr>
            <HeaderCell>Peak</HeaderCell>
            {isWavenumber ? <HeaderCell isNumber>{xUnitSigns[xUnit]}</HeaderCell> : null}
            <HeaderCell isNumber>nm</HeaderCell>
            <HeaderCell isNumber>Width, nm</HeaderCell>
            <HeaderCell isNumber hideBelow="sm">
              Prominence
            </HeaderCell>
          </tr>
        </thead>
        <tbody>
          {peaks.map((peak) => {
            const line = lineOf(peak);
            return (
              <tr key={peak.nm}>
                <Cell>
                  {line && benchHref ? (
                    <label className="flex min-h-6 cursor-pointer items-center gap-2.5 pointer-coarse:min-h-11">
                      <input type="checkbox" name="line" value={line} className="size-4.5 accent-tint" />
                      {peak.kind === "line" ? "Line" : "Band"}
                    </label>
                  ) : peak.kind === "line" ? (
                    "Line"
                  ) : (
                    "Band"
                  )}
                </Cell>
                {isWavenumber ? <Cell isNumber>{(1e7 / peak.nm).toFixed(0)}</Cell> : null}
                <Cell isNumber>{peak.nm.toFixed(1)}</Cell>
                <Cell isNumber>{peak.widthNm === null ? "" : peak.widthNm.toFixed(1)}</Cell>
                <Cell isNumber hideBelow="sm">
                  {peak.prominence === null ? "" : Number(peak.prominence.toPrecision(3))}
                </Cell>
              </tr>
            );
          })}
        </tbody>
      </Table>
      {benchHref && peaks.some(lineOf) ? (
        <div>
          <Button look="quiet">Take what is ticked into a reading</Button>
        </div>
      ) : null}
      <p className="text-xs text-ink-3">{peakMethod} They are offered; what they mean is yours to judge.</p>
    </form>
  );
}

/** A peak in the words of the spectroscope's form; null where it lies beyond what that takes. */
function lineOf({ nm, widthNm, kind }: SpectrumPeak): string | null {
  const half = kind === "band" ? (widthNm ?? 0) / 2 : 0;
  const [low, high] = [Math.max(takenNm.from, nm - half), Math.min(takenNm.to, nm + half)];
  if (nm < takenNm.from || nm > takenNm.to) return null;
  return writeSpectrumLine({ nm: kind === "band" ? (low + high) / 2 : nm, halfWidthNm: (high - low) / 2, kind, strength: null, isEmission: false });
}
