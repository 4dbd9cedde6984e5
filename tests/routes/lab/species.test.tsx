import type { ComponentType } from "react";
import { createMemoryRouter, RouterProvider } from "react-router";
import { renderToStaticMarkup } from "react-dom/server";
import { expect, test } from "vitest";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { startSecondCheck } from "#app/features/second-checks/start-second-check.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import CompareRoute, { loader as compareLoader } from "#app/routes/lab/species/compare.tsx";
import DetailRoute, { loader as detailLoader } from "#app/routes/lab/species/detail.tsx";
import { loader as speciesCsv } from "#app/routes/lab/species/list-csv.ts";
import ListRoute, { loader as listLoader } from "#app/routes/lab/species/list.tsx";
import MapRoute, { loader as mapLoader } from "#app/routes/lab/species/map.tsx";
import { loader as namesLoader } from "#app/routes/species-names.ts";
import { loadSpeciesNames } from "#app/features/species/load-species-names.server.ts";
import { aBench, aReading, corundum } from "../../setup/bench-factory.ts";
import { aConcludedStone } from "../../setup/conclusion-factory.ts";
import { aLab, aMember } from "../../setup/factories.ts";
import { routeArgs } from "../../setup/route-args.ts";

/** The page as it is without script. */
function pageOf(route: unknown, loaderData: unknown, { path = "/lab/x/species", params = { labSlug: "x" } as Record<string, string> } = {}): string {
  // The framework gives a page more than these two; none of these pages reads it.
  const Page = route as ComponentType<{ loaderData: unknown; params: Record<string, string> }>;
  const element = <Page loaderData={loaderData} params={params} />;
  return renderToStaticMarkup(<RouterProvider router={createMemoryRouter([{ path: "*", element }], { initialEntries: [path] })} />);
}
const wordsOf = (markup: string) => markup.replace(/<[^>]+>/g, " ").replace(/\s+/g, " ");

test("without script the list answers a name, a range with a decimal comma and a colour", async () => {
  const ctx = await aLab();
  const byName = listLoader(routeArgs(ctx, { path: "/species?name=evening+emerald" }));
  expect(byName.species.map(({ id }) => id)).toEqual(["peridot"]);
  const markup = pageOf(ListRoute, byName);
  expect(wordsOf(markup)).toContain("“Evening emerald”, misleading name");
  expect(markup).toContain('value="evening emerald"');
  const byProperty = listLoader(routeArgs(ctx, { path: "/species?indexFrom=1,76&indexTo=1,77&colour=red&character=uniaxial" }));
  expect(byProperty.species.map(({ id }) => id)).toContain("corundum");
  expect(byProperty.species.map(({ id }) => id)).not.toContain("spinel");
});

test("what is typed and is no number is kept and said, and the rest is answered", async () => {
  const ctx = await aLab();
  const data = listLoader(routeArgs(ctx, { path: "/species?indexFrom=abc&densityFrom=4&densityTo=3.5&sort=price&character=odd&after=%00" }));
  expect(data.errors).toMatchObject({ index: "“abc” is not a number.", density: expect.stringContaining("turned round") });
  expect(data.species.length).toBeGreaterThan(0);
  const markup = pageOf(ListRoute, data);
  expect(markup).toContain('value="abc"');
  expect(markup).toMatch(/id="index-error"/);
});

test("nothing found says what to do next", async () => {
  const ctx = await aLab();
  expect(wordsOf(pageOf(ListRoute, listLoader(routeArgs(ctx, { path: "/species?name=zzzzqqqq" }))))).toContain("No species answers");
});

test("the export has a line a form of what is listed, constants with their sources", async () => {
  const ctx = await aLab();
  const answer = speciesCsv(routeArgs(ctx, { path: "/species.csv?name=spinel+ruby" }));
  const lines = (await answer.text()).trim().split("\r\n");
  expect(answer.headers.get("Content-Disposition")).toContain("species.csv");
  expect(lines[0]).toContain("low index from");
  expect(lines.length).toBeGreaterThan(4);
  for (const line of lines.slice(1)) expect(line).toMatch(/^Spinel,/);
  expect(lines[1]).toContain("checked against");
  expect((await speciesCsv(routeArgs(ctx, { path: "/species.csv" })).text()).trim().split("\r\n")).toHaveLength(307);
});

test("the names go out under their version alone, to be kept for good", () => {
  const { version } = loadSpeciesNames();
  const answer = namesLoader({ params: { fileName: `${version}.json` } } as never);
  expect(answer.headers.get("Cache-Control")).toContain("immutable");
  expect(() => namesLoader({ params: { fileName: "000000000000.json" } } as never)).toThrow();
});

test("a species' page has its constants with sources, its light, its cautions and its names", async () => {
  const ctx = await aLab();
  const text = wordsOf(pageOf(DetailRoute, await detailLoader(routeArgs(ctx, { path: "/species/corundum", params: { speciesId: "corundum" } })), { params: { labSlug: "x", speciesId: "corundum" } }));
  for (const words of ["1.766–1.779", "Herbert Smith", "Critical angle", "34.40°", "Balas ruby", "Curved striae", "ultrasonic and steam cleaning", "Constants show neither treatment nor who made it"]) expect(text).toContain(words);
  await expect(detailLoader(routeArgs(ctx, { path: "/species/none", params: { speciesId: "none" } }))).rejects.toMatchObject({ init: { status: 404 } });
});

test("what a source does not name is said to be from memory", async () => {
  const ctx = await aLab();
  const data = await detailLoader(routeArgs(ctx, { path: "/species/peridot", params: { speciesId: "peridot" } }));
  expect(wordsOf(pageOf(DetailRoute, data, { params: { labSlug: "x", speciesId: "peridot" } }))).toMatch(/2V 82–90° from memory/);
});

test("ticked boxes and words lead to one address, and the comparison marks what lies apart", async () => {
  const ctx = await aLab();
  const go = async (path: string) => {
    try {
      return { data: compareLoader(routeArgs(ctx, { path })), to: null };
    } catch (thrown) {
      return { data: null, to: (thrown as Response).headers.get("Location") };
    }
  };
  expect((await go("/species/compare?species=corundum&species=spinel")).to).toMatch(/\/species\/compare\?species=corundum,spinel$/);
  expect((await go("/species/compare?species=corundum&add=evening+emerald")).to).toMatch(/species=corundum,peridot$/);
  const { data } = await go("/species/compare?species=corundum.ruby,peridot");
  const text = wordsOf(pageOf(CompareRoute, data));
  expect(text).toMatch(/Low index 1\.757–1\.770 1\.650–1\.670 apart/);
  expect(text).toMatch(/Birefringence 0\.008–0\.010 0\.035–0\.038 apart/);
  expect(wordsOf(pageOf(CompareRoute, (await go("/species/compare?add=zzzzqqqq")).data))).toContain("No species goes by a name like “zzzzqqqq”");
  expect(wordsOf(pageOf(CompareRoute, (await go("/species/compare?species=a,b,corundum,spinel,quartz,beryl,topaz")).data))).toContain("3 species were left out");
  expect(wordsOf(pageOf(CompareRoute, (await go("/species/compare")).data))).toContain("Nothing to compare yet");
});

test("a stone's readings stand on the map with their ellipse, and in the table next to what they fit", async () => {
  const ctx = await aLab();
  const bench = await aBench(ctx);
  for (const draft of [corundum.refractometer, corundum.density]) await recordReading(ctx, aReading(bench, draft));
  const data = await mapLoader(routeArgs(ctx, { path: `/species/map?stone=${bench.stoneCode}` }));
  expect(data.reading.index?.value).toBeCloseTo(1.766, 6);
  expect(data.reading.sg?.value).toBeCloseTo(4, 1);
  expect(data.stone?.seen?.candidateIds[0]).toBe("corundum");
  const markup = pageOf(MapRoute, data);
  expect(markup).toContain("<ellipse");
  const firstRow = wordsOf(/<tbody>.*?<\/tr>/s.exec(markup)![0]);
  expect(firstRow).toMatch(/Corundum holds the reading; candidate 1\.757–1\.780 3\.95–4\.10/);
});

test("without script the map still zooms, by links, and takes a reading that is typed", async () => {
  const ctx = await aLab();
  const data = await mapLoader(routeArgs(ctx, { path: "/species/map?n=1,718&d=3.60&nU=oops&x=1.6~1.8&y=3~4" }));
  expect(data.reading).toEqual({ index: { value: 1.718, u: 0.0015 }, sg: { value: 3.6, u: 0.03 } });
  expect(data.view).toEqual({ indexMin: 1.6, indexMax: 1.8, sgMin: 3, sgMax: 4 });
  const markup = pageOf(MapRoute, data);
  expect(markup).toMatch(/href="[^"]*x=1\.6375%7E1\.7625[^"]*"[^>]*>Nearer/);
  expect(wordsOf(markup)).toContain("“oops” is not a number");
});

test("who checks a stone, or might, sees nothing of its readings on the map either", async () => {
  const ctx = await aLab({ roles: ["owner", "gemmologist", "desk"] });
  const bench = await aConcludedStone(ctx);
  const checker = await aMember(ctx, ["gemmologist"]);
  const see = (path: string) => mapLoader(routeArgs(checker, { path: `/species/map?stone=${bench.stoneCode}${path}` }));
  const before = await see("");
  expect(before).toMatchObject({ stone: { seen: null }, reading: { index: null, sg: null } });
  expect(wordsOf(pageOf(MapRoute, before))).toContain("stays hidden here");
  expect((await see("&show=examination")).stone?.seen?.index?.value).toBeCloseTo(1.766, 6);
  await startSecondCheck(checker, { ...bench, requestId: newId<"secondCheck">() });
  expect(await see("&show=examination")).toMatchObject({ stone: { seen: null }, reading: { index: null, sg: null } });
});

test("another laboratory's stone is not found on the map, and the desk does not read readings", async () => {
  const ctx = await aLab();
  const { stoneCode } = await aBench(ctx);
  const path = `/species/map?stone=${stoneCode}`;
  await expect(mapLoader(routeArgs(await aLab(), { path }))).rejects.toMatchObject({ init: { status: 404 } });
  await expect(mapLoader(routeArgs(await aMember(ctx, ["desk"]), { path }))).rejects.toMatchObject({ init: { status: 403 } });
  expect((await mapLoader(routeArgs(await aMember(ctx, ["desk"]), { path: "/species/map" }))).boxes.length).toBeGreaterThan(190);
});
