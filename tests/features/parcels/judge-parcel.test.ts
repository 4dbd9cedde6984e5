import fc from "fast-check";
import { expect, test } from "vitest";
import { judgeParcel, rankedRow, saysNothing } from "#app/features/parcels/judge-parcel.ts";
import { readDraft } from "#app/features/parcels/read-draft.ts";
import { robustOutliers } from "#app/features/parcels/robust-outliers.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { rankSpecies } from "#app/gemmology/ranking/rank-species.ts";
import { aParcelDraft } from "../../setup/parcel-factory.ts";

const judge = (draft: Parameters<typeof readDraft>[0]) => {
  const { rows } = readDraft(draft);
  const { table } = loadSpeciesTable();
  return judgeParcel(rows, rows.map(({ evidence }) => (saysNothing(evidence) ? null : rankedRow(rankSpecies(evidence, table)))));
};

test("nine corundums and a spinel: corundum it is, and the spinel stands apart by its ranking and by its figures", () => {
  const { main, rows, rankedCount } = judge(aParcelDraft());
  expect(main).toMatchObject({ speciesId: "corundum", rowCount: 9 });
  expect(rankedCount).toBe(10);
  expect(rows.flatMap(({ odd }, at) => (odd.length > 0 ? [at + 1] : []))).toEqual([7]);
  expect(rows[6]!.top[0]).toMatchObject({ speciesId: "spinel" });
  expect(rows[6]!.odd).toEqual([expect.stringContaining("Corundum does not fit"), expect.stringMatching(/^Index 1\.7180 stands far from the parcel’s median 1\.7620/), expect.stringMatching(/^Density 3\.600 stands far/)]);
});

test("the order of the rows changes nothing but their places", () => {
  const draft = aParcelDraft();
  const turned = judge({ ...draft, rows: draft.rows.toReversed() });
  const straight = judge(draft);
  expect(turned.main).toEqual(straight.main);
  expect(turned.rows.toReversed()).toEqual(straight.rows);
});

test("a parcel that says nothing has no main species and nobody apart", () => {
  expect(judge(aParcelDraft({ columns: ["mark"], rows: [["1"], ["2"]] }))).toMatchObject({ main: null, rankedCount: 0, rows: [{ top: [], odd: [] }, { top: [], odd: [] }] });
});

test("the modified z-score, by its own definition: 0.6745 (x − median) / MAD (Iglewicz and Hoaglin 1993; NIST handbook 1.3.5.17)", () => {
  const values = [2.1, 2.3, 2.4, 2.5, 2.6, 2.3, 8.2];
  // Median 2.4; absolute deviations 0.3 0.1 0 0.1 0.2 0.1 5.8, of which the median is 0.1.
  const [outlier] = robustOutliers(values, 0.01).filter((one) => one !== undefined);
  expect(outlier!.median).toBe(2.4);
  expect(outlier!.z).toBeCloseTo((0.6745 * 5.8) / 0.1, 1);
});

test("four strangers in a dozen do not hide each other, as they would from a mean and a standard deviation", () => {
  const values = [1.762, 1.761, 1.763, 1.762, 1.762, 1.761, 1.763, 1.762, 1.718, 1.718, 1.719, 1.717];
  expect(robustOutliers(values, 0.0015).flatMap((one, at) => (one ? [at] : []))).toEqual([8, 9, 10, 11]);
});

test("the last digit of an instrument makes no stranger, and few values say nothing", () => {
  expect(robustOutliers([1.762, 1.762, 1.762, 1.762, 1.762, 1.762, 1.764], 0.0015)).toEqual(Array(7).fill(undefined));
  expect(robustOutliers([1, 1, 1, 9], 0.001)).toEqual(Array(4).fill(undefined));
  expect(robustOutliers([1, 1, 1, 1, undefined, 9], 0.001)[5]).toBeDefined();
});

test("moving or stretching a scale moves no stranger", () => {
  const values = fc.array(fc.integer({ min: 0, max: 400 }), { minLength: 5, maxLength: 30 });
  const apart = (list: readonly number[]) => robustOutliers(list, 1e-9).map((one) => one !== undefined);
  fc.assert(
    fc.property(values, fc.integer({ min: -50, max: 50 }), fc.integer({ min: 1, max: 8 }), (list, by, factor) => {
      expect(apart(list.map((value) => value * factor + by))).toEqual(apart(list));
    }),
  );
});
