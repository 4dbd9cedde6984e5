import type { FieldErrors } from "#app/domain/app-error.ts";
import { decimalPlaces, parseDecimal } from "#app/domain/decimal.ts";
import { applyCorrection, type AppliedCorrection } from "#app/features/instruments/apply-correction.ts";
import type { ReadingDetail, ReadingQuality, ReadingValue, ReadingValueName } from "#app/domain/reading.ts";
import { derivedDensity, derivedIndex, differenceOfEdges } from "./derived-values.ts";
import type { ReadingDraft } from "./reading-draft.ts";
import { angleUncertaintyDeg, edgeUncertainty, gaugeUncertaintyMm, spotUncertainty, usualUncertainty, waterWeighingUncertaintyCt, weighingUncertaintyCt } from "./usual-uncertainty.ts";

/** What a reading needs to know of the instrument that it was made on. */
export type ReadingInstrument = Readonly<{ resolution: number | null; standardUncertainty: number | null; upperLimit: number | null; prismIndex: number | null; correction?: AppliedCorrection | null }>;
export type ComposedReading = Readonly<{ detail: ReadingDetail; quality: ReadingQuality; values: readonly ReadingValue[] }>;
export type Composed = { reading: ComposedReading; problems?: undefined } | { reading?: undefined; problems: FieldErrors };

type NumberRule = Readonly<{ name: ReadingValueName; what: string; unit: ReadingValue["unit"]; example: string; min: number; max: number; mostDecimals: number; isReadOnInstrument?: boolean; /** Two readings taken from each other. */ isDifference?: boolean; u: number | null }>;

/**
 * A reading as it was typed, turned into its numbers with their uncertainties and what follows from them, or into what
 * is wrong, a sentence a field. The browser runs it as digits are typed, the server before it saves.
 */
export function composeReading(draft: ReadingDraft, instrument: ReadingInstrument | null): Composed {
  const problems: Record<string, string[]> = {};
  const values: ReadingValue[] = [];
  const refuse = (field: string, message: string) => void (problems[field] ??= []).push(message);
  const number = (field: string, text: string, rule: NumberRule): number | undefined => {
    const read = readNumber(text, rule, instrument);
    if (typeof read === "string") {
      refuse(field, read);
      return undefined;
    }
    const typed = { name: rule.name, typedText: text.trim(), unit: rule.unit, formula: null };
    // The liquid's limit is the liquid's own; everything else that is read on the scale shares the scale's error.
    const corrected = rule.isReadOnInstrument && rule.name !== "limit" ? applyCorrection(instrument?.correction, { value: read, unit: rule.unit, isDifference: rule.isDifference }) : undefined;
    if (!corrected) {
      values.push({ ...typed, value: read, standardUncertainty: rule.u });
      return read;
    }
    const value = inColumn(corrected.value);
    values.push({ ...typed, value, rawValue: read, standardUncertainty: rule.u === null ? null : inColumn(Math.hypot(rule.u, corrected.u)) });
    return value;
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
        const text = draft.text.replace(/\r\n?/g, "\n").normalize("NFC").trim();
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

  function readDensity({ method, massAirCt, massLiquidCt, tempC }: Extract<ReadingDraft, { kind: "density" }>) {
    const uAir = weighingUncertaintyCt(instrument);
    const uLiquid = waterWeighingUncertaintyCt(instrument);
    const isHung = method === "suspended";
    const air = number("massAirCt", massAirCt, { ...massRule, name: "massAirCt", what: "the weight in air", example: "2.143", u: uAir });
    const liquid = number("massLiquidCt", massLiquidCt, { ...massRule, name: "massLiquidCt", what: isHung ? "the weight in water" : "what the beaker gained", example: isHung ? "1.606" : "0.537", isDifference: !isHung, u: uLiquid });
    const temp = number("tempC", tempC, { name: "tempC", what: "the water's temperature", unit: "degC", example: "21.4", min: 0, max: 40, mostDecimals: 2, u: usualUncertainty.waterTempC });
    if (air === undefined || liquid === undefined) return;
    if (liquid >= air) {
      const message = isHung ? "The weight in water" : "What the beaker gained";
      return refuse("massLiquidCt", `${message} must be less than the weight in air (${massAirCt.trim()} ct).`);
    }
    if (!isHung && liquid === 0) return refuse("massLiquidCt", "The beaker gains more than nothing when a stone hangs in it.");
    if (temp === undefined) return;
    const sg = derivedDensity({ method, massAirCt: air, massLiquidCt: liquid, tempC: temp, uAirCt: uOf("massAirCt", uAir), uLiquidCt: uOf("massLiquidCt", uLiquid) });
    if (sg.value < 0.8 || sg.value > 25) return refuse("massLiquidCt", `These weights give a density of ${sg.value.toPrecision(3)}, which no stone has. Is a digit wrong, or the method another?`);
    values.push(sg);
  }

  return Object.keys(problems).length > 0 ? { problems } : { reading: { detail, quality, values } };
}

const mostFreeText = 1000;
const largestGap = 0.3;
const indexRule = { unit: "n", example: "1.762", min: 1.3, max: 2.1, mostDecimals: 4, isReadOnInstrument: true } as const;
const massRule = { unit: "ct", min: 0, max: 500_000, mostDecimals: 4, isReadOnInstrument: true } as const;

/** The number, or the sentence that says why it is none. */
function readNumber(text: string, { what, unit, example, min, max, mostDecimals, isReadOnInstrument, name }: NumberRule, instrument: ReadingInstrument | null): number | string {
  if (text.trim() === "") return `Write ${what}.`;
  const value = text.length > 24 ? undefined : parseDecimal(text);
  if (value === undefined) return `Write ${what} as it is shown, in digits: for example ${example}.`;
  if (unit === "ct" && (name === "massLiquidCt" ? value < 0 : value <= 0)) return name === "massLiquidCt" ? `${sentence(what)} is not less than zero.` : `${sentence(what)} is more than zero.`;
  if (value < min) return unit === "mm" ? `${sentence(what)} is at least ${min} mm.` : outside(what, unit, min, max);
  if (value > max) return unit === "ct" || unit === "mm" ? `At most ${max} ${unit}: is the unit right?` : outside(what, unit, min, max);
  const decimals = decimalPlaces(text);
  if (decimals > mostDecimals) return `At most ${mostDecimals} decimals.`;
  const step = isReadOnInstrument ? instrument?.resolution : null;
  if (step && decimals > Math.max(decimalsOf(step), 2)) return `This instrument is read to ${step}: write the digits that it shows.`;
  return value;
}

const unitWords: Partial<Record<ReadingValue["unit"], string>> = { deg: "°", degC: " °C" };

function outside(what: string, unit: ReadingValue["unit"], min: number, max: number): string {
  const words = unitWords[unit] ?? "";
  return `${sentence(what)} lies between ${min}${words} and ${max}${words}.`;
}

function decimalsOf(step: number): number {
  return /\.(\d+)$/.exec(step.toFixed(6).replace(/0+$/, ""))?.[1]?.length ?? 0;
}

/** At the precision that the database keeps. */
const inColumn = (value: number) => Number(value.toFixed(7));

const sentence = (text: string) => text[0]!.toUpperCase() + text.slice(1);
