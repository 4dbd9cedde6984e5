import type { Light, SpotMethod } from "#app/domain/reading.ts";
import { parcelColumnNames, type ParcelCells, type ParcelColumn } from "#app/domain/parcel.ts";
import type { ReadingDraft } from "#app/features/readings/reading-draft.ts";
import type { OpticCharacter } from "#app/gemmology/ranking/evidence.ts";
import { rowEvidence, type ParcelSetting } from "./row-evidence.ts";

/** What a table does not say of how its figures were read, and a reading needs. */
export type HowRead = Readonly<{ light: Light; spotMethod: SpotMethod; /** In how many directions between the polars; null: not said, and the character is kept in words. */ directionsTried: number | null }>;

const toldInWords: readonly ParcelColumn[] = ["sg", "birefringence", "colour", "transparency", "lustre", "pleochroism", "longWave", "shortWave", "absorption", "colourFilter", "phenomena", "magnetic", "thermal", "features", "note"];

type Polariscope = Extract<ReadingDraft, { kind: "polariscope" }>;
const shown: Readonly<Record<OpticCharacter, Pick<Polariscope, "behaviour" | "figure">>> = {
  isotropic: { behaviour: "dark", figure: "notSought" },
  anomalous: { behaviour: "anomalous", figure: "notSought" },
  anisotropic: { behaviour: "blinks", figure: "notSought" },
  aggregate: { behaviour: "staysLight", figure: "notSought" },
  uniaxial: { behaviour: "blinks", figure: "uniaxial" },
  biaxial: { behaviour: "blinks", figure: "biaxial" },
};

/**
 * A row as the readings that it stands for: weighings and indices each as their own, in the digits that were typed. What
 * a figure was worked out from is not known for a density that was typed as such, so that stays words, as what was seen does.
 */
export function rowReadings(cells: ParcelCells, setting: ParcelSetting & { waterTempText: string }, { light, spotMethod, directionsTried }: HowRead): ReadingDraft[] {
  const text = (column: ParcelColumn) => cells[setting.columns.indexOf(column)]?.trim() ?? "";
  const { evidence } = rowEvidence(cells, setting);
  const quality = "good" as const;
  const seen = { facet: "other" as const, light };
  const drafts: ReadingDraft[] = [];
  if (text("weightCt")) drafts.push({ kind: "weight", quality, weightCt: text("weightCt") });
  const areEdges = evidence.ri?.some(({ kind }) => kind === "edges") ?? false;
  if (text("riLow")) drafts.push({ kind: "refractometer", quality, edges: areEdges ? "two" : "one", low: text("riLow"), high: areEdges ? text("riHigh") : "", isRotated: false, ...seen });
  if (text("riSpot")) drafts.push({ kind: "spot", quality, method: spotMethod, n: text("riSpot"), ...seen });
  if (text("waterCt")) drafts.push({ kind: "density", quality, method: "suspended", massAirCt: text("weightCt"), massLiquidCt: text("waterCt"), tempC: setting.waterTempText });
  const character = evidence.opticCharacter;
  if (character && directionsTried !== null) {
    const hasFigure = character === "uniaxial" || character === "biaxial";
    drafts.push({ kind: "polariscope", quality, ...shown[character], directionsTried: String(directionsTried), sign: hasFigure ? (evidence.opticSign ?? null) : null });
  }
  const words = [...(character && directionsTried === null ? (["character", "sign"] as const) : []), ...toldInWords].flatMap((column) => (text(column) ? [`${parcelColumnNames[column]}: ${text(column)}`] : []));
  if (words.length > 0) drafts.push({ kind: "free", quality, text: words.join("\n") });
  return drafts;
}
