import type { InstrumentKind } from "./instrument-kind.ts";

/** In what an instrument's scale is read. */
export const scaleUnits = ["n", "deg", "ct", "g", "mm", "nm", "degC", "1", "%"] as const;
export type ScaleUnit = (typeof scaleUnits)[number];

export const scaleUnitNames: Readonly<Record<ScaleUnit, string>> = {
  n: "refractive index",
  deg: "degrees of angle",
  ct: "carats",
  g: "grams",
  mm: "millimetres",
  nm: "nanometres",
  degC: "degrees Celsius",
  "1": "density",
  "%": "per cent",
};

/** As it stands behind a figure; an index and a density have none. */
export const scaleUnitSigns: Readonly<Record<ScaleUnit, string>> = { n: "", deg: "°", ct: "ct", g: "g", mm: "mm", nm: "nm", degC: "°C", "1": "", "%": "%" };

/** The units that a kind's scale may have, the usual one first; none where the eye judges and there is no scale. */
export const scaleUnitsOf: Readonly<Record<InstrumentKind, readonly ScaleUnit[]>> = {
  refractometer: ["n"],
  angleRefractometer: ["deg"],
  brewsterMeter: ["deg"],
  reflectivityMeter: ["%"],
  polariscope: [],
  dichroscope: [],
  spectroscope: ["nm"],
  colourFilter: [],
  uvLamp: [],
  microscope: ["mm"],
  balance: ["ct", "g"],
  gauge: ["mm"],
  immersionSet: [],
  heavyLiquids: ["1"],
  thermalProbe: [],
  conductivityMeter: [],
  magnet: [],
  thermometer: ["degC"],
  other: [],
};

/**
 * Kinds that measure: each of their readings names a check that was valid when it was made (workflow 1.4). The others
 * are judged by their checks only once they have had one.
 */
const measuring: ReadonlySet<InstrumentKind> = new Set<InstrumentKind>(["refractometer", "angleRefractometer", "brewsterMeter", "reflectivityMeter", "spectroscope", "balance", "gauge", "heavyLiquids", "thermometer"]);

export function isMeasuring(kind: InstrumentKind): boolean {
  return measuring.has(kind);
}

/** Days from one check to the next where the laboratory has not said otherwise: daily for what drifts or is knocked, yearly for thermometers and gauges (workflow 1.16; the rest common practice). */
export const usualCheckDays: Readonly<Record<InstrumentKind, number>> = {
  refractometer: 1,
  angleRefractometer: 1,
  brewsterMeter: 7,
  reflectivityMeter: 7,
  polariscope: 90,
  dichroscope: 90,
  spectroscope: 1,
  colourFilter: 365,
  uvLamp: 1,
  microscope: 365,
  balance: 1,
  gauge: 7,
  immersionSet: 30,
  heavyLiquids: 1,
  thermalProbe: 1,
  conductivityMeter: 1,
  magnet: 365,
  thermometer: 365,
  other: 30,
};

/** What to check it on, in a few words (instruments.md §2; values there). */
export const checkAdvice: Readonly<Record<InstrumentKind, string>> = {
  refractometer: "Two points at least, low and high: quartz 1.544 and 1.553, synthetic spinel 1.728, synthetic corundum 1.760 and 1.768. The usual limit is ± 0.002.",
  angleRefractometer: "Quartz and synthetic spinel or corundum, as angles against this prism.",
  brewsterMeter: "Quartz, a cubic zirconia, a diamond.",
  reflectivityMeter: "Its own standards, clean and dry, with no light from the side.",
  polariscope: "Quartz blinks, glass stays dark, synthetic spinel shows cross-hatching.",
  dichroscope: "Ruby or iolite shows two colours, glass one.",
  spectroscope: "Sodium 589.0 and 589.6 nm; mercury 404.7, 435.8, 546.1, 577.0 and 579.1 nm; the ruby’s emission at 692.8 and 694.2 nm.",
  colourFilter: "A stone whose look through this filter is known.",
  uvLamp: "Synthetic ruby is red in long wave; scheelite blue and willemite green in short wave. Eyes and skin behind the shield, by local rules.",
  microscope: "The graticule against a stage micrometer.",
  balance: "Level, door shut, warmed up; zero, then check weights of class M1 or F1.",
  gauge: "Zero with closed jaws, then a block of 5 mm.",
  immersionSet: "A marker of known index in each liquid.",
  heavyLiquids: "Marker crystals of known density, each session. Toxic: extraction, gloves and local rules first.",
  thermalProbe: "A cubic zirconia, synthetic corundum, moissanite and a small diamond.",
  conductivityMeter: "Moissanite conducts, glass does not.",
  magnet: "An almandine is drawn, a quartz is not.",
  thermometer: "Melting ice at 0 °C, or a calibrated thermometer beside it.",
  other: "A piece whose result is known.",
};
