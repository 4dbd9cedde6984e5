import type { Id } from "./ids.ts";

/** What a column of a parcel's table can hold. */
export const parcelColumns = [
  "mark", "weightCt", "waterCt", "riLow", "riHigh", "riSpot", "sg", "birefringence", "character", "sign", "colour", "transparency", "lustre", "pleochroism",
  "longWave", "shortWave", "absorption", "colourFilter", "phenomena", "magnetic", "thermal", "features", "note",
] as const;
export type ParcelColumn = (typeof parcelColumns)[number];

export const parcelColumnNames: Readonly<Record<ParcelColumn, string>> = {
  mark: "Mark",
  weightCt: "Weight, ct",
  waterCt: "Weight in water, ct",
  riLow: "Index, low edge or only",
  riHigh: "Index, high edge",
  riSpot: "Index, spot",
  sg: "Density",
  birefringence: "Birefringence",
  character: "Optic character",
  sign: "Optic sign",
  colour: "Colour",
  transparency: "Transparency",
  lustre: "Lustre",
  pleochroism: "Pleochroism",
  longWave: "Long-wave fluorescence",
  shortWave: "Short-wave fluorescence",
  absorption: "Absorption, nm",
  colourFilter: "Colour filter",
  phenomena: "Phenomena",
  magnetic: "Magnet",
  thermal: "Thermal probe",
  features: "Seen inside",
  note: "Note",
};

/** More than this is another day's work; a page of so many rows still answers to the hand. */
export const mostParcelRows = 300;
export const mostParcelColumns = 24;
export const mostCellLength = 120;
export const mostParcelText = 200_000;

/** A row as it was typed: one text for each of the parcel's columns. */
export type ParcelCells = readonly string[];

/** How a row ranked when it was saved. Internal: never printed on a report. */
export type ParcelRanking = Readonly<{
  /** Best first, at most three; empty where the row says nothing of identity. */
  top: ReadonlyArray<Readonly<{ speciesId: string; name: string; probability: number }>>;
  /** The probability of the parcel's main species for this row. */
  main: number;
  /** Why the row stands apart, a sentence each; empty where it does not. */
  odd: readonly string[];
}>;

export type ParcelId = Id<"parcel">;
