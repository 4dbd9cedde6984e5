import { expect, test } from "vitest";
import { immersionLiquids } from "#app/gemmology/optics/immersion-liquids.ts";
import { workedOn } from "../worked-on.ts";

const offered = new Map<string, (typeof immersionLiquids)[number]>(immersionLiquids.map((liquid) => [liquid.name, liquid]));
const ours: Record<string, string> = { "water 20 C": "water", glycerine: "glycerol" };
const liquidOf = (name: string) => offered.get(ours[name] ?? name);
/** Carcinogenic, poisonous or without use beside the others: known, and left out on purpose. */
const notOffered = ["toluene", "benzene", "carbon disulphide", "carbon tetrachloride"];

test.each(workedOn("immersion liquid RI (589.3 nm)"))("$id: $inputs.liquid ($source)", ({ inputs, expected }) => {
  const name = inputs.liquid as unknown as string;
  const liquid = liquidOf(name);
  expect(liquid === undefined).toBe(notOffered.includes(name));
  if (liquid) expect(Math.abs(liquid.n - expected.ri!)).toBeLessThan(0.002);
});

test.each(workedOn("immersion liquid RI (589 nm), textbook table"))("$id: liquids of a textbook's table ($source)", ({ inputs, expected }) => {
  const names = (inputs.liquid as unknown as string).split(" / ");
  const indices = expected.ri as unknown as number[];
  expect(names).toHaveLength(indices.length);
  names.forEach((name, at) => {
    const liquid = liquidOf(name);
    expect(liquid === undefined).toBe(notOffered.includes(name));
    if (liquid) expect(Math.abs(liquid.n - indices[at]!)).toBeLessThan(0.002);
  });
});

test("liquids rise in index, and what is harmful says so", () => {
  expect(immersionLiquids.map(({ n }) => n)).toEqual([...immersionLiquids.map(({ n }) => n)].sort((a, b) => a - b));
  for (const name of ["benzyl benzoate", "1-bromonaphthalene", "diiodomethane"]) expect(offered.get(name)!.caution).toMatch(/gloves/);
});
