import { newId } from "#app/db/new-id.server.ts";
import { readPasted } from "#app/features/parcels/parcel-draft.ts";
import { saveParcel } from "#app/features/parcels/save-parcel.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";

/** Two dozen small ovals as a gemmologist would type them, by corundum's constants, with a spinel and a glass among them. */
export async function saveDemoParcel(gemmologist: LabContext): Promise<void> {
  const colours = ["purplish red", "purplish red", "red", "pink"];
  const rows = Array.from({ length: 24 }, (_, at) => {
    const low = 1.761 + (at % 3) * 0.001;
    return [String(at + 1), (0.118 + ((at * 7) % 13) * 0.004).toFixed(3), low.toFixed(3), (low + 0.008).toFixed(3), (3.97 + ((at * 5) % 7) * 0.01).toFixed(2), colours[at % colours.length]!];
  });
  rows[8] = ["9", "0.121", "1.718", "", "3.60", "pink"];
  rows[17] = ["18", "0.134", "1.661", "", "3.92", "red"];
  const { columns, rows: read } = readPasted(["Mark\tWeight\tRI low\tRI high\tSG\tColour", ...rows.map((row) => row.join("\t"))].join("\n"));
  const { parcelId } = await saveParcel(gemmologist, { requestId: newId<"parcel">(), name: "Paper 4, small red ovals", itemNumber: "", waterTempC: "", columns, rows: read });
  if (!parcelId) throw new Error("the demonstration's parcel is not sound");
}
