/** What is seen inside a stone or on it, by the words of the trade (wording.md §6). */
export const inclusionTypes = [
  "crystal", "needle", "silk", "fingerprint", "twoPhase", "threePhase", "liquid", "fissureInternal", "fissureSurface", "cleavage", "cloud", "growthTube", "colourZone", "bubble", "swirl", "flux", "dust", "cavity", "feather", "cleavageRainbow", "filler",
  "laserChannel", "other",
] as const;
export type InclusionType = (typeof inclusionTypes)[number];
export const inclusionTypeNames: Readonly<Record<InclusionType, string>> = {
  crystal: "Crystal",
  needle: "Needle",
  silk: "Silk",
  fingerprint: "Fingerprint",
  twoPhase: "Two-phase inclusion",
  threePhase: "Three-phase inclusion",
  liquid: "Liquid",
  fissureInternal: "Fissure, internal",
  fissureSurface: "Fissure, reaching the surface",
  cleavage: "Cleavage",
  cloud: "Cloud",
  growthTube: "Growth tube",
  colourZone: "Colour zone",
  bubble: "Gas bubble",
  swirl: "Swirl",
  flux: "Flux",
  dust: "Dust",
  cavity: "Cavity",
  feather: "Feather",
  cleavageRainbow: "Cleavage rainbow",
  filler: "Filler",
  laserChannel: "Laser channel",
  other: "Other, in words",
};

export const inclusionDepths = ["notJudged", "surface", "nearTop", "middle", "nearBottom", "throughout"] as const;
export type InclusionDepth = (typeof inclusionDepths)[number];
export const inclusionDepthNames: Readonly<Record<InclusionDepth, string>> = {
  notJudged: "Not judged",
  surface: "At the surface",
  nearTop: "Just below the crown",
  middle: "In the middle",
  nearBottom: "Near the pavilion",
  throughout: "All through",
};

export const inclusionAmounts = ["one", "few", "many"] as const;
export type InclusionAmount = (typeof inclusionAmounts)[number];
export const inclusionAmountNames: Readonly<Record<InclusionAmount, string>> = { one: "One", few: "A few", many: "Many" };

export const plotSides = ["crown", "pavilion"] as const;
/** From which side the plotted outline is looked at; seen from the pavilion, left and right are exchanged. */
export type PlotSide = (typeof plotSides)[number];
export const plotSideNames: Readonly<Record<PlotSide, string>> = { crown: "Crown up", pavilion: "Pavilion up" };

/** A place on a picture: shares of its width from the left and of its height from the top, 0 to 1. */
export type Place = Readonly<{ x: number; y: number }>;

/** What an inclusion is called: its word, or what was written where no word fits. */
export function inclusionName({ type, otherText }: { type: InclusionType; otherText: string }): string {
  return type === "other" ? otherText : inclusionTypeNames[type];
}
