/** What a laboratory's instrument can be; sets of liquids are kept as instruments, since they are checked like them. */
export const instrumentKinds = [
  "refractometer", "angleRefractometer", "polariscope", "balance", "gauge", "thermometer", "microscope",
  "dichroscope", "spectroscope", "uvLamp", "colourFilter", "thermalProbe", "conductivityMeter", "magnet", "immersionSet", "reflectivityMeter", "brewsterMeter", "heavyLiquids", "other",
] as const;
export type InstrumentKind = (typeof instrumentKinds)[number];
