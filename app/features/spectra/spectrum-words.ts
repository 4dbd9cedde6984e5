import type { MeasuredSpectrum, XUnit, YUnit } from "#app/gemmology/spectrum/measured-spectrum.ts";

export const xUnitNames: Readonly<Record<XUnit, string>> = { nm: "Wavelength, nm", um: "Wavelength, µm", "1/cm": "Wavenumber, cm⁻¹" };
export const xUnitSigns: Readonly<Record<XUnit, string>> = { nm: "nm", um: "µm", "1/cm": "cm⁻¹" };
export const yUnitNames: Readonly<Record<YUnit, string>> = { absorbance: "Absorbance", transmittance: "Transmittance", reflectance: "Reflectance", arbitrary: "Arbitrary units" };
export const formatNames: Readonly<Record<MeasuredSpectrum["format"], string>> = { jcampDx: "JCAMP-DX", twoColumns: "Two columns" };
