import { testForm } from "./test-form.ts";

/** Loupe and microscope. Features are those whose meaning gemmology/nature knows, and the usual kinds of inclusion. */
export const magnification = testForm({
  kind: "magnification",
  name: "Magnification",
  hotkey: "m",
  instrumentKind: "microscope",
  needsInstrument: false,
  evidenceClass: "seen",
  consent: null,
  caution: "Lamps heat: keep opal, oiled emerald and waxed stones out of a hot beam, and kunzite out of strong light.",
  fields: [
    {
      type: "many", name: "features", label: "Seen",
      options: {
        noInclusions: "No inclusions", crystal: "Crystals", needles: "Needles", silkIntact: "Silk, intact", silkDissolved: "Silk, dissolved", fingerprint: "Fingerprint", twoPhase: "Two-phase inclusions", threePhase: "Three-phase inclusions",
        growthTube: "Growth tubes", cloud: "Cloud", fissureInternal: "Fissure, internal", fissureSurface: "Fissure, reaching the surface", cleavage: "Cleavage", halo: "Discs about crystals", straightZoning: "Straight or angular zoning", horsetail: "Horsetail fibres",
        curvedStriae: "Curved striae", gasBubbles: "Gas bubbles", flowStructure: "Flow structure", chevrons: "Chevron growth", seedPlate: "Seed plate", nailHead: "Nail-head spicules", flux: "Flux residues", metalPlatelets: "Metal platelets",
        flashEffect: "Flash effect in a fissure", dyeInFissures: "Dye in fissures", colourAtEdges: "Colour at facet edges", coatingWorn: "Worn coating", join: "Join of an assembled stone",
      },
    },
    { type: "choice", name: "doubling", label: "Doubling of edges", isRequired: false, options: { none: "None seen", slight: "Slight", distinct: "Distinct", strong: "Strong" } },
    { type: "words", name: "text", label: "Where, how large, what else", lines: 4, most: 1000, isRequired: false, hint: "Place by the clock and depth, size, colour, relief." },
    { type: "number", name: "magnificationX", label: "Magnification", what: "the magnification", unit: "x", min: 2, max: 400, mostDecimals: 0, example: "40", isRequired: false, isCondition: true, isWhole: true, u: null },
    { type: "choice", name: "illumination", label: "Illumination", isRequired: false, isCondition: true, options: { darkField: "Dark field", brightField: "Bright field", fibre: "Fibre light", diffused: "Diffused", crossedPolars: "Crossed polars", immersion: "Immersed" } },
  ],
});
