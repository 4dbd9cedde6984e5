import { hues } from "#app/domain/bench-tests/appearance.ts";
import { readSpectrumLines } from "#app/domain/bench-tests/spectrum-lines.ts";
import { testForms } from "#app/domain/bench-tests/test-forms.ts";
import type { ReadingDetail, ReadingQuality } from "#app/domain/reading.ts";
import type { Evidence } from "#app/gemmology/ranking/evidence.ts";

type Standing = Readonly<{ detail: ReadingDetail; quality: ReadingQuality }>;
type Detail<Kind extends ReadingDetail["kind"]> = Extract<ReadingDetail, { kind: Kind }>;

/** What was looked at rather than read off a scale, as the ranking takes it: of each test the best reading, and the latest of those. */
export function seenEvidence(standing: readonly Standing[]): Evidence {
  const best = <Kind extends ReadingDetail["kind"]>(kind: Kind, isMeant: (detail: Detail<Kind>) => boolean = () => true): Detail<Kind> | undefined => {
    const all = standing.filter((reading): reading is Standing & { detail: Detail<Kind> } => reading.detail.kind === kind && isMeant(reading.detail as Detail<Kind>));
    return (all.findLast(({ quality }) => quality === "good") ?? all.findLast(({ quality }) => quality === "fair") ?? all.at(-1))?.detail;
  };
  const magnet = best("magnet", ({ hasMetal }) => !hasMetal);
  const magnified = best("magnification");
  const features = magnified ? seenFeatures(magnified) : [];
  const parts: Evidence = {
    ...appearanceOf(best("appearance")),
    ...pleochroismOf(best("dichroscope")),
    ...fluorescenceOf(best("ultraviolet", ({ wave }) => wave === "longWave"), best("ultraviolet", ({ wave }) => wave === "shortWave")),
    ...absorptionOf(best("spectroscope")),
    ...filterOf(best("colourFilter")),
    ...thermalOf(best("thermalProbe")),
    ...(magnet?.response && { magnetic: ({ repelled: "inert", inert: "inert", weak: "weak", moderate: "moderate", strong: "strong" } as const)[magnet.response] }),
    ...(features.length > 0 && { features }),
  };
  return parts;
}

const optionsOf = (kind: "appearance" | "magnification", name: string): Readonly<Record<string, string>> => {
  const field = testForms[kind].fields.find((one) => one.name === name);
  return field && "options" in field ? Object.fromEntries(Object.entries(field.options).map(([code, label]) => [code, label.toLowerCase()])) : {};
};
const featureWords = optionsOf("magnification", "features");
const phenomenonWords = optionsOf("appearance", "phenomena");

/** Features ticked under magnification, in words. */
export function seenFeatures({ features }: Detail<"magnification">): string[] {
  return features.map((code) => featureWords[code] ?? code);
}

function appearanceOf(detail: Detail<"appearance"> | undefined): Evidence {
  if (!detail) return {};
  const hue = hueOf(detail.colour);
  // Between transparent and opaque the species table knows translucent alone.
  const transparency = detail.transparency && ({ transparent: "transparent", semiTransparent: "transparent", translucent: "translucent", semiTranslucent: "translucent", opaque: "opaque" } as const)[detail.transparency];
  return {
    ...(hue && { colour: [hue] }),
    ...(transparency && { transparency }),
    ...(detail.lustre && { lustre: detail.lustre }),
    ...(detail.phenomena.length > 0 && { phenomena: detail.phenomena.map((code) => phenomenonWords[code] ?? code) }),
  };
}

/** The hue within words of colour, the longest that is there: "light purplish red, zoned" is a purplish red. */
function hueOf(colour: string): string | undefined {
  const words = colour.toLowerCase().replace(/\bcolorless\b/, "colourless").replace(/\bgray\b/, "grey");
  return [...hues].sort((a, b) => b.length - a.length).find((hue) => new RegExp(`\\b${hue}\\b`).test(words));
}

function pleochroismOf(detail: Detail<"dichroscope"> | undefined): Evidence {
  if (!detail?.strength) return {};
  const colours = detail.colours.split(",").map((colour) => colour.trim()).filter(Boolean);
  return { pleochroism: { strength: detail.strength === "veryStrong" ? "strong" : detail.strength, ...(colours.length > 0 && { colours }) } };
}

function fluorescenceOf(longWave: Detail<"ultraviolet"> | undefined, shortWave: Detail<"ultraviolet"> | undefined): Evidence {
  const told = (detail: Detail<"ultraviolet"> | undefined) => {
    if (!detail?.strength) return undefined;
    const strength = ({ inert: "inert", veryWeak: "weak", weak: "weak", moderate: "moderate", strong: "strong", veryStrong: "strong" } as const)[detail.strength];
    return { strength, ...(detail.colour && { colour: detail.colour }) };
  };
  const [long, short] = [told(longWave), told(shortWave)];
  return long || short ? { fluorescence: { ...(long && { longWave: long }), ...(short && { shortWave: short }) } } : {};
}

/** Dark lines alone: what shines is no absorption. Looked for and not seen is told as well. */
function absorptionOf(detail: Detail<"spectroscope"> | undefined): Evidence {
  if (!detail) return {};
  const dark = readSpectrumLines(detail.lines).lines.filter(({ isEmission }) => !isEmission);
  return { absorption: dark.map(({ nm, kind }) => ({ nm, kind, u: wavelengthU(detail.scale, nm) })) };
}

/** Standard uncertainty of a line's place, nm (instruments 2.6): a prism's red is crowded, a grating's scale even. */
function wavelengthU(scale: Detail<"spectroscope">["scale"], nm: number): number {
  if (scale === "digital") return 0.6;
  if (scale === "grating") return 1.7;
  return nm > 600 ? 2.9 : 1.2;
}

function filterOf(detail: Detail<"colourFilter"> | undefined): Evidence {
  return detail?.appearsAs ? { colourFilter: ({ green: "green", brownish: "brownish", pink: "pink", red: "red", strongRed: "strong red" } as const)[detail.appearsAs] } : {};
}

function thermalOf(detail: Detail<"thermalProbe"> | undefined): Evidence {
  return detail?.zone ? { thermal: detail.zone === "diamond" ? "diamond-like" : "inert" } : {};
}
