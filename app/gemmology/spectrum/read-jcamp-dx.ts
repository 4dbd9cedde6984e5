import { checkedSpectrum } from "./checked-spectrum.ts";
import { evenSteps } from "./even-steps.ts";
import { freeNumber } from "./free-number.ts";
import { labelledRecords, type LabelledRecord } from "./labelled-records.ts";
import { SpectrumFileError, type AssumedUnits, type MeasuredSpectrum } from "./measured-spectrum.ts";
import { numberPairs } from "./number-pairs.ts";
import { ordinateLines } from "./ordinate-lines.ts";
import { xUnitNamed, yUnitNamed } from "./spectrum-units.ts";

const curveLabels = ["XYDATA", "XYPOINTS"];
const peakLabels = ["PEAKTABLE", "PEAKASSIGNMENTS"];
const longestTitle = 200;

/**
 * The spectrum of a JCAMP-DX file, version 4.24 or 5.01: XYDATA in any of the numeric forms, XYPOINTS, or a PEAK TABLE.
 * A file of several blocks is read where one of them alone holds a curve; arrays of more than one variable (NTUPLES)
 * are refused.
 *
 * Sources: McDonald and Wilks, Applied Spectroscopy 42 (1988) 151–162 (4.24); P. Lampen, J. Lambert, R. J. Lancashire,
 * R. S. McDonald, P. S. McIntyre, D. N. Rutledge, T. Fröhlich and A. N. Davies, Pure and Applied Chemistry 71 (1999)
 * 1549–1556 (5.01).
 * @throws SpectrumFileError
 */
export function readJcampDx(lines: readonly string[], assumed: AssumedUnits): MeasuredSpectrum {
  const records = labelledRecords(lines);
  const arrays = records.find(({ label }) => label === "NTUPLES" || label === "DATATABLE");
  if (arrays) throw new SpectrumFileError(arrays.line, "This file holds arrays of several variables (NTUPLES), which are not read here. Save the spectrum by itself.");
  const notes: string[] = [];
  const data = onlyTable(records, notes);
  const block = blockOf(records, data);
  const text = (label: string) => block.find((record) => record.label === label && record.text !== "")?.text;
  const number = (label: string) => numberIn(block.find((record) => record.label === label && record.text !== ""));

  const [xName, yName] = [text("XUNITS"), text("YUNITS")];
  const namedX = xName === undefined ? undefined : xUnitNamed(xName);
  if (xName !== undefined && !namedX) throw new SpectrumFileError(block.find(({ label }) => label === "XUNITS")!.line, `The axis counts “${xName.slice(0, 40)}”; spectra of light count nanometres, micrometres or 1/cm.`);
  const namedY = yName === undefined ? undefined : yUnitNamed(yName);
  if (yName !== undefined && !namedY) notes.push(`What “${yName.slice(0, 40)}” means is not known here: the values are shown as they are.`);

  const common = {
    format: "jcampDx",
    title: (text("TITLE") ?? "").slice(0, longestTitle),
    kind: curveLabels.includes(data.label) ? "curve" : "peakTable",
    xUnit: namedX ?? assumed.xUnit,
    yUnit: namedY ?? (yName === undefined ? assumed.yUnit : "arbitrary"),
    isUnitAssumed: xName === undefined || yName === undefined,
  } as const;
  const form = data.text.replace(/\s/g, "").toUpperCase();
  requireEnd(block, number("NPOINTS"));
  if (form.startsWith("(X++(Y..Y))")) return checkedSpectrum({ ...common, points: evenPoints(data, number, notes), notes });
  if (form.startsWith("(XY..XY)") || form.startsWith("(XYW..XYW)")) {
    // Tables of peaks are in the axes' own units; the factors belong to the curve.
    const [xFactor, yFactor] = common.kind === "curve" ? [number("XFACTOR") ?? 1, number("YFACTOR") ?? 1] : [1, 1];
    const points = numberPairs(data.more, form.startsWith("(XYW") ? 3 : 2).map(({ x, y, line }) => ({ x: x * xFactor, y: y * yFactor, line }));
    requireCount(number("NPOINTS"), points.length);
    return checkedSpectrum({ ...common, points, notes });
  }
  throw new SpectrumFileError(data.line, data.text === "" ? "The data table does not say its form." : `The data table has the form “${data.text.slice(0, 30)}”; (X++(Y..Y)) and (XY..XY) are read.`);
}

function evenPoints(data: LabelledRecord, number: (label: string) => number | undefined, notes: string[]) {
  const table = ordinateLines(data.more);
  const xFactor = number("XFACTOR") ?? 1;
  const yFactor = number("YFACTOR") ?? 1;
  if (xFactor === 0 || yFactor === 0) throw new SpectrumFileError(null, "A factor of 0 (XFACTOR or YFACTOR) leaves nothing of the data.");
  const pointCount = number("NPOINTS");
  const xs = evenSteps(table, { firstX: number("FIRSTX"), lastX: number("LASTX"), deltaX: number("DELTAX"), pointCount, xFactor });
  if (!table.isChecked) {
    if (pointCount === undefined) throw new SpectrumFileError(data.more.at(-1)!.line, "The last line is in differences, and neither a check of its end nor a number of points follows: the file is not complete.");
    notes.push("The last line of differences has no check behind it.");
  }
  const firstY = number("FIRSTY");
  const first = table.ordinates[0];
  if (firstY !== undefined && first !== undefined && first !== null && !fits(firstY, first * yFactor) && !fits(firstY, first)) notes.push(`The file announces ${firstY} as its first value (FIRSTY) and begins with ${Number((first * yFactor).toPrecision(6))}.`);
  const missing = table.ordinates.filter((y) => y === null).length;
  if (missing > 0) notes.push(`${missing} ${missing === 1 ? "point was" : "points were"} not measured (?) and ${missing === 1 ? "is" : "are"} left out.`);
  return xs.flatMap((x, at) => (table.ordinates[at] === null ? [] : [{ x, y: table.ordinates[at]! * yFactor, line: null }]));
}

/** Within what a writer's rounding explains. */
const fits = (one: number, other: number) => Math.abs(one - other) <= 0.01 * Math.max(Math.abs(one), Math.abs(other), 1e-9);

function onlyTable(records: readonly LabelledRecord[], notes: string[]): LabelledRecord {
  const curves = records.filter(({ label }) => curveLabels.includes(label));
  const peaks = records.filter(({ label }) => peakLabels.includes(label));
  if (curves.length > 1) throw new SpectrumFileError(curves[1]!.line, `This file holds ${curves.length} spectra. Save the one that belongs to this stone by itself.`);
  if (curves[0] && peaks.length > 0) notes.push("The file's own table of peaks is left aside; the curve was read.");
  const table = curves[0] ?? peaks.find(({ label }) => label === "PEAKTABLE");
  if (!table) throw new SpectrumFileError(null, "This JCAMP-DX file holds no spectrum: none of XYDATA, XYPOINTS or PEAK TABLE stands in it.");
  if (!curves[0] && peaks.filter(({ label }) => label === "PEAKTABLE").length > 1) throw new SpectrumFileError(table.line, "This file holds several tables of peaks. Save the one that belongs to this stone by itself.");
  return table;
}

/** The records between the title above a table and the next title or end. */
function blockOf(records: readonly LabelledRecord[], table: LabelledRecord): LabelledRecord[] {
  const at = records.indexOf(table);
  const start = records.findLastIndex(({ label }, index) => index <= at && label === "TITLE");
  const next = records.findIndex(({ label }, index) => index > at && (label === "TITLE" || label === "END"));
  return records.slice(Math.max(0, start), next < 0 ? undefined : next + 1);
}

function numberIn(record: LabelledRecord | undefined): number | undefined {
  if (!record) return undefined;
  const read = freeNumber(record.text);
  if (!read || read.written !== record.text) throw new SpectrumFileError(record.line, `${record.label} is a number with a decimal point, not “${record.text.slice(0, 30)}”.`);
  return read.value;
}

function requireCount(announced: number | undefined, count: number): void {
  if (announced !== undefined && announced !== count) throw new SpectrumFileError(null, `The file announces ${announced} points (NPOINTS) and holds ${count}: it is not complete, or was changed.`);
}

/** A table can be cut between two lines without a trace: the end or the count has to say that it is whole. */
function requireEnd(block: readonly LabelledRecord[], announced: number | undefined): void {
  if (announced === undefined && block.at(-1)?.label !== "END") throw new SpectrumFileError(null, "The file stops without its end (##END=) and does not say how many points it has: it is not complete.");
}
