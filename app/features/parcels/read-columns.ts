import { parseDecimal } from "#app/domain/decimal.ts";
import type { ParcelColumn } from "#app/domain/parcel.ts";

export type ReadColumns = Readonly<{ columns: ReadonlyArray<ParcelColumn | null>; /** The first row names the columns and is no stone. */ hasHeader: boolean }>;

/** How spreadsheets head a column, folded: letters and digits alone. */
const headings: Readonly<Record<ParcelColumn, readonly string[]>> = {
  mark: ["mark", "no", "nr", "num", "number", "stone", "stoneno", "id", "label", "lot", "ref", "item"],
  weightCt: ["weight", "weightct", "wt", "wtct", "ct", "cts", "carat", "carats", "mass", "massct", "weightcarats", "weightinair", "weightair", "air", "airct", "weightinairct"],
  waterCt: ["weightinwater", "weightinwaterct", "water", "waterct", "wtwater", "weightwater", "inwater"],
  riLow: ["rilow", "nlow", "low", "lowri", "rimin", "lowindex", "indexlow", "indexlowedge", "indexlowedgeoronly", "ri", "n", "index", "refractiveindex", "ri1", "lowedge"],
  riHigh: ["rihigh", "nhigh", "high", "highri", "rimax", "highindex", "indexhigh", "indexhighedge", "ri2", "highedge"],
  riSpot: ["rispot", "spot", "spotri", "indexspot", "spotindex", "distantvision"],
  sg: ["sg", "density", "specificgravity", "relativedensity", "rd"],
  birefringence: ["birefringence", "dr", "delta", "dn", "bi", "biref"],
  character: ["character", "opticcharacter", "optic", "polariscope", "srdr"],
  sign: ["sign", "opticsign"],
  colour: ["colour", "color", "hue"],
  transparency: ["transparency", "clarity"],
  lustre: ["lustre", "luster"],
  pleochroism: ["pleochroism", "dichroism", "pleo"],
  longWave: ["longwave", "lw", "uvlw", "lwuv", "longwavefluorescence", "uv365", "365nm"],
  shortWave: ["shortwave", "sw", "uvsw", "swuv", "shortwavefluorescence", "uv254", "254nm"],
  absorption: ["absorption", "absorptionnm", "spectrum", "lines", "spectrumnm"],
  colourFilter: ["colourfilter", "colorfilter", "filter"],
  phenomena: ["phenomena", "phenomenon"],
  magnetic: ["magnetic", "magnet", "magnetism"],
  thermal: ["thermal", "thermalprobe", "probe"],
  features: ["features", "inclusions", "seeninside", "inside", "microscope"],
  note: ["note", "notes", "remark", "remarks", "comment", "comments"],
};
const byHeading = new Map(Object.entries(headings).flatMap(([column, words]) => words.map((word) => [word, column as ParcelColumn] as const)));

export function columnOfHeading(text: string): ParcelColumn | null {
  const folded = text.normalize("NFKD").toLowerCase().replace(/[^a-z0-9]/g, "");
  return byHeading.get(folded) ?? null;
}

/**
 * Which column is which, by the words of the first row, each taken once; where none of its words is known, by what the
 * figures look like: a guess that the page shows and anybody changes.
 */
export function readColumns(rows: readonly string[][]): ReadColumns {
  const [first = [], ...others] = rows;
  const named = once(first.map((cell) => (parseDecimal(cell) === undefined ? columnOfHeading(cell) : null)));
  if (named.some((column) => column !== null)) return { columns: named, hasHeader: true };
  // Words over figures are a heading too, though nobody here knows them.
  const isHeading = others.length > 0 && first.every((cell) => parseDecimal(cell) === undefined) && others[0]!.some((cell) => parseDecimal(cell) !== undefined);
  const body = isHeading ? others : rows;
  return { columns: guess(body), hasHeader: isHeading };
}

function once(columns: ReadonlyArray<ParcelColumn | null>): Array<ParcelColumn | null> {
  return columns.map((column, at) => (column !== null && columns.indexOf(column) === at ? column : null));
}

function guess(rows: readonly string[][]): Array<ParcelColumn | null> {
  const width = rows[0]?.length ?? 0;
  const found: Array<ParcelColumn | null> = [];
  for (let at = 0; at < width; at++) {
    const cells = rows.map((row) => row[at]!).filter((cell) => cell !== "");
    const figures = cells.map(parseDecimal);
    const areAll = (test: (value: number, cell: string) => boolean) => cells.length > 0 && figures.every((value, index) => value !== undefined && test(value, cells[index]!));
    const decimals = (cell: string) => /[.,](\d+)$/.exec(cell)?.[1]?.length ?? 0;
    const isFirst = (column: ParcelColumn) => !found.includes(column);
    if (at === 0 && width > 1 && areAll((value, cell) => decimals(cell) === 0 && value >= 0)) found.push("mark");
    else if (areAll((value, cell) => value >= 1.3 && value <= 1.9 && decimals(cell) >= 3)) found.push(isFirst("riLow") ? "riLow" : isFirst("riHigh") ? "riHigh" : null);
    else if (areAll((value) => value > 0)) found.push(isFirst("weightCt") ? "weightCt" : null);
    else if (at === 0 && width > 1) found.push("mark");
    else if (cells.length > 0 && figures.every((value) => value === undefined) && isFirst("colour")) found.push("colour");
    else found.push(null);
  }
  return found;
}
