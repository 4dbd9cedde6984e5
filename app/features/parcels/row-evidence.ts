import { decimalPlaces, parseDecimal } from "#app/domain/decimal.ts";
import { mostCellLength, type ParcelCells, type ParcelColumn } from "#app/domain/parcel.ts";
import { usualUncertainty, waterWeighingUncertaintyCt, weighingUncertaintyCt } from "#app/features/readings/usual-uncertainty.ts";
import { hydrostaticDensity } from "#app/gemmology/density/hydrostatic-density.ts";
import { fluorescenceStrengths, magneticResponses, strengths, type Evidence, type OpticCharacter } from "#app/gemmology/ranking/evidence.ts";

/** A value of a row that is a figure, with the standard uncertainty that it is compared by. */
export type RowFigure = Readonly<{ value: number; u: number }>;
export type RowFigures = Readonly<Partial<Record<"riLow" | "riHigh" | "riSpot" | "sg" | "birefringence" | "weightCt", RowFigure>>>;
export type ReadRow = Readonly<{
  evidence: Evidence;
  figures: RowFigures;
  /** What is wrong, a sentence a column. */
  problems: Readonly<Partial<Record<number, string>>>;
}>;

export type ParcelSetting = Readonly<{ columns: ReadonlyArray<ParcelColumn | null>; /** Of the water that they were weighed in; null where none was. */ waterTempC: number | null }>;

type FigureColumn = "weightCt" | "waterCt" | "riLow" | "riHigh" | "riSpot" | "sg" | "birefringence";
const figureRules: Readonly<Record<FigureColumn, { what: string; min: number; max: number; mostDecimals: number; example: string }>> = {
  weightCt: { what: "A weight", min: 0.0005, max: 500_000, mostDecimals: 4, example: "0.142" },
  waterCt: { what: "A weight in water", min: 0, max: 500_000, mostDecimals: 4, example: "0.107" },
  riLow: { what: "An index", min: 1.3, max: 2.1, mostDecimals: 4, example: "1.762" },
  riHigh: { what: "An index", min: 1.3, max: 2.1, mostDecimals: 4, example: "1.770" },
  riSpot: { what: "A spot reading", min: 1.3, max: 2.1, mostDecimals: 4, example: "1.54" },
  sg: { what: "A density", min: 0.8, max: 25, mostDecimals: 4, example: "3.99" },
  birefringence: { what: "A birefringence", min: 0, max: 0.3, mostDecimals: 4, example: "0.008" },
};

/** What people write for an optic character in one cell. */
const characters: Readonly<Record<string, OpticCharacter>> = {
  sr: "isotropic", isotropic: "isotropic", "singly refractive": "isotropic", dr: "anisotropic", anisotropic: "anisotropic", "doubly refractive": "anisotropic", adr: "anomalous", anomalous: "anomalous",
  "anomalous double refraction": "anomalous", agg: "aggregate", aggregate: "aggregate", uniaxial: "uniaxial", u: "uniaxial", biaxial: "biaxial", b: "biaxial",
};
const signs: Readonly<Record<string, "+" | "-">> = { "+": "+", positive: "+", pos: "+", "-": "-", "−": "-", "–": "-", negative: "-", neg: "-" };

/**
 * A row of a parcel as the ranking takes it. Two edges of a table are read at one position, so they are bounds; an empty
 * cell says nothing; a cell that cannot be read says why, and the rest of its row still counts.
 */
export function rowEvidence(cells: ParcelCells, { columns, waterTempC }: ParcelSetting): ReadRow {
  const problems: Partial<Record<number, string>> = {};
  const at = (column: ParcelColumn) => columns.indexOf(column);
  const text = (column: ParcelColumn) => (at(column) < 0 ? "" : (cells[at(column)] ?? "").trim());
  const refuse = (column: ParcelColumn, message: string): undefined => void (problems[at(column)] ??= message);
  for (const [index, cell] of cells.entries()) if (cell.length > mostCellLength) problems[index] = `At most ${mostCellLength} characters.`;

  const figure = (column: FigureColumn): number | undefined => {
    const typed = text(column);
    if (typed === "") return undefined;
    const { what, min, max, mostDecimals, example } = figureRules[column];
    const value = parseDecimal(typed);
    if (value === undefined) return refuse(column, `Write digits: for example ${example}.`);
    if (value < min || value > max) return refuse(column, `${what} lies between ${min} and ${max}.`);
    if (decimalPlaces(typed) > mostDecimals) return refuse(column, `At most ${mostDecimals} decimals.`);
    return value;
  };
  const word = <Word extends string>(column: ParcelColumn, known: Readonly<Record<string, Word>>): Word | undefined => {
    const typed = text(column).toLowerCase();
    if (typed === "") return undefined;
    return Object.hasOwn(known, typed) ? known[typed] : refuse(column, `Not known here: write ${listed([...new Set(Object.values(known))])}.`);
  };
  const words = (column: ParcelColumn) => text(column).split(/[,;/]/).map((part) => part.trim()).filter(Boolean);

  const [low, high, spot] = [figure("riLow"), figure("riHigh"), figure("riSpot")];
  if (low !== undefined && high !== undefined && low > high) refuse("riHigh", `The high edge lies below the low edge (${text("riLow")}). Are the two exchanged?`);
  if (low === undefined && high !== undefined && text("riLow") === "") refuse("riHigh", "A high edge needs its low edge. Is it the only one? Then it goes to the other column.");
  const areEdges = low !== undefined && high !== undefined && low < high;
  const ri = [
    ...(areEdges ? [{ kind: "edges", low, high, u: usualUncertainty.edge, rotated: false } as const] : low !== undefined && !(high !== undefined && low > high) ? [{ kind: "single", n: low, u: usualUncertainty.edge } as const] : []),
    ...(spot !== undefined ? [{ kind: "spot", n: spot, u: spotU } as const] : []),
  ];
  const birefringence = figure("birefringence");
  const [weight, typedSg] = [figure("weightCt"), figure("sg")];
  const weighed = weighedDensity(weight, figure("waterCt"));
  const sg = weighed ?? (typedSg === undefined ? undefined : { value: typedSg, u: typedSgU });

  const character = word("character", characters);
  const sign = word("sign", signs);
  const longWave = fluorescence("longWave");
  const shortWave = fluorescence("shortWave");
  const pleochroism = strengthAnd("pleochroism", strengths);
  const magnetic = word("magnetic", own(magneticResponses));
  const thermal = word("thermal", { "diamond-like": "diamond-like", diamond: "diamond-like", inert: "inert" } as const);
  const absorption = absorptionOf();

  const evidence: Evidence = {
    ...(ri.length > 0 && { ri }),
    ...(birefringence !== undefined && { birefringence: { value: birefringence, u: usualUncertainty.edge * usualUncertainty.gapShare } }),
    ...(character && { opticCharacter: character }),
    ...(sign && (character === "uniaxial" || character === "biaxial" || !character) && { opticSign: sign }),
    ...(sg && { sg }),
    ...(words("colour").length > 0 && { colour: words("colour") }),
    ...(text("transparency") && { transparency: text("transparency").toLowerCase() }),
    ...(text("lustre") && { lustre: text("lustre").toLowerCase() }),
    ...(pleochroism && { pleochroism: { strength: pleochroism.strength, ...(pleochroism.rest.length > 0 && { colours: pleochroism.rest }) } }),
    ...((longWave || shortWave) && { fluorescence: { ...(longWave && { longWave }), ...(shortWave && { shortWave }) } }),
    ...(absorption.length > 0 && { absorption }),
    ...(text("colourFilter") && { colourFilter: text("colourFilter").toLowerCase() }),
    ...(words("phenomena").length > 0 && { phenomena: words("phenomena").map((each) => each.toLowerCase()) }),
    ...(thermal && { thermal }),
    ...(magnetic && { magnetic }),
    ...(words("features").length > 0 && { features: words("features") }),
  };
  return {
    evidence,
    problems,
    figures: {
      ...(low !== undefined && { riLow: { value: low, u: usualUncertainty.edge } }),
      ...(high !== undefined && { riHigh: { value: high, u: usualUncertainty.edge } }),
      ...(spot !== undefined && { riSpot: { value: spot, u: spotU } }),
      ...(sg && { sg }),
      ...(birefringence !== undefined && { birefringence: { value: birefringence, u: usualUncertainty.edge * usualUncertainty.gapShare } }),
      ...(weight !== undefined && { weightCt: { value: weight, u: weighingUncertaintyCt(null) } }),
    },
  };

  function weighedDensity(air: number | undefined, water: number | undefined): RowFigure | undefined {
    if (water === undefined) return undefined;
    if (text("weightCt") === "") return refuse("waterCt", "The weight in water needs the weight in air beside it.");
    if (air === undefined) return undefined;
    if (water >= air) return refuse("waterCt", `Less than the weight in air (${text("weightCt")} ct), or it would not sink.`);
    if (waterTempC === null) return refuse("waterCt", "Write the water’s temperature above the table: the density hangs on it.");
    const { sg: value, uSg: u } = hydrostaticDensity({ method: "suspended", massAirCt: air, massLiquidCt: water, tempC: waterTempC, uMassAirCt: weighingUncertaintyCt(null), uMassLiquidCt: waterWeighingUncertaintyCt(null), uTempC: usualUncertainty.waterTempC });
    return value < 0.8 || value > 25 ? refuse("waterCt", `These weights give a density of ${value.toPrecision(3)}, which no stone has.`) : { value, u };
  }

  function strengthAnd<Strength extends string>(column: ParcelColumn, known: readonly Strength[]): { strength: Strength; rest: string[] } | undefined {
    const typed = text(column).toLowerCase();
    if (typed === "") return undefined;
    const strength = known.find((each) => typed === each || typed.startsWith(`${each} `) || typed.startsWith(`${each},`));
    if (!strength) return refuse(column, `Begin with ${listed(known)}; the colour after it.`);
    return { strength, rest: typed.slice(strength.length).split(/[,;/]/).map((part) => part.trim()).filter(Boolean) };
  }

  function fluorescence(column: "longWave" | "shortWave") {
    const seen = strengthAnd(column, fluorescenceStrengths);
    return seen && { strength: seen.strength, ...(seen.rest[0] && { colour: seen.rest.join(", ") }) };
  }

  function absorptionOf(): Array<{ nm: number; kind: "line" | "band" }> {
    const parts = text("absorption").toLowerCase().split(/[,;/ ]+/).filter(Boolean);
    const read = parts.map((part) => /^(\d{3}(?:\.\d)?)(b?)$/.exec(part));
    if (read.some((match) => match === null || Number(match[1]) < 350 || Number(match[1]) > 800)) {
      refuse("absorption", "Write wavelengths in nm, 350 to 800, a b behind a band: 694 668 550b.");
      return [];
    }
    return read.map((match) => ({ nm: Number(match![1]), kind: match![2] ? "band" : "line" }));
  }
}

/** A spot of a good dome; a density that came as a figure, nobody knows from which weights. */
const spotU = 0.006;
const typedSgU = 0.03;

const own = <Word extends string>(known: readonly Word[]) => Object.fromEntries(known.map((each) => [each, each])) as Record<string, Word>;
const listed = (known: readonly string[]) => `${known.slice(0, -1).join(", ")} or ${known.at(-1)}`;
