import type { XUnit, YUnit } from "./measured-spectrum.ts";

/** Words apart by single blanks, so that "um" is not found in "spectrum". */
const words = (text: string) =>
  text
    .toLowerCase()
    .replace(/⁻¹/g, "-1")
    .replace(/\s*\/\s*/g, "/")
    .replace(/[^a-zµμ0-9/%-]+/g, " ")
    .trim();

const xUnits: ReadonlyArray<readonly [RegExp, XUnit]> = [
  [/(^| )(1\/cm|cm ?-1|wave ?numbers?)( |$)/, "1/cm"],
  [/(^| )(nm|nanomet(er|re)s?)( |$)/, "nm"],
  [/(^| )([µμu]m|micromet(er|re)s?|microns?)( |$)/, "um"],
  [/wavelength/, "nm"],
];
const yUnits: ReadonlyArray<readonly [RegExp, YUnit]> = [
  [/absorb|optical density|extinction|(^| )(abs|a|od)( |$)/, "absorbance"],
  [/transmi|(^| )(%? ?t|t ?%)( |$)/, "transmittance"],
  [/reflect|(^| )(%? ?r|r ?%)( |$)/, "reflectance"],
  [/arbitrary|kubelka|count|intens|signal|luminescence|fluorescence/, "arbitrary"],
];

/** The unit that a label means, of a JCAMP-DX record or of a column's heading; undefined where it names none that is known. */
export const xUnitNamed = (text: string): XUnit | undefined => xUnits.find(([pattern]) => pattern.test(words(text)))?.[1];
/** What a label says was measured; undefined where it says nothing that is known. */
export const yUnitNamed = (text: string): YUnit | undefined => yUnits.find(([pattern]) => pattern.test(words(text)))?.[1];
