import fc from "fast-check";
import { expect, test } from "vitest";
import { mostParcelRows, parcelColumnNames, parcelColumns } from "#app/domain/parcel.ts";
import { readPasted } from "#app/features/parcels/parcel-draft.ts";
import { columnOfHeading, readColumns } from "#app/features/parcels/read-columns.ts";
import { splitTable } from "#app/features/parcels/split-table.ts";

const word = fc.stringMatching(/^[a-z0-9.,;"\t \n-]{0,12}$/).map((text) => text.replace(/[\s]+/g, " ").trim());
/** As RFC 4180 writes a cell. */
const quoted = (cell: string) => `"${cell.replaceAll('"', '""')}"`;

test("a table written by RFC 4180, every cell quoted, is read back, whatever its cells hold", () => {
  const tables = fc.integer({ min: 1, max: 6 }).chain((width) => fc.array(fc.array(word, { minLength: width, maxLength: width }), { minLength: 1, maxLength: 12 }));
  fc.assert(
    fc.property(tables, fc.constantFrom("\t", ";", ","), fc.constantFrom("\n", "\r\n", "\r"), (table, delimiter, end) => {
      const kept = table.filter((row) => row.some((cell) => cell !== ""));
      const width = Math.max(0, ...kept.map((row) => row.findLastIndex((cell) => cell !== "") + 1));
      const text = table.map((row) => row.map(quoted).join(delimiter)).join(end);
      // One column has no delimiter to be told by: there, all of them read alike.
      fc.pre(table[0]!.length > 1);
      const { rows } = splitTable(text);
      expect(rows).toEqual(kept.map((row) => row.slice(0, width)));
    }),
  );
});

test("any text gives a table with rows of one length, and never throws", () => {
  fc.assert(
    fc.property(fc.string({ unit: "binary", maxLength: 400 }), (text) => {
      const { rows } = splitTable(text);
      expect(new Set(rows.map((row) => row.length)).size).toBeLessThanOrEqual(1);
      const { columns, rows: body } = readPasted(text);
      for (const row of body) expect(row).toHaveLength(columns.length);
      const chosen = columns.filter((column) => column !== null);
      expect(new Set(chosen).size).toBe(chosen.length);
    }),
  );
});

test("between tabs and semicolons a comma is a decimal mark, between commas it needs quotes", () => {
  expect(splitTable("1\t1,762\t1,770").rows).toEqual([["1", "1,762", "1,770"]]);
  expect(splitTable("1;1,762;1,770").rows).toEqual([["1", "1,762", "1,770"]]);
  expect(splitTable('1,"1,762","1,770"').rows).toEqual([["1", "1,762", "1,770"]]);
  expect(splitTable('mark;note\n1;"a; b"\n2;say "so"').rows).toEqual([["mark", "note"], ["1", "a; b"], ["2", 'say "so"']]);
});

test("a heading is recognised by its words, each column once, and is no stone", () => {
  expect(readPasted("No.,Wt (ct),R.I. low,R.I. high,S.G.,Color\n1,0.14,1.762,1.770,3.99,red")).toMatchObject({ columns: ["mark", "weightCt", "riLow", "riHigh", "sg", "colour"], rows: [["1", "0.14", "1.762", "1.770", "3.99", "red"]] });
  expect(readColumns([["weight", "weight"], ["1", "2"]]).columns).toEqual(["weightCt", null]);
  for (const column of parcelColumns) expect(columnOfHeading(parcelColumnNames[column]), column).toBe(column);
});

test("without a heading the figures say what they may be", () => {
  expect(readPasted("1\t0.142\t1.762\t1.770\tred\n2\t0.151\t1.761\t1.769\tpink")).toMatchObject({ columns: ["mark", "weightCt", "riLow", "riHigh", "colour"], rows: [{ length: 5 }, { length: 5 }] });
  // Words that nobody here knows, over figures: a heading all the same.
  expect(readPasted("Stein\tGewicht\tBrechzahl\na\t0.142\t1.762").rows).toEqual([["a", "0.142", "1.762"]]);
});

test("what does not fit is left out and said", () => {
  const { rows, notes } = splitTable(Array.from({ length: 400 }, (_, at) => `${at}\t1.762`).join("\n"));
  expect(rows).toHaveLength(mostParcelRows + 1);
  expect(notes).toEqual([expect.stringContaining("divide the parcel")]);
  expect(splitTable("x\t".repeat(40)).notes).toEqual([expect.stringContaining("24 of 40 columns")]);
});
