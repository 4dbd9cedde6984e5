import type { InstrumentKind } from "#app/domain/instrument-kind.ts";

export const instrumentKindNames: Readonly<Record<InstrumentKind, string>> = {
  refractometer: "Refractometer",
  angleRefractometer: "Angle refractometer",
  polariscope: "Polariscope",
  balance: "Balance",
  gauge: "Gauge",
  thermometer: "Thermometer",
  microscope: "Microscope",
  dichroscope: "Dichroscope",
  spectroscope: "Spectroscope",
  uvLamp: "Ultraviolet lamp",
  colourFilter: "Colour filter",
  thermalProbe: "Thermal probe",
  conductivityMeter: "Conductivity meter",
  magnet: "Magnet",
  immersionSet: "Immersion liquids",
  reflectivityMeter: "Reflectivity meter",
  brewsterMeter: "Brewster-angle meter",
  heavyLiquids: "Heavy liquids",
  other: "Other",
};

export const instrumentStatusNames = { inService: "In service", restricted: "Restricted", outOfService: "Out of service" } as const;
