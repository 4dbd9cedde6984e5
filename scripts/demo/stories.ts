import type { LimitCode, TreatmentCode, TreatmentFinding, TreatmentStatus } from "#app/domain/conclusion.ts";
import { criticalAngle, density, edge, edges, overLimit, polars, rotation, seen, size, spot, struck, told, weight } from "./readings.ts";
import type { Story } from "./story.ts";

const finding = (code: TreatmentCode, status: TreatmentStatus, evidence = ""): TreatmentFinding => ({ code, status, extent: null, evidence });
const heatingOpen = [finding("heating", "notDeterminable"), finding("glassFilling", "notDetected", "no flash, no bubbles in fissures")];
const bench: LimitCode[] = ["benchOnly", "treatmentNotDeterminable", "originNotExamined"];

/** Two edges of a zoisite, a hair apart, over a half turn. */
const tanzaniteRun = ["0 1.694 1.698", "15 1.693 1.698", "30 1.693 1.698", "45 1.693 1.699", "60 1.693 1.700", "75 1.693 1.700", "90 1.692 1.700", "105 1.692 1.700", "120 1.692 1.699", "135 1.692 1.699", "150 1.692 1.698", "165 1.692 1.698", "180 1.693 1.697"];

/**
 * Two dozen invented stones at every stage. The readings are those of real materials (fixtures/species), with the scatter of
 * a bench; the hard ones are here on purpose.
 */
export const marramStories: readonly Story[] = [
  {
    description: "Greenish blue octagon", photo: { outline: "octagon", hue: "greenish blue", lengthMm: 12 }, client: "holm", daysAgo: 34, mass: "6.06", declared: 900, isValuationWanted: true,
    readings: [weight("6.062"), size("12.10", "9.84", "7.02"), edges("1.574", "1.580"), polars("blinks", { figure: "uniaxial", sign: "-" }), density("6.062", "3.836"), seen("Parallel growth tubes along one direction, two-phase inclusions, eye-clean")],
    conclusion: {
      speciesName: "Beryl", variety: "Aquamarine", nature: "natural", natureEvidence: "Growth tubes with two-phase fillings along the axis.", evidence: "Uniaxial negative; indices and birefringence of beryl; density by weighing in water.",
      treatments: [finding("heating", "notDeterminable"), finding("irradiation", "notDeterminable"), finding("oilOrResinFilling", "notDetected", "no surface-reaching fissures")],
      rejected: [{ name: "Topaz", because: "indices and density far higher" }, { name: "Glass", because: "singly refractive; this stone is not" }], limits: bench,
      description: { shape: "Octagon", cut: "Step cut", transparency: "Transparent", colour: "Greenish blue, medium light, moderately strong", colourLight: "daylight 5500 K" },
    },
    check: { readings: [edges("1.574", "1.580", { facet: "crown" }), density("6.062", "3.835", "20.9")], outcome: "agreed" },
    valuation: "signed", report: "issued", isPaid: true,
  },
  {
    description: "Violet pear", photo: { outline: "pear", hue: "violet", lengthMm: 14 }, client: "holm", daysAgo: 33, mass: "4.77",
    readings: [weight("4.771"), size("13.92", "9.10", "6.44"), edges("1.544", "1.553"), polars("blinks", { figure: "uniaxialHollowCentre", sign: "+" }), density("4.771", "2.973"), seen("Angular colour zoning, healed fissures like zebra stripes")],
    conclusion: {
      speciesName: "Quartz", variety: "Amethyst", nature: "natural", natureEvidence: "Angular zoning and zebra-stripe healed fissures, no seed plate.", evidence: "Hollow-centred uniaxial figure; indices and density of quartz.",
      treatments: [finding("heating", "notDetected", "no sign of altered inclusions")], rejected: [{ name: "Scapolite", because: "negative sign and other indices" }, { name: "Iolite", because: "biaxial; this stone is uniaxial" }], limits: bench,
      description: { shape: "Pear", cut: "Mixed cut", transparency: "Transparent", colour: "Violet, medium, strong" },
    },
    check: { readings: [edges("1.544", "1.553"), polars("blinks", { figure: "uniaxialHollowCentre", sign: "+" })], outcome: "agreed" },
    report: "issued", isPaid: true, isReleased: true,
  },
  {
    description: "Black bead strand, 61 beads", photo: { outline: "bead", hue: "black", lengthMm: 8 }, client: "museum", daysAgo: 31, mount: "strung", stoneCount: 61, mass: "41.20", massUnit: "g",
    readings: [spot("1.54", { facet: "dome", instrument: "R3" }), polars("staysLight", { note: "thin edge of one chipped bead" }), seen("Even black colour, concentrated at drill holes; waxy fracture on a chip")],
    conclusion: {
      speciesName: "Chalcedony", variety: "Black chalcedony", nature: "natural", natureEvidence: "Fine aggregate structure and waxy fracture at a chip.", confidence: "consistentWith", evidence: "Aggregate behaviour; spot index; fracture and lustre.",
      treatments: [finding("dyeing", "detected", "colour concentrated along drill holes and fractures")], rejected: [{ name: "Jet", because: "far heavier in the hand, and glassy where it is chipped" }, { name: "Glass", because: "aggregate between crossed polars" }], limits: ["benchOnly", "partialView", "originNotExamined"],
      description: { shape: "Beads, round", cut: "Polished and drilled", transparency: "Opaque", colour: "Black" },
    },
    check: { readings: [spot("1.54"), seen("Dye in drill holes under 40×")], outcome: "agreed" },
    report: "withdrawn", isPaid: true,
  },
  {
    description: "Yellowish green cushion", photo: { outline: "cushion", hue: "yellowish green", lengthMm: 9 }, client: "ardenne", daysAgo: 30, mass: "3.41",
    readings: [weight("3.412"), size("9.02", "8.40", "5.61"), edges("1.654", "1.690"), polars("blinks", { figure: "biaxial" }), density("3.412", "2.391"), seen("Lily-pad discs around small dark crystals; strong doubling")],
    conclusion: {
      speciesName: "Peridot (olivine)", variety: "Peridot", nature: "natural", natureEvidence: "Discs around chromite-like crystals.", evidence: "Strong birefringence, biaxial, density by weighing in water.",
      treatments: [finding("oilOrResinFilling", "notDetected", "no filled fissures seen")], rejected: [{ name: "Sinhalite", because: "higher density, and the middle index lies elsewhere" }], limits: bench,
      description: { shape: "Cushion", cut: "Mixed cut", transparency: "Transparent", colour: "Yellowish green, medium, moderately strong" },
    },
    check: { readings: [edges("1.654", "1.689"), density("3.412", "2.390", "21.0")], outcome: "agreed" },
    report: "superseded", isPaid: true,
  },
  {
    description: "Blue oval", photo: { outline: "oval", hue: "blue", lengthMm: 8 }, client: "castellan", daysAgo: 27, mass: "2.55",
    readings: [weight("2.552"), size("8.60", "6.95", "4.52"), edges("1.761", "1.769"), polars("blinks", { figure: "uniaxial", sign: "-" }), density("2.552", "1.912"), seen("Curved colour bands under immersion light, a string of minute gas bubbles below the table")],
    conclusion: {
      speciesName: "Corundum", variety: "Sapphire", nature: "synthetic", natureEvidence: "Curved colour bands and gas bubbles: grown by flame fusion.", evidence: "Uniaxial negative; indices and density of corundum.",
      treatments: [], rejected: [{ name: "Natural sapphire", because: "growth bands are curved, not angular" }, { name: "Synthetic spinel", because: "doubly refractive, uniaxial" }], limits: ["benchOnly"],
      description: { shape: "Oval", cut: "Mixed cut", transparency: "Transparent", colour: "Blue, medium dark, strong" },
    },
    check: { readings: [edges("1.761", "1.769", { facet: "pavilion" }), seen("Curved bands seen edge-on in diffuse light")], outcome: "agreed" },
    report: "issued", isPaid: true,
  },
  {
    description: "Green octagon in a yellow metal ring", photo: { outline: "octagon", hue: "green", lengthMm: 7 }, client: "ferro", daysAgo: 13, mount: "mounted", mass: "5.31", massUnit: "g", declared: 7200, statements: "Said to be an heirloom; no papers.",
    readings: [edges("1.577", "1.583", { quality: "fair", note: "metal lifts the stone a little" }), polars("blinks", { figure: "none", note: "through the open back" }), seen("Jagged three-phase inclusions; a fissure to the surface with a faint oily film and blue flash absent")],
    conclusion: {
      speciesName: "Beryl", variety: "Emerald", nature: "natural", natureEvidence: "Three-phase inclusions with a crystal.", evidence: "Indices and birefringence of beryl as mounted; inclusions.",
      treatments: [finding("oilOrResinFilling", "indications", "a thin film in a surface-reaching fissure; the kind of filler was not determined")], rejected: [{ name: "Glass", because: "doubly refractive" }, { name: "Tourmaline", because: "indices and birefringence far higher" }], limits: ["mounted", "benchOnly", "massEstimated", "originNotExamined"],
      description: { shape: "Octagon", cut: "Step cut", transparency: "Transparent", colour: "Green, medium, strong" },
    },
    check: { readings: [edges("1.577", "1.584", { quality: "fair" }), seen("Three-phase inclusions, film in one fissure")], outcome: "agreed" },
    report: "authorised",
  },
  {
    description: "Orange-yellow cabochon", photo: { outline: "cabochon", hue: "orange-yellow", lengthMm: 16 }, client: "castellan", daysAgo: 12, mass: "11.80",
    readings: [weight("11.803"), spot("1.55", { instrument: "R3" }), polars("blinks", { figure: "uniaxialHollowCentre", sign: "+" }), density("11.803", "7.348")],
  },
  {
    description: "Transparent purplish red oval", photo: { outline: "oval", hue: "purplish red", lengthMm: 8 }, client: "ardenne", daysAgo: 3, mass: "2.14", declared: 6500, statements: "Bought abroad in the 1960s.",
    readings: [weight("2.143"), size("8.41", "6.90", "4.52"), seen("Short needles in three directions, partly dissolved; healed fissures"), density("2.143", "1.608"), polars("blinks", { figure: "uniaxial", sign: "-", note: "figure through the pavilion, clear cross" }), struck(edge("1.790", { light: "white", quality: "fair" }), "contact liquid edge, stone not seated"), edges("1.762", "1.770", { note: "two sharp edges, high edge fixed" }), told("dichroscope", { strength: "strong", colours: "purplish red, orangish red", directionsTried: "3", polarisers: "calcite" }, "D1"), told("spectroscope", { lines: "694 e, 668 weak, 540-580 band, 476, 468", scale: "grating", path: "transmitted", direction: "through table and pavilion" }, "S1"), told("ultraviolet", { wave: "longWave", strength: "strong", colour: "red", evenness: "even", distanceCm: "5", exposureS: "30" }, "L1")],
  },
  {
    description: "Blue cushion", photo: { outline: "cushion", hue: "blue", lengthMm: 9 }, client: "ardenne", daysAgo: 3, mass: "3.02",
    readings: [weight("3.021"), size("8.92", "8.10", "5.20"), edges("1.762", "1.770"), polars("blinks", { figure: "uniaxial", sign: "-" }), density("3.021", "2.264"), seen("Angular colour zoning, fine silk, a negative crystal with a halo")],
    conclusion: {
      speciesName: "Corundum", variety: "Sapphire", nature: "natural", natureEvidence: "Angular zoning, silk, a negative crystal.", evidence: "Uniaxial negative; indices and density of corundum.", treatments: heatingOpen,
      rejected: [{ name: "Synthetic sapphire", because: "zoning is angular, silk intact" }, { name: "Kyanite", because: "biaxial with lower density" }], limits: bench,
      description: { shape: "Cushion", cut: "Mixed cut", transparency: "Transparent", colour: "Blue, medium dark, strong" },
    },
  },
  {
    description: "Colourless round", photo: { outline: "round", hue: "colourless", lengthMm: 5 }, client: "castellan", daysAgo: 6, mass: "0.512",
    readings: [weight("0.512"), size("5.17", "5.14", "3.16", "round"), overLimit({ note: "only the liquid’s edge on two facets" }), polars("anomalous", { note: "faint strain at the girdle" }), told("magnification", { features: ["crystal", "fissureInternal"], doubling: "none", magnificationX: "40", illumination: "darkField" }, "M1")],
  },
  {
    description: "Brownish red round", photo: { outline: "round", hue: "red", lengthMm: 7 }, client: "holm", daysAgo: 5, mass: "1.88",
    readings: [weight("1.884"), edge("1.762"), polars("anomalous"), density("1.884", "1.404", "21.0", "between the end members of the garnets"), criticalAngle("69.61")],
  },
  {
    description: "Dull green oval", photo: { outline: "oval", hue: "green", lengthMm: 9 }, client: "museum", daysAgo: 5, mass: "3.66", statements: "From an old collection, labelled only with a number.",
    readings: [weight("3.662"), edge("1.792", { quality: "fair", note: "soft edge just below the liquid’s" }), polars("anomalous", { note: "patchy, almost dark" }), density("3.662", "2.750"), seen("Cloudy zones, angular growth bands"), told("spectroscope", { lines: "653 weak, 691 faint", scale: "grating", path: "transmitted" }, "S1", "blurred lines")],
    inclusions: [
      { type: "cloud", depth: "middle", amount: "many", note: "along growth bands", onPlot: { x: 0.62, y: 0.4 }, onPhoto: { x: 0.58, y: 0.42 } },
      { type: "crystal", depth: "nearTop", amount: "one", note: "with a dark halo", sizeMm: "0.15", onPlot: { x: 0.33, y: 0.68 }, onPhoto: { x: 0.42, y: 0.57 } },
      { type: "cavity", depth: "surface", amount: "one", note: "", sizeMm: "0.08", onPlot: { x: 0.78, y: 0.78 }, struckBecause: "a crumb of polishing powder, gone after wiping" },
      { type: "fissureSurface", depth: "surface", amount: "one", note: "", sizeMm: "0.6", onPlot: { x: 0.5, y: 0.08 } },
    ],
    spectrum: { title: "Dull green oval, transmitted", note: "Through the table, 1 s, mean of 20", bands: [[653, 9, 0.16], [691, 11, 0.07], [589, 14, 0.05], [537, 16, 0.03], [660, 120, 0.06]] },
  },
  {
    description: "Red round, old cut", photo: { outline: "round", hue: "red", lengthMm: 6 }, client: "ferro", daysAgo: 4, mass: "1.12",
    readings: [weight("1.121"), edge("1.781", { note: "table" }), edge("1.522", { facet: "pavilion", note: "the pavilion reads quite another index" }), seen("A plane of bubbles below the girdle; a red ring when it lies table down on white paper")],
  },
  {
    description: "Light blue octagon", photo: { outline: "octagon", hue: "greenish blue", lengthMm: 10 }, client: "castellan", daysAgo: 9, mass: "5.20",
    readings: [weight("5.204"), edge("1.520"), polars("anomalous", { note: "snaking dark bands" }), density("5.204", "3.126"), seen("Round gas bubbles, swirls; facet edges rounded")],
    conclusion: {
      speciesName: "Glass, manufactured", nature: "artificial", natureEvidence: "Gas bubbles and swirls.", evidence: "Singly refractive with strain; index and density of common glass; bubbles.", rejected: [{ name: "Aquamarine", because: "doubly refractive" }, { name: "Fluorite", because: "its index is far lower" }], limits: ["benchOnly"],
      description: { shape: "Octagon", cut: "Step cut, moulded", transparency: "Transparent", colour: "Light blue" },
    },
    check: { readings: [edge("1.520"), polars("anomalous")], outcome: "agreed" },
  },
  {
    description: "Yellow oval", photo: { outline: "oval", hue: "yellow", lengthMm: 8 }, client: "ferro", daysAgo: 2, mass: "2.47",
    readings: [weight("2.471"), edge("1.790", { quality: "good", note: "one sharp edge, does not move" }), polars("blinks", { figure: "biaxial" }), density("2.471", "1.776", "21.2", "does not fit the index")],
  },
  {
    description: "Red cushion", photo: { outline: "cushion", hue: "red", lengthMm: 7 }, client: "holm", daysAgo: 8, mass: "1.95",
    readings: [weight("1.952"), edge("1.718"), polars("dark"), density("1.952", "1.410"), seen("Octahedra in a fingerprint pattern")],
    conclusion: {
      speciesName: "Spinel", nature: "natural", natureEvidence: "Octahedral inclusions in a fingerprint.", evidence: "Singly refractive; index and density of spinel.", treatments: [finding("heating", "notDeterminable")], rejected: [{ name: "Pyrope", because: "density and inclusions" }], limits: bench,
      description: { shape: "Cushion", cut: "Mixed cut", transparency: "Transparent", colour: "Red, medium, strong" },
    },
    check: { readings: [edge("1.718"), density("1.952", "1.409")], outcome: "returned", reason: "The long-wave fluorescence was not recorded; look again before natural is said." },
  },
  {
    description: "Green rectangle", photo: { outline: "octagon", hue: "green", lengthMm: 11 }, client: "ferro", daysAgo: 10, mass: "4.18", isValuationWanted: true, declared: 1500,
    readings: [weight("4.182"), size("11.02", "7.46", "5.10"), edges("1.620", "1.639"), polars("blinks", { figure: "uniaxial", sign: "-" }), density("4.182", "2.816"), seen("Thread-like liquid inclusions; doubling of the back facets")],
    conclusion: {
      speciesName: "Tourmaline", variety: "Green tourmaline", nature: "natural", natureEvidence: "Thread-like liquid inclusions.", evidence: "Uniaxial negative; indices, birefringence and density of tourmaline.", treatments: [finding("heating", "notDeterminable"), finding("irradiation", "notDeterminable")],
      rejected: [{ name: "Apatite", because: "birefringence far lower" }], limits: bench, description: { shape: "Rectangle", cut: "Step cut", transparency: "Transparent", colour: "Green, medium dark, moderately strong" },
    },
    check: { readings: [edges("1.620", "1.640"), polars("blinks", { figure: "uniaxial", sign: "-" })], outcome: "agreed" },
    valuation: "draft",
  },
  { description: "Light blue round", photo: { outline: "round", hue: "greenish blue", lengthMm: 9 }, client: "castellan", daysAgo: 1, mass: "3.90" },
  {
    description: "Bluish violet oval", photo: { outline: "oval", hue: "violet", lengthMm: 10 }, client: "holm", daysAgo: 1, mass: "3.24",
    readings: [told("appearance", { colour: "bluish violet, medium", transparency: "transparent", lustre: "vitreous", light: "daylight 5500 K" }), weight("3.241"), rotation(tanzaniteRun)],
  },
  { description: "Yellow-green cabochon with a moving band of light", photo: { outline: "cabochon", hue: "yellow-green", lengthMm: 9 }, client: "museum", daysAgo: 1, mass: "4.02" },
  { description: "Pink cushion", photo: { outline: "cushion", hue: "pink", lengthMm: 8 }, client: "ferro", daysAgo: 0, mass: "2.71" },
  { description: "White translucent bangle", photo: null, client: "museum", daysAgo: 0, mass: "52.40", massUnit: "g", mount: "loose" },
  { description: "Three green ovals in one paper", photo: { outline: "oval", hue: "green", lengthMm: 6 }, client: "castellan", daysAgo: 0, mass: "3.30", stoneCount: 3 },
];

export const tarnStories: readonly Story[] = [
  {
    description: "Orange round", photo: { outline: "round", hue: "orange", lengthMm: 7 }, client: "ardenne", daysAgo: 15, mass: "2.02", isValuationWanted: false,
    readings: [weight("2.021"), edge("1.745"), polars("anomalous"), density("2.021", "1.462"), seen("Treacle-like swirls around rounded crystals")],
    conclusion: {
      speciesName: "Grossular", variety: "Hessonite", nature: "natural", natureEvidence: "Treacle-like structure with rounded crystals.", evidence: "Singly refractive; index and density of grossular; typical structure.", treatments: [finding("heating", "notDeterminable")], rejected: [{ name: "Spessartine", because: "index and density far higher" }], limits: bench,
      description: { shape: "Round", cut: "Brilliant", transparency: "Transparent", colour: "Orange, medium, strong" },
    },
    check: { readings: [edge("1.745"), density("2.021", "1.461")], outcome: "agreed" },
    report: "issued", isPaid: true,
  },
  { description: "Colourless oval", photo: { outline: "oval", hue: "colourless", lengthMm: 8 }, client: "ardenne", daysAgo: 4, mass: "1.64", readings: [weight("1.641"), edges("1.544", "1.553"), polars("blinks", { figure: "uniaxialHollowCentre", sign: "+" })] },
  { description: "Red oval in a white metal ring", photo: { outline: "oval", hue: "red", lengthMm: 7 }, client: "ardenne", daysAgo: 1, mass: "4.05", massUnit: "g", mount: "mounted" },
];
