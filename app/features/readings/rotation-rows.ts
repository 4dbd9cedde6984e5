import { parseDecimal } from "#app/domain/decimal.ts";
import { impliedIndex } from "#app/domain/implied-index.ts";
import type { RotationFacet, RotationReading, RotationRun } from "#app/gemmology/rotation/rotation-run.ts";

export type ReadRows = Readonly<{ run: RotationRun; problem: null } | { run: null; problem: string }>;

const mostFacets = 6;
const mostPositions = 100;
const unseen = /^(-|–|—|\.|x)$/i;

/**
 * Positions of a rotation run as they are typed, one a line: angle, the two edges in either order, and, where it was read,
 * the polariser's azimuth; blanks, tabs or semicolons between. A dash is an edge that was not seen, “=” the same edge once
 * more, "1762" is 1.762. A line that begins with a letter names the facet of those below it.
 *
 * @param edgeU standard uncertainty of one edge
 * @returns the run, or the first thing that cannot be read, with its line
 */
export function readRotationRows(text: string, edgeU: number): ReadRows {
  const facets: Array<{ label: string; readings: RotationReading[] }> = [];
  const refuse = (line: number, what: string): ReadRows => ({ run: null, problem: `Line ${line}: ${what}` });
  let positions = 0;
  for (const [at, raw] of text.split("\n").entries()) {
    const line = raw.trim();
    if (line === "") continue;
    if (/^\p{L}/u.test(line)) {
      if (facets.length === mostFacets) return refuse(at + 1, `at most ${mostFacets} facets.`);
      facets.push({ label: line.replace(/:$/, "").slice(0, 60), readings: [] });
      continue;
    }
    const cells = line.split(/[\s;]+/).filter(Boolean);
    if (cells.length < 3 || cells.length > 4) return refuse(at + 1, "write the angle and the two edges, then the polariser's azimuth if it was read: “15 1.658 1.673”. A dash stands for an edge not seen.");
    const angleDeg = parseDecimal(cells[0]!.replace("°", ""));
    if (angleDeg === undefined || angleDeg < -360 || angleDeg > 720) return refuse(at + 1, `“${cells[0]}” is no angle between −360° and 720°.`);
    const edges: Array<number | null> = [];
    for (const cell of cells.slice(1, 3)) {
      const edge = cell === "=" ? (edges[0] ?? undefined) : unseen.test(cell) ? null : parseDecimal(impliedIndex(cell));
      if (edge === undefined || (edge !== null && (edge < 1.3 || edge > 2.1))) return refuse(at + 1, `“${cell}” is no edge between 1.3 and 2.1.`);
      edges.push(edge);
    }
    const [first, second] = edges as [number | null, number | null];
    if (first === null && second === null) return refuse(at + 1, "at least one edge was seen, or the position is left out.");
    const polariserDeg = cells[3] === undefined || unseen.test(cells[3]) ? null : parseDecimal(cells[3].replace("°", ""));
    if (polariserDeg === undefined || (polariserDeg !== null && Math.abs(polariserDeg) > 360)) return refuse(at + 1, `“${cells[3]}” is no azimuth between −360° and 360°.`);
    positions += 1;
    if (positions > mostPositions) return refuse(at + 1, `at most ${mostPositions} positions.`);
    if (facets.length === 0) facets.push({ label: "table", readings: [] });
    // A single edge is written where its partner's column is; which of the two it is, the first column says.
    const isOrdered = first !== null && second !== null;
    facets.at(-1)!.readings.push({ angleDeg, lower: isOrdered ? Math.min(first, second) : first, upper: isOrdered ? Math.max(first, second) : second, u: edgeU, polariserDeg });
  }
  const empty = facets.find(({ readings }) => readings.length === 0);
  if (empty) return { run: null, problem: `No position under “${empty.label}”.` };
  if (positions < 3) return { run: null, problem: `A run needs at least three positions; ${positions === 0 ? "there is none yet" : `so far there ${positions === 1 ? "is one" : "are two"}`}.` };
  return { run: { facets: facets as RotationFacet[] }, problem: null };
}

/** How much was read, for a line that tells of a run. */
export function rotationPositions(rows: string): { facetCount: number; positionCount: number } {
  const { run } = readRotationRows(rows, 0.0015);
  return { facetCount: run?.facets.length ?? 0, positionCount: run?.facets.reduce((sum, { readings }) => sum + readings.length, 0) ?? 0 };
}
