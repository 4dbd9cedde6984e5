import { appendBezierCurve, lineTo, moveTo, popGraphicsState, pushGraphicsState, setDashPattern, setLineWidth, setStrokingColor, stroke } from "pdf-lib";
import type { RotationPlot } from "./report-view.ts";
import { inks, round, type Ink, type Sheet } from "./sheet.ts";

const axisLeft = 28;
const curveInks: readonly Ink[] = ["blue", "tint"];

/** Index against rotation: the readings as rings, the fitted edges as a full and a broken line. */
export function drawRotationPlot(sheet: Sheet, plot: RotationPlot, { x, top, width, height }: { x: number; top: number; width: number; height: number }): void {
  const all = [...plot.points, ...plot.curves.flatMap(({ points }) => points)];
  if (all.length === 0) return;
  const angles = all.map(({ angleDeg }) => angleDeg);
  const indices = all.map(({ index }) => index);
  const [fromDeg, toDeg] = [Math.min(0, ...angles), Math.max(180, ...angles)];
  const [least, most] = [Math.min(...indices), Math.max(...indices)];
  // Flat edges of a singly refractive stone still need a scale.
  const pad = Math.max((most - least) * 0.15, 0.0005);
  const area = { left: x + axisLeft, bottom: top - height + 14, right: x + width - 4, top: top - 4 };
  const across = (angleDeg: number) => round(area.left + ((angleDeg - fromDeg) / (toDeg - fromDeg)) * (area.right - area.left));
  const up = (index: number) => round(area.bottom + ((index - least + pad) / (most - least + 2 * pad)) * (area.top - area.bottom));

  const strokeOf = (ink: Ink, thickness: number, dash: number[] = []) => [setStrokingColor(inks[ink]), setLineWidth(thickness), setDashPattern(dash, 0)];
  sheet.page.pushOperators(
    pushGraphicsState(),
    ...strokeOf("rule", 0.6),
    moveTo(area.left, area.top),
    lineTo(area.left, area.bottom),
    lineTo(area.right, area.bottom),
    stroke(),
    ...plot.curves.flatMap(({ points }, curve) => [
      ...strokeOf(curveInks[curve % curveInks.length]!, 1, curve % 2 === 1 ? [3, 2] : []),
      ...points.map(({ angleDeg, index }, at) => (at === 0 ? moveTo : lineTo)(across(angleDeg), up(index))),
      stroke(),
    ]),
    ...strokeOf("ink", 0.6),
    ...plot.points.flatMap(({ angleDeg, index }) => [...ring(across(angleDeg), up(index), 1.5), stroke()]),
    popGraphicsState(),
  );

  const label = { font: "mono", size: 6.2, ink: "soft" } as const;
  for (const index of most - least < 0.0005 ? [most] : [least, most]) sheet.line(index.toFixed(3), { x: area.left - 5, y: up(index) - 2, align: "right", ...label });
  for (const angleDeg of [fromDeg, (fromDeg + toDeg) / 2, toDeg]) {
    sheet.line(`${Math.round(angleDeg)}°`, { x: angleDeg === toDeg ? area.right : across(angleDeg), y: area.bottom - 9, align: angleDeg === toDeg ? "right" : angleDeg === fromDeg ? "left" : "centre", ...label });
  }
}

function ring(x: number, y: number, radius: number) {
  const handle = radius * 0.5523;
  return [
    moveTo(x + radius, y),
    appendBezierCurve(x + radius, y + handle, x + handle, y + radius, x, y + radius),
    appendBezierCurve(x - handle, y + radius, x - radius, y + handle, x - radius, y),
    appendBezierCurve(x - radius, y - handle, x - handle, y - radius, x, y - radius),
    appendBezierCurve(x + handle, y - radius, x + radius, y - handle, x + radius, y),
  ];
}
