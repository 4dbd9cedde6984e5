export const instrumentKinds = ["refractometer", "angleRefractometer", "polariscope", "balance", "gauge", "thermometer", "microscope", "other"] as const;

export const instrumentKindNames: Readonly<Record<(typeof instrumentKinds)[number], string>> = {
  refractometer: "Refractometer",
  angleRefractometer: "Angle refractometer",
  polariscope: "Polariscope",
  balance: "Balance",
  gauge: "Gauge",
  thermometer: "Thermometer",
  microscope: "Microscope",
  other: "Other",
};

export const instrumentStatusNames = { inService: "In service", restricted: "Restricted", outOfService: "Out of service" } as const;
