import { and, desc, eq, inArray } from "drizzle-orm";
import { instrumentChecks, instruments } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { InstrumentCheckId, InstrumentId } from "#app/domain/ids.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { fitCorrection, type FittedCorrection } from "#app/gemmology/calibration/fit-correction.ts";
import type { Correction } from "#app/gemmology/calibration/correction.ts";
import { scaleUncertainty } from "./scale-uncertainty.ts";

export type CalibrationChoice = Readonly<{ checkIds: readonly InstrumentCheckId[]; model: Correction["model"] }>;
export const mostCalibrationChecks = 40;

/**
 * The correction that some checks of an instrument give, from what it showed: nothing is saved. Scatter of the checks
 * beyond their uncertainties widens its uncertainty.
 */
export async function findCalibration({ db, laboratoryId }: LabContext, instrumentId: InstrumentId, { checkIds, model }: CalibrationChoice): Promise<{ instrument: typeof instruments.$inferSelect; fitted: FittedCorrection; points: Array<{ id: InstrumentCheckId; reading: number; nominal: number }> }> {
  const [instrument] = await db.select().from(instruments).where(and(eq(instruments.laboratoryId, laboratoryId), eq(instruments.id, instrumentId)));
  if (!instrument) throw new AppError("not_found", "There is no such instrument.");
  if (checkIds.length === 0) throw wrong("Choose the checks that the correction is worked out from.");
  if (checkIds.length > mostCalibrationChecks) throw wrong(`At most ${mostCalibrationChecks} checks.`);
  const uReading = scaleUncertainty(instrument);
  if (uReading === null) throw wrong("How well this instrument is read is not known: write the standard uncertainty of a reading on its card first.");
  const checks = await db
    .select({ id: instrumentChecks.id, nominal: instrumentChecks.nominalValue, uNominal: instrumentChecks.nominalUncertainty, reading: instrumentChecks.readingValue })
    .from(instrumentChecks)
    .where(and(eq(instrumentChecks.laboratoryId, laboratoryId), eq(instrumentChecks.instrumentId, instrumentId), inArray(instrumentChecks.id, [...checkIds])))
    .orderBy(desc(instrumentChecks.checkedAt));
  const points = checks.flatMap(({ id, nominal, uNominal, reading }) => (nominal === null || reading === null ? [] : [{ id, nominal, uNominal: uNominal ?? 0, reading, uReading }]));
  if (points.length !== checkIds.length) throw wrong("One of these is no check of this instrument with a figure. Choose again.");
  if (model === "line" && new Set(points.map(({ nominal }) => nominal)).size < 2) throw wrong("A line needs checks with two references at least, low and high. Choose more, or an offset.");
  if (model === "line" && new Set(points.map(({ reading }) => reading)).size < 2) throw wrong("The checks chosen all show the same figure: no line goes through them.");
  const fitted = fitCorrection(points, model);
  if (model === "line" && Math.abs(fitted.correction.slope) > mostSlope) throw wrong("These checks would stretch the scale by more than a fifth. Is one of them wrong?");
  return { instrument, fitted, points };
}

const mostSlope = 0.2;

function wrong(message: string): AppError {
  return new AppError("invalid_input", message, { fieldErrors: { checks: [message] } });
}
