import { SpectrumMarks } from "#app/components/charts/spectrum/spectrum-marks.tsx";
import type { AbsorbingSpecies } from "#app/features/species/absorption-lines.ts";
import type { SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

const mostShown = 4;

/** What the likeliest species are known to absorb, faintly above what was seen: dark where it would be dark. */
export function CandidateSpectra({ species, view }: { species: readonly AbsorbingSpecies[]; view: SpectrumView }) {
  if (species.length === 0) return null;
  return (
    <ul aria-label="Lines that the candidates are known for" className="grid gap-1">
      {species.slice(0, mostShown).map(({ speciesId, name, lines }) => (
        <li key={speciesId}>
          <span className="text-xs text-ink-3">
            {name}
            <span className="sr-only">: {lines.map(({ nm, halfWidthNm, strength }) => `${nm}${halfWidthNm > 0 ? " band" : ""} ${strength}`).join(", ")}</span>
          </span>
          <svg width="100%" height="10" aria-hidden="true" className="block">
            <rect width="100%" height="10" className="fill-track" />
            <SpectrumMarks marks={lines} view={view} top={0} height={10} isFaint />
          </svg>
        </li>
      ))}
    </ul>
  );
}
