/** The part of the plane of index and density that is drawn. */
export type MapView = Readonly<{ indexMin: number; indexMax: number; sgMin: number; sgMax: number }>;

/** All that gem materials span. */
export const wholeView: MapView = { indexMin: 1.32, indexMax: 3.36, sgMin: 0.8, sgMax: 7.8 };
/** What most contact refractometers read, and the densities of what is met there. */
export const refractometerView: MapView = { indexMin: 1.42, indexMax: 1.82, sgMin: 1.8, sgMax: 4.6 };
const leastSpan = { index: 0.01, sg: 0.05 } as const;

/** Nearer (factor < 1) or farther, about a point that stays where it is. */
export function zoomView(view: MapView, factor: number, about = centreOf(view)): MapView {
  const from = (min: number, max: number, at: number) => [at - (at - min) * factor, at + (max - at) * factor] as const;
  const [indexMin, indexMax] = from(view.indexMin, view.indexMax, about.index);
  const [sgMin, sgMax] = from(view.sgMin, view.sgMax, about.sg);
  return withinWhole({ indexMin, indexMax, sgMin, sgMax });
}

/** Moved by shares of what is drawn. */
export function panView(view: MapView, { right, up }: { right: number; up: number }): MapView {
  const [byIndex, bySg] = [(view.indexMax - view.indexMin) * right, (view.sgMax - view.sgMin) * up];
  return withinWhole({ indexMin: view.indexMin + byIndex, indexMax: view.indexMax + byIndex, sgMin: view.sgMin + bySg, sgMax: view.sgMax + bySg });
}

/** Moved, as little as needed, so that a point is drawn and not at the very edge. */
export function viewShowing(view: MapView, point: { index: number; sg: number }): MapView {
  const shift = (min: number, max: number, at: number) => {
    const margin = (max - min) * 0.06;
    return at < min + margin ? at - min - margin : at > max - margin ? at - max + margin : 0;
  };
  const [byIndex, bySg] = [shift(view.indexMin, view.indexMax, point.index), shift(view.sgMin, view.sgMax, point.sg)];
  return byIndex === 0 && bySg === 0 ? view : withinWhole({ indexMin: view.indexMin + byIndex, indexMax: view.indexMax + byIndex, sgMin: view.sgMin + bySg, sgMax: view.sgMax + bySg });
}

/** A neighbourhood of a reading, wide enough for its look-alikes. */
export function viewAround({ index, sg }: { index: number | null; sg: number | null }): MapView {
  return withinWhole({
    indexMin: index === null ? wholeView.indexMin : index - 0.12,
    indexMax: index === null ? wholeView.indexMax : index + 0.12,
    sgMin: sg === null ? wholeView.sgMin : sg - 0.8,
    sgMax: sg === null ? wholeView.sgMax : sg + 0.8,
  });
}

/** Never outside the whole and never too near; the size is kept before the place. */
function withinWhole({ indexMin, indexMax, sgMin, sgMax }: MapView): MapView {
  const [lowIndex, highIndex] = fit([indexMin, indexMax], [wholeView.indexMin, wholeView.indexMax], leastSpan.index);
  const [lowSg, highSg] = fit([sgMin, sgMax], [wholeView.sgMin, wholeView.sgMax], leastSpan.sg);
  return { indexMin: lowIndex, indexMax: highIndex, sgMin: lowSg, sgMax: highSg };
}

function fit([min, max]: readonly [number, number], [least, most]: readonly [number, number], leastWidth: number): [number, number] {
  const width = Math.min(most - least, Math.max(leastWidth, max - min));
  const middle = (min + max) / 2;
  const start = Math.min(most - width, Math.max(least, middle - width / 2));
  // The last bits of a double are no view of anybody's: the same place gives the same numbers.
  return [Number(start.toFixed(9)), Number((start + width).toFixed(9))];
}

export const centreOf = ({ indexMin, indexMax, sgMin, sgMax }: MapView) => ({ index: (indexMin + indexMax) / 2, sg: (sgMin + sgMax) / 2 });

/** As an address keeps it: `x=1.7000~1.8000`, `y=3.500~4.500`. */
export function writeMapView({ indexMin, indexMax, sgMin, sgMax }: MapView): { x: string; y: string } {
  return { x: `${indexMin.toFixed(4)}~${indexMax.toFixed(4)}`, y: `${sgMin.toFixed(3)}~${sgMax.toFixed(3)}` };
}

/** @returns null where the address has no such part, or one that makes no sense */
export function readMapView({ x, y }: { x: string | null; y: string | null }): MapView | null {
  const ends = (text: string | null) => {
    const [, from, to] = /^(\d(?:\.\d{1,6})?)~(\d(?:\.\d{1,6})?)$/.exec(text ?? "") ?? [];
    return from !== undefined && to !== undefined && Number(from) < Number(to) ? ([Number(from), Number(to)] as const) : null;
  };
  const [index, sg] = [ends(x), ends(y)];
  return index && sg ? withinWhole({ indexMin: index[0], indexMax: index[1], sgMin: sg[0], sgMax: sg[1] }) : null;
}
