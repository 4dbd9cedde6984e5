import { checkedSpectrum } from "./checked-spectrum.ts";
import { SpectrumFileError, type AssumedUnits, type MeasuredSpectrum } from "./measured-spectrum.ts";
import { mostSpectrumPoints } from "./spectrum-limits.ts";
import { xUnitNamed, yUnitNamed } from "./spectrum-units.ts";

/** Instruments write a head of names and settings above their columns. */
const mostHeadLines = 60;
const separators = { tab: /\t/, semicolon: /;/, comma: /,/, space: /\s+/ } as const;
type Separator = keyof typeof separators;

/**
 * A spectrum of two columns, place on the axis and value, apart by a tab, a semicolon, a comma or blanks; numbers with a
 * decimal point, or with a decimal comma where the comma does not separate. Lines above the first one of two numbers
 * are its head, from which units are taken where they are named.
 * @throws SpectrumFileError
 */
export function readTwoColumns(lines: readonly string[], assumed: AssumedUnits): MeasuredSpectrum {
  const start = lines.findIndex((line, at) => at <= mostHeadLines && separatorOf(line) !== undefined);
  if (start < 0) throw new SpectrumFileError(null, `No line of two numbers was found in the first ${mostHeadLines}: this is neither JCAMP-DX nor a table of two columns.`);
  const separator = separatorOf(lines[start]!)!;
  const points: { x: number; y: number; line: number }[] = [];
  lines.slice(start).forEach((text, offset) => {
    const line = start + offset + 1;
    if (text.trim() === "") return;
    const cells = cellsOf(text, separator);
    if (cells.length !== 2) throw new SpectrumFileError(line, cells.length < 2 ? "One number stands here where two are needed." : tooManyCells(cells.length, separator));
    const [x, y] = cells.map((cell) => numberOf(cell, separator));
    if (x === undefined || y === undefined) throw new SpectrumFileError(line, `“${(x === undefined ? cells[0] : cells[1])!.slice(0, 20)}” is no number.`);
    points.push({ x, y, line });
    if (points.length > mostSpectrumPoints) throw new SpectrumFileError(line, `There are more than ${mostSpectrumPoints.toLocaleString("en")} points here. Save the spectrum at a wider step.`);
  });

  const head = lines.slice(0, start).filter((line) => line.trim() !== "");
  const names = cellsOf(head.at(-1) ?? "", separator);
  const [namedX, namedY] = [names[0] === undefined ? undefined : xUnitNamed(names[0]), names[1] === undefined ? undefined : yUnitNamed(names[1])];
  return checkedSpectrum({
    format: "twoColumns",
    title: head.length > 1 ? head[0]!.trim().slice(0, 200) : "",
    kind: "curve",
    xUnit: namedX ?? assumed.xUnit,
    yUnit: namedY ?? assumed.yUnit,
    isUnitAssumed: !namedX || !namedY,
    notes: [],
    points,
  });
}

/** How a line of numbers is separated; undefined where it is none. */
function separatorOf(line: string): Separator | undefined {
  return (["tab", "semicolon", "space", "comma"] as const).find((separator) => {
    const cells = cellsOf(line, separator);
    return cells.length >= 2 && cells.every((cell) => numberOf(cell, separator) !== undefined);
  });
}

/** The cells of a line; an empty one at its end is a separator too many that spreadsheets leave. */
function cellsOf(line: string, separator: Separator): string[] {
  const cells = line.trim().split(separators[separator]).map((cell) => cell.trim().replace(/^"(.*)"$/, "$1").trim());
  return cells.length > 2 && cells.at(-1) === "" ? cells.slice(0, -1) : cells;
}

function numberOf(cell: string, separator: Separator): number | undefined {
  const text = (separator === "comma" ? cell : cell.replace(/,(?=\d)/, ".")).replace("−", "-");
  if (!/^[+-]?(?:\d+\.?\d*|\.\d+)(?:[Ee][+-]?\d{1,3})?$/.test(text)) return undefined;
  const value = Number(text);
  return Number.isFinite(value) ? value : undefined;
}

function tooManyCells(count: number, separator: Separator): string {
  if (separator === "comma" && count === 4) return "Four numbers stand here: where the comma is the decimal mark, a semicolon or a tab has to separate the columns.";
  return `${count} columns stand here where two are needed: the wavelength and one measurement.`;
}
