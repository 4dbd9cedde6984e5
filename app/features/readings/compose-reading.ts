import type { FieldErrors } from "#app/domain/app-error.ts";
import { parseDecimal } from "#app/domain/decimal.ts";
import { impliedIndex } from "#app/domain/implied-index.ts";
import type { ReadingDetail, ReadingQuality, ReadingValue, ReadingValueName } from "#app/domain/reading.ts";
import { derivedDensity, derivedIndex, differenceOfEdges } from "./derived-values.ts";
import { plainText } from "#app/domain/plain-text.ts";
import { correctedValue } from "./corrected-value.ts";
import { composeDescribed } from "./compose-described.ts";
import { meanOfRepeats } from "#app/gemmology/statistics/mean-of-repeats.ts";
import { againNames, isDescribedDraft, type ReadingDraft } from "./reading-draft.ts";
import type { ReadingInstrument } from "./reading-instrument.ts";
import { readNumber, type NumberRule } from "./read-number.ts";
import { angleUncertaintyDeg, edgeUncertainty, gaugeUncertaintyMm, spotUncertainty, usualUncertainty, waterWeighingUncertaintyCt, weighingUncertaintyCt } from "./usual-uncertainty.ts";

export type ComposedReading = Readonly<{ detail: ReadingDetail; quality: ReadingQuality; values: readonly ReadingValue[] }>;
/** Every test but the rotation run, whose fit is loaded where it is needed: see compose-rotation.ts. */
export type QuickDraft = Exclude<ReadingDraft, { kind: "rotation" }>;
export type Composed = { reading: ComposedReading; problems?: undefined } | { reading?: undefined; problems: FieldErrors };

/**
 * A reading as it was typed, turned into its numbers with their uncertainties and what follows from them, or into what
 * is wrong, a sentence a field. The browser runs it as digits are typed, the server before it saves.
 */
export function composeReading(draft: QuickDraft, instrument: ReadingInstrument | null): Composed {
  if (isDescribedDraft(draft)) return composeDescribed(draft, instrument);
  const problems: Record<string, string[]> = {};
  const values: ReadingValue[] = [];
  const refuse = (field: string, message: string) => void (problems[field] ??= []).push(message);
  const number = (field: string, text: string, rule: NumberRule): number | undefined => {
    const digits = rule.unit === "n" ? impliedIndex(text) : text;
    const read = readNumber(digits, rule, instrument);
    if (typeof read === "string") {
      refuse(field, read);
      return undefined;
    }
    const value = correctedValue(read, digits, rule, instrument);
    values.push(value);
    return value.value;
  };
  const uOf = (name: ReadingValueName, usual: number) => values.find((value) => value.name === name)?.standardUncertainty ?? usual;
  const { quality } = draft;
  const isEmpty = quality === "noResult";

  const detail = ((): ReadingDetail => {
    switch (draft.kind) {
      case "refractometer": {
        const { kind, edges, isRotated, facet, light } = draft;
        if (!isEmpty) {
          const u = edgeUncertainty({ instrument, light, quality });
          if (edges === "one") {
            const n = number("low", draft.low, { ...indexRule, name: "n", what: "the edge", u });
            if (draft.high.trim() !== "") refuse("high", "Leave this empty where only one edge is seen.");
            if (n !== undefined) refuseAboveLimit("low", n);
          } else {
            const low = number("low", draft.low, { ...indexRule, name: "low", what: "the low edge", u });
            const high = number("high", draft.high, { ...indexRule, name: "high", what: "the high edge", u });
            if (low !== undefined) refuseAboveLimit("low", low);
            if (high !== undefined) refuseAboveLimit("high", high);
            if (low !== undefined && high !== undefined) {
              if (low > high) refuse("high", `The high edge (${draft.high.trim()}) lies below the low edge (${draft.low.trim()}). Are the two exchanged?`);
              else if (low === high) refuse("high", "The two edges are the same: tick “One edge only”.");
              else if (high - low > largestGap) refuse("high", `A gap of ${(high - low).toFixed(3)} between the edges is wider than any stone's on this scale. Is a digit wrong?`);
              else values.push(differenceOfEdges({ low, high, edgeUncertainty: u }));
            }
          }
        }
        return { kind, edges, isRotated, facet, light };
      }
      case "spot": {
        const { kind, method, facet, light } = draft;
        if (!isEmpty) {
          const n = number("n", draft.n, { ...indexRule, name: "n", what: "the spot", example: "1.54", u: spotUncertainty({ quality }) });
          if (n !== undefined) refuseAboveLimit("n", n);
        }
        return { kind, method, facet, light };
      }
      case "overLimit":
        if (!isEmpty) number("limit", draft.limit, { ...indexRule, name: "limit", what: "the limit", example: "1.81", min: 1.7, max: 2.1, u: null });
        return { kind: draft.kind, facet: draft.facet, light: draft.light };
      case "criticalAngle": {
        if (!isEmpty) {
          const uAngle = angleUncertaintyDeg(instrument);
          const angleDeg = number("angleDeg", draft.angleDeg, { name: "angleDeg", what: "the angle", unit: "deg", example: "55.23", min: 30, max: 89.9, mostDecimals: 3, isReadOnInstrument: true, u: uAngle });
          const prismN = number("prismN", draft.prismN, { ...indexRule, name: "prismN", what: "the prism's index", example: "1.880", min: 1.4, max: 2.7, mostDecimals: 5, isReadOnInstrument: false, u: usualUncertainty.prismIndex });
          if (angleDeg !== undefined && prismN !== undefined) {
            const derived = derivedIndex({ angleDeg, prismN, uAngleDeg: uOf("angleDeg", uAngle), uPrismN: usualUncertainty.prismIndex });
            if (derived.value < 1.3) refuse("angleDeg", `This angle gives an index of ${derived.value.toFixed(3)}, below that of any stone. Does the scale show the complement?`);
            else values.push(derived);
          }
        }
        return { kind: draft.kind, facet: draft.facet, light: draft.light };
      }
      case "polariscope": {
        const { kind, behaviour, figure, sign } = draft;
        const tried = parseDecimal(draft.directionsTried);
        const isCount = tried !== undefined && Number.isInteger(tried) && tried >= 1 && tried <= 12;
        if (!isEmpty && !isCount) refuse("directionsTried", "Write in how many directions the stone was turned, from 1 to 12.");
        const hasFigure = figure !== "notSought" && figure !== "none";
        if (!isEmpty && sign !== null && !hasFigure) refuse("sign", "A sign is read from an interference figure: choose which one was seen.");
        if (!isEmpty && hasFigure && behaviour === "staysLight") refuse("figure", "A stone that stays light in every direction shows no figure. Which of the two was seen?");
        return { kind, behaviour, directionsTried: isCount ? tried : 0, figure, sign };
      }
      case "density": {
        if (!isEmpty) readDensity(draft);
        return { kind: draft.kind, method: draft.method };
      }
      case "weight":
        if (!isEmpty) number("weightCt", draft.weightCt, { ...massRule, name: "weightCt", what: "the weight", example: "2.143", u: weighingUncertaintyCt(instrument) });
        return { kind: draft.kind };
      case "dimensions": {
        const { kind, shape } = draft;
        if (!isEmpty) {
          const rule = { unit: "mm", example: "8.41", min: 0.1, max: 500, mostDecimals: 3, isReadOnInstrument: true, u: gaugeUncertaintyMm(instrument) } as const;
          const isRound = shape === "round";
          const length = number("lengthMm", draft.lengthMm, { ...rule, name: "lengthMm", what: isRound ? "the largest diameter" : "the length" });
          const width = number("widthMm", draft.widthMm, { ...rule, name: "widthMm", what: isRound ? "the smallest diameter" : "the width" });
          number("depthMm", draft.depthMm, { ...rule, name: "depthMm", what: "the depth" });
          if (length !== undefined && width !== undefined && width > length) refuse("widthMm", isRound ? "The smallest diameter is larger than the largest. Are the two exchanged?" : "The width is more than the length. Are the two exchanged?");
        }
        return { kind, shape };
      }
      case "free": {
        const text = plainText(draft.text);
        if (!isEmpty && text === "") refuse("text", "Write what was seen.");
        if (text.length > mostFreeText) refuse("text", `At most ${mostFreeText} characters; this is ${text.length}.`);
        return { kind: draft.kind, text };
      }
    }
  })();

  function refuseAboveLimit(field: string, n: number) {
    const limit = instrument?.upperLimit;
    if (limit && n > limit + 0.002) refuse(field, `Above ${limit}, the limit of this refractometer's contact liquid: record it as over the limit.`);
  }

  function readDensity({ method, massAirCt, massLiquidCt, tempC, again = {} }: Extract<ReadingDraft, { kind: "density" }>) {
    const uAir = weighingUncertaintyCt(instrument);
    const uLiquid = waterWeighingUncertaintyCt(instrument);
    const isHung = method === "suspended";
    const air = number("massAirCt", massAirCt, { ...massRule, name: "massAirCt", what: "the weight in air", example: "2.143", u: uAir });
    const liquid = number("massLiquidCt", massLiquidCt, { ...massRule, name: "massLiquidCt", what: isHung ? "the weight in water" : "what the beaker gained", example: isHung ? "1.606" : "0.537", isDifference: !isHung, u: uLiquid });
    const repeats = (names: readonly (typeof againNames)[number][], u: number) =>
      names.flatMap((name) => (again[name]?.trim() ? (number(name, again[name], { ...massRule, name, what: "this weighing", example: "2.143", isDifference: !isHung && name.startsWith("massLiquid"), u }) ?? []) : []));
    const airs = repeats(["massAirCt2", "massAirCt3"], uAir);
    const liquids = repeats(["massLiquidCt2", "massLiquidCt3"], uLiquid);
    const temp = number("tempC", tempC, { name: "tempC", what: "the water's temperature", unit: "degC", example: "21.4", min: 0, max: 40, mostDecimals: 2, u: usualUncertainty.waterTempC });
    if (air === undefined || liquid === undefined) return;
    if (liquid >= air) {
      const message = isHung ? "The weight in water" : "What the beaker gained";
      return refuse("massLiquidCt", `${message} must be less than the weight in air (${massAirCt.trim()} ct).`);
    }
    if (!isHung && liquid === 0) return refuse("massLiquidCt", "The beaker gains more than nothing when a stone hangs in it.");
    for (const name of againNames) {
      const value = values.find((one) => one.name === name)?.value;
      const first = name.startsWith("massAir") ? air : liquid;
      if (value !== undefined && Math.abs(value - first) > Math.max(0.1, 0.1 * first)) return refuse(name, `This weighing is far from the first (${first} ct). Is a digit wrong?`);
    }
    if (temp === undefined || Object.keys(problems).length > 0) return;
    const [inAir, inLiquid] = [meanOfRepeats([air, ...airs], uOf("massAirCt", uAir)), meanOfRepeats([liquid, ...liquids], uOf("massLiquidCt", uLiquid))];
    const sg = derivedDensity({ method, massAirCt: inAir.mean, massLiquidCt: inLiquid.mean, tempC: temp, uAirCt: inAir.u, uLiquidCt: inLiquid.u });
    if (sg.value < 0.8 || sg.value > 25) return refuse("massLiquidCt", `These weights give a density of ${sg.value.toPrecision(3)}, which no stone has. Is a digit wrong, or the method another?`);
    values.push(sg);
  }

  return Object.keys(problems).length > 0 ? { problems } : { reading: { detail, quality, values } };
}

const mostFreeText = 1000;
const largestGap = 0.3;
const indexRule = { unit: "n", example: "1.762", min: 1.3, max: 2.1, mostDecimals: 4, isReadOnInstrument: true } as const;
const massRule = { unit: "ct", min: 0, max: 500_000, mostDecimals: 4, isReadOnInstrument: true } as const;
