import { renderToStaticMarkup } from "react-dom/server";
import { expect, test } from "vitest";
import { panView, readMapView, refractometerView, viewAround, viewShowing, wholeView, writeMapView, zoomView } from "#app/components/charts/species-map/map-view.ts";
import { nextBox } from "#app/components/charts/species-map/next-box.ts";
import { placeNames } from "#app/components/charts/species-map/place-names.ts";
import { SpeciesMap } from "#app/components/charts/species-map/species-map.tsx";
import { offsetWords } from "#app/components/species/offset-words.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { speciesBoxes } from "#app/features/species/species-boxes.ts";

const { boxes, unplaced } = speciesBoxes(loadSpeciesTable().table);
const nothing = () => undefined;
const markupOf = (props: Partial<Parameters<typeof SpeciesMap>[0]>) =>
  renderToStaticMarkup(
    <SpeciesMap boxes={boxes} standingOf={() => "open"} reading={{ index: null, sg: null }} view={wholeView} onView={nothing} activeId={null} onActive={nothing} onOpen={nothing} isLive={false} describedBy="keys" {...props} />,
  );

test("the whole map holds every species that has an index and a density; the others are named", () => {
  for (const { id, index, sg } of boxes) expect(index[0] >= wholeView.indexMin && index[1] <= wholeView.indexMax && sg[0] >= wholeView.sgMin && sg[1] <= wholeView.sgMax, id).toBe(true);
  expect(boxes.length + unplaced.length).toBe(loadSpeciesTable().table.nodes.length);
  expect(markupOf({}).match(/data-species=/g)).toHaveLength(boxes.length);
});

test("the server draws a picture with words; script makes it something to move in by keyboard", () => {
  const drawn = markupOf({ reading: { index: { value: 1.766, u: 0.0015 }, sg: { value: 3.99, u: 0.03 } } });
  expect(drawn).toContain('role="img"');
  expect(drawn).not.toContain("tabindex");
  expect(drawn).toContain("The reading stands at index 1.766 and density 3.99.");
  expect(markupOf({ isLive: true })).toMatch(/role="application"[^>]*tabindex="0"|tabindex="0"[^>]*role="application"/);
});

test("the ellipse reaches two standard uncertainties each way", () => {
  const view = { indexMin: 1.7, indexMax: 1.8, sgMin: 3.5, sgMax: 4.5 };
  const ellipse = /<ellipse[^>]*>/.exec(markupOf({ view, reading: { index: { value: 1.75, u: 0.005 }, sg: { value: 4, u: 0.05 } } }))![0];
  const number = (name: string) => Number(new RegExp(` ${name}="([^"]+)"`).exec(ellipse)![1]);
  // The plot is 904 wide and 502 high: ±2u is a tenth of it each way.
  expect([number("cx"), number("cy"), number("rx"), number("ry")].map((value) => Math.round(value * 10) / 10)).toEqual([498, 265, 90.4, 50.2]);
});

test("a reading of one kind is a band and no ellipse", () => {
  const markup = markupOf({ reading: { index: { value: 1.75, u: 0.005 }, sg: null } });
  expect(markup).not.toContain("<ellipse");
  expect(markup).toContain("The reading stands at index 1.750.");
});

test("zooming keeps the point it is about, and goes neither beyond the whole nor nearer than makes sense", () => {
  const about = { index: 1.76, sg: 4 };
  const near = zoomView(refractometerView, 0.5, about);
  const shareOf = ({ indexMin, indexMax }: typeof near) => (about.index - indexMin) / (indexMax - indexMin);
  expect(shareOf(near)).toBeCloseTo(shareOf(refractometerView), 9);
  expect(zoomView(wholeView, 3)).toEqual(wholeView);
  let view = wholeView;
  for (let at = 0; at < 60; at += 1) view = zoomView(view, 0.5, about);
  expect(view.indexMax - view.indexMin).toBeCloseTo(0.01, 9);
  expect(panView(wholeView, { right: 1, up: -1 })).toEqual(wholeView);
});

test("a view is kept in an address and read back; one that makes no sense is no view", () => {
  expect(readMapView(writeMapView(refractometerView))).toEqual(refractometerView);
  for (const x of [null, "", "1.8~1.7", "a~b", "1.7", "1e9~2", "-1~2"]) expect(readMapView({ x, y: "2~3" })).toBeNull();
  expect(readMapView({ x: "0~9", y: "0~9" })).toEqual(wholeView);
});

test("a neighbourhood lies about the reading, and moving shows a point that was outside", () => {
  const view = viewAround({ index: 1.766, sg: 3.99 });
  expect((view.indexMin + view.indexMax) / 2).toBeCloseTo(1.766, 9);
  const moved = viewShowing(view, { index: 1.55, sg: 2.65 });
  expect(moved.indexMin < 1.55 && moved.indexMax > 1.55 && moved.sgMin < 2.65 && moved.sgMax > 2.65).toBe(true);
  expect(viewShowing(view, { index: 1.766, sg: 3.99 })).toBe(view);
});

test("an arrow goes to what lies ahead, not to what is nearer and aside", () => {
  const points = [{ id: "here", x: 0, y: 0 }, { id: "ahead", x: 10, y: 1 }, { id: "aside", x: 3, y: 5 }, { id: "above", x: 0, y: -4 }];
  expect(nextBox(points, points[0]!, "right")?.id).toBe("ahead");
  expect(nextBox(points, points[0]!, "up")?.id).toBe("above");
  expect(nextBox(points, points[0]!, "left")).toBeUndefined();
});

test("by arrows alone every species can be reached from any", () => {
  const middles = boxes.map(({ id, index, sg }) => ({ id, x: (index[0] + index[1]) * 250, y: -(sg[0] + sg[1]) * 40 }));
  const met = new Set([middles[0]!.id]);
  const queue = [middles[0]!];
  for (let from = queue.shift(); from; from = queue.shift()) {
    for (const direction of ["left", "right", "up", "down"] as const) {
      const next = nextBox(middles, from, direction);
      if (next && !met.has(next.id)) {
        met.add(next.id);
        queue.push(middles.find(({ id }) => id === next.id)!);
      }
    }
  }
  expect(middles.filter(({ id }) => !met.has(id)).map(({ id }) => id)).toEqual([]);
});

test("names lie neither on one another nor outside the frame, and the first ones are served first", () => {
  const frame = { left: 0, right: 300, top: 0, bottom: 200 };
  const placed = placeNames(Array.from({ length: 40 }, (_, at) => ({ id: `s${at}`, name: `Species ${at}`, left: 100 + at, right: 104 + at, top: 90, bottom: 95 })), frame, { most: 26, kept: [{ left: 150, right: 180, top: 60, bottom: 80 }] });
  expect(placed[0]!.id).toBe("s0");
  expect(placed.length).toBeLessThan(26);
  const areas = placed.map(({ name, x, y, anchor }) => ({ left: anchor === "start" ? x : x - name.length * 6.4, right: anchor === "start" ? x + name.length * 6.4 : x, y }));
  expect(areas.filter(({ left, right, y }) => left < 180 && right > 150 && y - 11 < 80 && y + 3 > 60)).toEqual([]);
  for (const [at, one] of areas.entries()) {
    expect(one.left >= 0 && one.right <= 300).toBe(true);
    for (const other of areas.slice(at + 1)) expect(Math.abs(one.y - other.y) >= 14 || one.right <= other.left || other.right <= one.left).toBe(true);
  }
});

test("how a species lies to a reading is said in words", () => {
  const reading = { index: { value: 1.766, u: 0.0015 }, sg: { value: 3.99, u: 0.03 } };
  expect(offsetWords({ index: [1.757, 1.78], sg: [3.95, 4.1] }, reading)).toMatchObject({ sentence: "holds the reading", isNear: true, distanceU: 0 });
  expect(offsetWords({ index: [1.712, 1.8], sg: [3.57, 3.95] }, reading)).toMatchObject({ sentence: "density 0.04 lower: within 2u", isNear: true });
  expect(offsetWords({ index: [1.65, 1.69], sg: [3.27, 3.48] }, reading)).toMatchObject({ sentence: "index 0.076 lower, density 0.51 lower", isNear: false });
});
