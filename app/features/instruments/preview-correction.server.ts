import type { InstrumentId } from "#app/domain/ids.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { findCalibration, type CalibrationChoice } from "./find-calibration.server.ts";
import { scaleUnitOf } from "./scale-uncertainty.ts";

/** What a correction would be, before it is put in force. */
export async function previewCorrection(ctx: LabContext, instrumentId: InstrumentId, choice: CalibrationChoice) {
  requireRole(ctx, "instruments.manage");
  const { instrument, fitted, points } = await findCalibration(ctx, instrumentId, choice);
  return { unit: scaleUnitOf(instrument), ...fitted, points };
}
