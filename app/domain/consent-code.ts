export const consentCodes = [
  "dryCloth",
  "contactLiquid",
  "immersionLiquid",
  "hydrostatic",
  "ultraviolet",
  "heavyLiquid",
  "thermalProbe",
  "unmounting",
  "outsideLaboratory",
  "photography",
  "teachingReuse",
  "publicRegister",
] as const;
export type ConsentCode = (typeof consentCodes)[number];
