import { colourMask } from "../species/colour-mask.ts";
import type { SpeciesForm, VarietySpectrum } from "../species/species-table.ts";
import { inBritish } from "./appearance-terms.ts";
import { defaultU } from "./defaults.ts";
import type { AbsorptionSeen, Evidence } from "./evidence.ts";
import { seenTerm, summary } from "./seen-term.ts";
import { softUniformDensity } from "./soft-uniform.ts";
import type { Term } from "./term.ts";

/** P(seen) of an expected line by its strength 1 to 3: 0.85 where it is strong (formulas §10.6). */
const seenShare = [0, 0.25, 0.55, 0.85] as const;
/** Pale stones show less of their spectrum. */
const paleFactor = 0.6;
/** Lines a nanometre that no table lists or that are none, and those of a material that is not in it: about a third of one, and one, over the visible. */
const strayPerNm = 0.001;
const unlistedPerNm = 0.003;
/** Stones whose spectrum shows nothing of what their kind is known for. */
const blankShare = 0.35;
/** A variety of another colour than the stone's. */
const otherColourWeight = 0.15;
/** Lines of one cause come together, and stay away together: no more than so many count. */
const mostLines = 4;
/** Wavelength from which on a prism's scale is crowded, and how much broader the middle of a band is to find. */
const redFromNm = 620;
const bandU = 5;

type Seen = Readonly<{ nm: number; u: number }>;

/**
 * A spectrum by its expected lines: seen where expected, expected and not seen, seen and expected of none. A form's
 * varieties have spectra of their own, and any stone may show none.
 *
 * @param colours what the stone looks like; a variety of another colour counts less, and a pale stone shows less
 *
 * Source: formulas §10.6. Not seeing a spectrum is next to no evidence.
 */
export function spectrumTerm(lines: readonly AbsorptionSeen[], colours: NonNullable<Evidence["colour"]>): Term {
  const seen = lines.map(({ nm, kind, u }): Seen => ({ nm, u: Math.hypot(u ?? (nm >= redFromNm ? defaultU.redLineNm : defaultU.lineNm), kind === "band" ? bandU : 0) })).sort((a, b) => a.nm - b.nm);
  const stone = colours.reduce((all, words) => all | colourMask(inBritish(words)), 0);
  const visibility = colours.some((words) => /\b(pale|light|near-?colou?rless|colou?rless|faint)\b/i.test(words)) ? paleFactor : 1;
  const countShare = seen.length > mostLines ? mostLines / seen.length : 1;
  const observed = seen.length === 0 ? "no lines" : lines.map(({ nm, kind }) => (kind === "line" ? `${nm}` : `${nm} band`)).join(", ");
  return {
    ...seenTerm("absorption", observed, unlistedPerNm ** (seen.length * countShare)),
    score: ({ absorption }) => {
      const blank = countShare * seen.length * Math.log(strayPerNm);
      if (absorption.length === 0) return { logLikelihood: blank, tail: 1, distance: 0 };
      let [likelihood, weightSum] = [0, 0];
      for (const spectrum of absorption) {
        const weight = spectrum.colours === 0 || stone === 0 || (spectrum.colours & stone) !== 0 ? 1 : otherColourWeight;
        weightSum += weight;
        likelihood += weight * Math.exp(spectrumLog(spectrum, seen, { visibility, countShare }) - blank);
      }
      const sum = blankShare + ((1 - blankShare) * likelihood) / weightSum;
      return { logLikelihood: blank + Math.log(sum), tail: seen.length > 0 && sum <= 1 ? 0.05 : 1, distance: 0 };
    },
    reference: (forms) => summary(forms.flatMap(({ absorption }) => absorption.flatMap(({ lines: known }) => known.filter(([, , strength]) => strength >= 2).map(([nm]) => `${nm} nm`)))),
    explain: (form) => explained(form, seen, { visibility, countShare, stone }),
  };
}

function spectrumLog({ lines }: VarietySpectrum, seen: readonly Seen[], { visibility, countShare }: { visibility: number; countShare: number }): number {
  let log = 0;
  for (const { nm, u } of seen) {
    let density = strayPerNm;
    for (const [known, halfWidth, strength] of lines) {
      if (Math.abs(known - nm) < halfWidth + 4 * u) density = Math.max(density, visibility * seenShare[strength as 1 | 2 | 3] * softUniformDensity({ low: known - halfWidth, high: known + halfWidth, sigma: u }, nm));
    }
    log += countShare * Math.log(density);
  }
  let [unseen, unseenLog] = [0, 0];
  for (const line of lines) {
    if (seen.some((each) => matches(line, each))) continue;
    unseen++;
    unseenLog += Math.log(1 - visibility * seenShare[line[2] as 1 | 2 | 3]);
  }
  return log + unseenLog * Math.min(1, mostLines / Math.max(1, unseen));
}

const matches = ([known, halfWidth]: VarietySpectrum["lines"][number], { nm, u }: Seen) => Math.abs(known - nm) <= halfWidth + 2 * u;

/** What was seen as expected, what was not seen, what nothing explains: of the variety that fits best. */
function explained({ absorption }: SpeciesForm, seen: readonly Seen[], { visibility, countShare, stone }: { visibility: number; countShare: number; stone: number }): string {
  if (absorption.length === 0) return seen.length === 0 ? "no lines are known of it" : "no lines are known of it; these are unexplained";
  const ofColour = absorption.filter(({ colours }) => colours === 0 || stone === 0 || (colours & stone) !== 0);
  const [first, ...others] = ofColour.length > 0 ? ofColour : absorption;
  const best = others.reduce((a, b) => (spectrumLog(b, seen, { visibility, countShare }) > spectrumLog(a, seen, { visibility, countShare }) ? b : a), first!);
  const list = (title: string, nms: readonly number[]) => (nms.length > 0 ? [`${title} ${[...nms].sort((a, b) => b - a).join(", ")}`] : []);
  return [
    ...list("seen as expected:", seen.filter((each) => best.lines.some((line) => matches(line, each))).map(({ nm }) => nm)),
    ...list("expected and not seen:", best.lines.filter((line) => line[2] >= 2 && !seen.some((each) => matches(line, each))).map(([nm]) => nm)),
    ...list("not known of it:", seen.filter((each) => !best.lines.some((line) => matches(line, each))).map(({ nm }) => nm)),
  ].join("; ") || "only weak lines are known of it";
}
