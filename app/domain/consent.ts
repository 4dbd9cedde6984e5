import type { ConsentCode } from "./consent-code.ts";

/** What the client is asked, one tick each; nothing is ticked for them except what cannot harm (workflow 1.2). */
export const consentQuestions: ReadonlyArray<Readonly<{ code: ConsentCode; label: string; caution: string }>> = [
  { code: "dryCloth", label: "Cleaning with a dry cloth", caution: "" },
  { code: "contactLiquid", label: "Contact liquid on a facet", caution: "Toxic and staining; never on porous or glued material." },
  { code: "hydrostatic", label: "Weighing in water", caution: "Not for porous, strung, glued or foil-backed pieces." },
  { code: "immersionLiquid", label: "Immersion in a liquid", caution: "Can harm porous, organic and glued material." },
  { code: "ultraviolet", label: "Ultraviolet lamps", caution: "Can fade some stones." },
  { code: "thermalProbe", label: "Thermal probe", caution: "A warm tip touches the stone." },
  { code: "heavyLiquid", label: "Heavy liquids", caution: "Last resort: toxic, and harmful to many materials." },
  { code: "unmounting", label: "Opening the setting", caution: "A setting can break when it is opened." },
  { code: "outsideLaboratory", label: "Sending to an outside laboratory", caution: "Carriage and cost are agreed first." },
  { code: "photography", label: "Photographs for the report", caution: "" },
  { code: "teachingReuse", label: "Photographs for teaching, without names", caution: "" },
  { code: "publicRegister", label: "Public register page", caution: "Shows the conclusion, weight, size and photograph; never the client or a value." },
];
