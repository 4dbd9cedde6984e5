/** A position while it is typed: text in every cell. */
export type PositionRow = Readonly<{ angle: string; first: string; second: string; polariser: string }>;
export type FacetTable = Readonly<{ label: string; rows: readonly PositionRow[] }>;

const usualStepDeg = 15;
const emptyRow = (angle: string): PositionRow => ({ angle, first: "", second: "", polariser: "" });

/** Thirteen positions over a half turn; the last repeats the first, to see whether the stone has moved. */
export const emptyFacet = (label: string): FacetTable => ({ label, rows: Array.from({ length: 180 / usualStepDeg + 1 }, (_, at) => emptyRow(String(at * usualStepDeg))) });
export const addedRow = (rows: readonly PositionRow[]): PositionRow => emptyRow(String((Number(rows.at(-1)?.angle ?? -usualStepDeg) || 0) + usualStepDeg));

const isTyped = ({ first, second }: PositionRow) => first.trim() !== "" || second.trim() !== "";
const cell = (text: string) => text.trim().replace(/\s+/g, "") || "-";

/** The lines that the form sends: positions without an edge are left out. */
export function rowsText(facets: readonly FacetTable[]): string {
  return facets
    .filter(({ rows }) => rows.some(isTyped))
    .map(({ label, rows }) => [`${/^\p{L}/u.test(label.trim()) ? label.trim() : `facet ${label.trim()}`}:`, ...rows.filter(isTyped).map((row) => [cell(row.angle), cell(row.first), cell(row.second), ...(row.polariser.trim() ? [cell(row.polariser)] : [])].join(" "))].join("\n"))
    .join("\n");
}

/** Back from such lines into tables; what does not read as a position is kept in the angle's cell. */
export function tablesOf(text: string): readonly FacetTable[] {
  const facets: Array<{ label: string; rows: PositionRow[] }> = [];
  for (const line of text.split("\n").map((each) => each.trim()).filter(Boolean)) {
    if (/^\p{L}/u.test(line)) facets.push({ label: line.replace(/:$/, ""), rows: [] });
    else {
      if (facets.length === 0) facets.push({ label: "table", rows: [] });
      const [angle = "", first = "", second = "", polariser = ""] = line.split(/[\s;]+/);
      facets.at(-1)!.rows.push({ angle, first: first === "-" ? "" : first, second: second === "-" ? "" : second, polariser });
    }
  }
  return facets.length > 0 ? facets : [emptyFacet("table")];
}
