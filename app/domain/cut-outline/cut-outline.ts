import type { PlotSide } from "../inclusion.ts";
import { facetLines, type FacetStyle } from "./facet-lines.ts";
import { around, filling, type Point } from "./polygon.ts";

export const cutOutlines = ["round", "oval", "cushion", "square", "octagon", "rectangle", "pear", "marquise", "heart", "triangle", "hexagon", "cabochonOval", "cabochonRound", "bead", "freeform"] as const;
export type CutOutlineCode = (typeof cutOutlines)[number];
export const cutOutlineNames: Readonly<Record<CutOutlineCode, string>> = {
  round: "Round brilliant",
  oval: "Oval",
  cushion: "Cushion",
  square: "Square step cut",
  octagon: "Octagon step cut",
  rectangle: "Rectangle",
  pear: "Pear",
  marquise: "Marquise",
  heart: "Heart",
  triangle: "Triangle",
  hexagon: "Hexagon",
  cabochonOval: "Oval cabochon",
  cabochonRound: "Round cabochon",
  bead: "Bead",
  freeform: "Freeform",
};

/** A drawing of a cut: its girdle and the edges between facets, in units of half its width and half its height. */
export type CutOutline = Readonly<{ /** Width to height of the drawing. */ aspect: number; outline: readonly Point[]; lines: readonly (readonly Point[])[] }>;

type Shape = { aspect: number; style: FacetStyle; outline: Point[]; corners?: Point[] };
const circle = around(72, (angle) => [Math.sin(angle), -Math.cos(angle)]);
const superellipse = (power: number) => around(96, (angle) => [bent(Math.sin(angle), power), bent(-Math.cos(angle), power)]);
const bent = (value: number, power: number) => Math.sign(value) * Math.abs(value) ** (2 / power);
const cutCorners = (right: number, down: number): Point[] => [[-1 + right, -1], [1 - right, -1], [1, -1 + down], [1, 1 - down], [1 - right, 1], [-1 + right, 1], [-1, 1 - down], [-1, -1 + down]];
const box: Point[] = [[-1, -1], [1, -1], [1, 1], [-1, 1]];
const hexagon = filling(around(6, (angle) => [Math.sin(angle), -Math.cos(angle)]));
const octagon = cutCorners(0.36, 0.26);

/** Drawn by this program from simple curves; proportions are usual ones (common practice). The long way is upright. */
const shapes: Readonly<Record<CutOutlineCode, Shape>> = {
  round: { aspect: 1, style: "brilliant", outline: circle },
  oval: { aspect: 0.78, style: "brilliant", outline: circle },
  cushion: { aspect: 0.92, style: "brilliant", outline: superellipse(3.4) },
  square: { aspect: 1, style: "step", outline: box, corners: box },
  octagon: { aspect: 0.74, style: "step", outline: octagon, corners: octagon },
  rectangle: { aspect: 0.6, style: "step", outline: box, corners: box },
  pear: { aspect: 0.68, style: "brilliant", outline: filling(around(96, (angle) => [Math.sin(angle) * Math.sin(angle / 2) ** 1.3, -Math.cos(angle)])) },
  marquise: { aspect: 0.5, style: "brilliant", outline: around(96, (angle) => [Math.sign(Math.sin(angle)) * (1 - Math.cos(angle) ** 2), -Math.cos(angle)]) },
  heart: { aspect: 1.05, style: "brilliant", outline: filling(around(120, (angle) => [Math.sin(angle) ** 3 * 16, -(13 * Math.cos(angle) - 5 * Math.cos(2 * angle) - 2 * Math.cos(3 * angle) - Math.cos(4 * angle))])) },
  triangle: { aspect: 1.08, style: "brilliant", outline: filling(around(96, (angle) => [Math.sin(angle) * (1 + 0.22 * Math.cos(3 * angle)), -Math.cos(angle) * (1 + 0.22 * Math.cos(3 * angle))])) },
  hexagon: { aspect: 0.87, style: "step", outline: hexagon, corners: hexagon },
  cabochonOval: { aspect: 0.78, style: "dome", outline: circle },
  cabochonRound: { aspect: 1, style: "dome", outline: circle },
  bead: { aspect: 1, style: "none", outline: circle },
  freeform: { aspect: 1, style: "none", outline: superellipse(2.6) },
};

export function cutOutline(code: CutOutlineCode, side: PlotSide): CutOutline {
  const { aspect, style, outline, corners = [] } = shapes[code];
  return { aspect, outline, lines: facetLines(outline, style, side, corners) };
}

/** The drawing that a described outline calls for: "oval", "Green octagon" …; undefined where none is named. */
export function outlineNamed(words: string): CutOutlineCode | undefined {
  const text = words.toLowerCase();
  if (/cabochon/.test(text)) return /round/.test(text) ? "cabochonRound" : "cabochonOval";
  return cutOutlines.find((code) => new RegExp(`\\b${code}\\b`).test(text)) ?? (/\bbaguette\b/.test(text) ? "rectangle" : /\btrillion\b/.test(text) ? "triangle" : undefined);
}
