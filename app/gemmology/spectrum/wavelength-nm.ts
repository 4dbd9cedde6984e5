import type { XUnit } from "./measured-spectrum.ts";

/**
 * A place on a spectrum's axis as a wavelength.
 * @param x wavelength in nm or µm, or wavenumber in cm⁻¹, > 0
 * @returns nm. From wavenumbers simply 10⁷/x, as spectrometers themselves compute them: the index of air, which would
 * take 0.16 nm off in the yellow, is left out.
 */
export function wavelengthNm(x: number, unit: XUnit): number {
  return unit === "nm" ? x : unit === "um" ? x * 1000 : 1e7 / x;
}
