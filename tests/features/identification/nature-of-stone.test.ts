import { expect, test } from "vitest";
import { natureOfStone } from "#app/features/identification/nature-of-stone.ts";
import { rankReadings } from "#app/features/identification/rank-readings.ts";
import { composeReading } from "#app/features/readings/compose-reading.ts";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { corundum } from "../../setup/bench-factory.ts";

const instrument: ReadingInstrument = { resolution: 0.001, standardUncertainty: null, upperLimit: 1.81, prismIndex: 1.88 };

test("a stone that reads as corundum is referred as ruby or sapphire, whichever it may be", () => {
  const readings = [corundum.refractometer, corundum.polariscope, corundum.density].map((draft, at) => ({ ...composeReading(draft, instrument).reading!, sequence: at + 1, note: "", strike: null }));
  const nature = natureOfStone(readings, rankReadings(readings, loadSpeciesTable().table));
  expect(nature.speciesName).toBe("Corundum");
  expect(nature.referral).toEqual([expect.stringContaining("ruby or sapphire")]);
});
