import type { AbsorbingSpecies } from "#app/features/species/absorption-lines.ts";
import type { SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

/** What the form of a spectrum has around it, besides its own fields. */
export type SpectrumAround = Readonly<{
  /** As this browser draws spectra. */
  view: SpectrumView;
  /** The likeliest species' lines, drawn faintly above; none where candidates are hidden. */
  candidates: readonly AbsorbingSpecies[];
  /** Lines that were chosen elsewhere, from a measured spectrum: the form begins with them. */
  taken: string;
}>;
