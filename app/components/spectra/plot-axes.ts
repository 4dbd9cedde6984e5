import { scaleLinear } from "@visx/scale";
import type { XUnit, YUnit } from "#app/gemmology/spectrum/measured-spectrum.ts";

type Points = ReadonlyArray<readonly [x: number, y: number]>;

/** Shares of the plot's width and height (from the top) for a curve's values, with the ticks beside. */
export function plotAxes(points: Points, { xUnit, yUnit }: { xUnit: XUnit; yUnit: YUnit }) {
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  const [xLow, xHigh] = [Math.min(...xs), Math.max(...xs)];
  const [yLow, yHigh] = [Math.min(...ys), Math.max(...ys)];
  const spread = yHigh - yLow || Math.abs(yHigh) || 1;
  // From nothing where the values begin near it.
  const floor = yLow >= 0 && yLow < spread ? 0 : yLow - 0.05 * spread;
  // Wavenumbers fall to the right, as spectroscopists draw them: short waves lie left in every unit.
  const x = scaleLinear<number>({ domain: xUnit === "1/cm" ? [xHigh, xLow] : [xLow, xHigh], range: [0, 1] });
  const y = scaleLinear<number>({ domain: [floor, yHigh + 0.12 * spread], range: [1, 0] });
  const isPercent = yUnit === "transmittance" || yUnit === "reflectance";
  return {
    x,
    y,
    xTicks: x.ticks(7).map((value) => ({ share: x(value), text: String(value) })),
    yTicks: y.ticks(5).map((value) => ({ share: y(value), text: String(Number((isPercent ? value * 100 : value).toPrecision(4))) })),
    isPercent,
  };
}
