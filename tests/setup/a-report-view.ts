import type { ReportView } from "#app/reports/report-view.ts";

const text = (label: string, value: string) => ({ label, parts: [{ text: value }] });
const mono = (label: string, value: string) => ({ label, parts: [{ text: value, isMono: true }] });

/** A report of an invented stone from an invented laboratory. */
export function aReportView(overrides: Partial<ReportView> = {}): ReportView {
  return {
    kind: "identification",
    laboratory: { name: "Marram Quay Gem Testing", mark: "MQ", addressLines: ["4 Saltmarsh Row", "Port Ellery"], phone: "+00 0000 000000", email: "desk@marramquay.example" },
    number: "MQ-R-26-00318",
    version: 1,
    reportOn: "1 December 2026",
    receivedOn: "28 November 2026",
    examinedOn: "30 November 2026 to 1 December 2026",
    timeZone: "Europe/Lisbon",
    clientName: "Ardenne Estate",
    stoneCode: "MQ-26-0417 · 1",
    receiptNumber: "MQ-T-26-0231",
    asReceived: "Transparent purplish red oval",
    conclusion: { title: "Ruby", statements: ["Natural corundum, with indications of heating.", "Identified."], confidence: "Identified" },
    description: [mono("Weight", "2.143 ct"), mono("Dimensions", "8.41 × 6.90 × 4.52 mm"), text("Shape and cut", "Oval, mixed cut"), text("Transparency", "Transparent"), text("Colour", "Purplish red, medium dark, strong")],
    observations: [
      { label: "Refractive index", parts: [{ text: "nω 1.770(1)", isMono: true }, { text: "nε 1.762(1)", isMono: true }] },
      mono("Birefringence", "0.008(2)"),
      text("Optic character", "Uniaxial negative"),
      { label: "Specific gravity", parts: [{ text: "4.00(2)", isMono: true }, { text: "hydrostatic, 21.4 °C" }] },
    ],
    treatments: {
      found: ["Heating: indications found. Short rutile needles, partly dissolved."],
      notFound: ["Glass in fissures or cavities"],
      notDeterminable: ["Heating at low temperature", "Lattice diffusion"],
      stated: [],
    },
    evidence: "Two sharp edges with birefringence, uniaxial figure, density by weighing in water.",
    natureEvidence: "Silk in three directions, partly dissolved.",
    rejected: [{ name: "Spinel", because: "singly refractive; this stone is not" }],
    limits: ["Examined with bench instruments only.", "Geographic origin was not examined."],
    instruments: ["R2, refractometer, last checked 1 December 2026", "B1, balance, last checked 1 December 2026"],
    clientStatements: "Bought by a grandmother in 1951.",
    cautions: ["Keep away from strong heat and acids. Local rules and licensed practice come first."],
    photograph: null,
    signatures: [
      { name: "I. Okafor", title: "gemmologist", statement: "Examined and concluded", onDate: "30 November 2026" },
      { name: "M. Lindqvist", title: "gemmologist", statement: "Second check, independent readings", onDate: "1 December 2026" },
    ],
    verification: { url: "http://127.0.0.1:3000/v/7KQ4M2XD9TPA3HZW", code: "7KQ4-M2XD-9TPA-3HZW" },
    amendment: null,
    versions: { speciesTable: "2026-12", rankingModel: "m1" },
    authorisedAt: "2026-12-01T10:00:00.000Z",
    isDraft: false,
    valuation: null,
    ...overrides,
  };
}
