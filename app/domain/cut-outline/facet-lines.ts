import type { PlotSide } from "../inclusion.ts";
import { edgeAt, scaled, type Point } from "./polygon.ts";

export type FacetStyle = "brilliant" | "step" | "dome" | "none";
type Polyline = readonly Point[];

const turn = 2 * Math.PI;
const tableShare = 0.55;

/** The edges between facets, as a plot shows them: a pattern to find places by, not the stone's own facets. */
export function facetLines(outline: readonly Point[], style: FacetStyle, side: PlotSide, corners: readonly Point[]): Polyline[] {
  if (style === "none") return [];
  if (style === "dome") return side === "crown" ? [closed(scaled(outline, 0.62))] : [closed(scaled(outline, 0.9))];
  if (style === "step") return stepLines(outline, side, corners);
  return side === "crown" ? crownOfBrilliant(outline) : pavilionOfBrilliant(outline);
}

const closed = (points: readonly Point[]): Polyline => [...points, points[0]!];
const between = ([ax, ay]: Point, factor: number): Point => [ax * factor, ay * factor];
const eighth = (index: number) => (turn * index) / 8;

function crownOfBrilliant(outline: readonly Point[]): Polyline[] {
  const girdle = (index: number) => edgeAt(outline, eighth(index));
  const table = Array.from({ length: 8 }, (_, index) => between(girdle(index), tableShare));
  const star = (index: number) => between(girdle(index + 0.5), 0.76);
  return [
    closed(table),
    ...Array.from({ length: 8 }, (_, index) => [table[index]!, star(index), table[(index + 1) % 8]!]),
    ...Array.from({ length: 8 }, (_, index) => [girdle(index), star(index), girdle(index + 1)]),
    ...Array.from({ length: 8 }, (_, index) => [star(index), girdle(index + 0.5)]),
  ];
}

function pavilionOfBrilliant(outline: readonly Point[]): Polyline[] {
  const girdle = (index: number) => edgeAt(outline, eighth(index));
  const inner = (index: number) => between(girdle(index + 0.5), 0.3);
  return [
    ...Array.from({ length: 8 }, (_, index) => [[0, 0] as const, inner(index), girdle(index + 0.5)]),
    ...Array.from({ length: 8 }, (_, index) => [girdle(index), inner(index), girdle(index + 1)]),
  ];
}

function stepLines(outline: readonly Point[], side: PlotSide, corners: readonly Point[]): Polyline[] {
  const steps = side === "crown" ? [0.86, 0.71, tableShare] : [0.78, 0.5, 0.22];
  const last = steps.at(-1)!;
  return [...steps.map((factor) => closed(scaled(outline, factor))), ...corners.map((corner) => [corner, between(corner, side === "crown" ? last : 0)])];
}
