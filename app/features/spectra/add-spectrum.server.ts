import { createHash } from "node:crypto";
import { and, eq, sql } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { spectra, stones } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { SpectrumId, StoneId } from "#app/domain/ids.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { stoneUnderExamination } from "#app/features/stones/stone-under-examination.server.ts";
import type { AssumedUnits, MeasuredSpectrum } from "#app/gemmology/spectrum/measured-spectrum.ts";
import { readSpectrumFile } from "#app/gemmology/spectrum/read-spectrum-file.ts";
import { spectrumPeaks } from "#app/gemmology/spectrum/spectrum-peaks.ts";
import { thinCurve } from "#app/gemmology/spectrum/thin-curve.ts";
import { decodeTextFile } from "./decode-text-file.ts";
import { largestSpectrumBytes, mostSpectraAStone } from "./spectrum-file-limits.ts";

export type NewSpectrum = Readonly<{ requestId: SpectrumId; stoneCode: string; bytes: Buffer; fileName: string; note: string; assumed: AssumedUnits }>;

/** As many points as a screen shows; the file itself keeps all. */
const mostCurvePoints = 800;

/**
 * Keeps a measured spectrum with its stone: the file as it came, and what is shown of it. Sent twice, it is kept once.
 * @returns its number on the stone
 * @throws AppError invalid_input for the field `file`, with the line where the file is wrong
 */
export async function addSpectrum(ctx: LabContext, { requestId, stoneCode, bytes, fileName, note, assumed }: NewSpectrum): Promise<{ sequence: number; peakCount: number }> {
  requireRole(ctx, "readings.record");
  const { laboratoryId } = ctx;
  await stoneUnderExamination(ctx, stoneCode);
  const repeat = await findByRequest(ctx, requestId, stoneCode);
  if (repeat) return repeat;

  const spectrum = readOrRefuse(bytes, assumed);
  const peaks = spectrumPeaks(spectrum);
  const { fileKey } = await ctx.services.uploads.put({ name: `${stoneCode}.txt`, mimeType: "text/plain", bytes });
  try {
    const { kept, isNew } = await inTransaction(ctx.db, async (tx) => {
      const scope = { ...ctx, db: tx };
      const stone = await stoneUnderExamination(scope, stoneCode);
      const again = await findByRequest(scope, requestId, stoneCode);
      if (again) return { kept: again, isNew: false };
      const sequence = await nextSequence(scope, stone.id);
      await tx.insert(spectra).values({
        laboratoryId,
        id: requestId,
        stoneId: stone.id,
        sequence,
        note,
        fileKey,
        fileName: plainFileName(fileName),
        sizeBytes: bytes.length,
        sha256: createHash("sha256").update(bytes).digest(),
        format: spectrum.format,
        title: spectrum.title,
        kind: spectrum.kind,
        xUnit: spectrum.xUnit,
        yUnit: spectrum.yUnit,
        isUnitAssumed: spectrum.isUnitAssumed,
        pointCount: spectrum.xs.length,
        firstX: spectrum.xs[0]!,
        lastX: spectrum.xs.at(-1)!,
        curve: thinCurve(spectrum.xs.map((x, at) => [short(x), short(spectrum.ys[at]!)] as const), mostCurvePoints),
        peaks: peaks.map((peak) => ({ ...peak, nm: short(peak.nm), widthNm: peak.widthNm && short(peak.widthNm), prominence: peak.prominence && short(peak.prominence) })),
        notes: spectrum.notes,
        requestId,
        createdAt: ctx.now,
        createdBy: ctx.actorId,
      });
      await tx.update(stones).set({ version: sql`${stones.version} + 1` }).where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.id, stone.id)));
      await recordAudit(scope, { action: "spectrum.added", subject: { kind: "stone", id: stone.id }, detail: { sequence, format: spectrum.format } });
      return { kept: { sequence, peakCount: peaks.length }, isNew: true };
    });
    // The same form came twice at once, and the other one was first.
    if (!isNew) await ctx.services.uploads.remove([fileKey]).catch(() => undefined);
    return kept;
  } catch (error) {
    // The first failure is the one to tell of.
    await ctx.services.uploads.remove([fileKey]).catch(() => undefined);
    throw error;
  }
}

async function nextSequence({ db, laboratoryId }: LabContext, stoneId: StoneId): Promise<number> {
  const theirs = await db.select({ sequence: spectra.sequence, withdrawnAt: spectra.withdrawnAt }).from(spectra).where(and(eq(spectra.laboratoryId, laboratoryId), eq(spectra.stoneId, stoneId)));
  if (theirs.filter(({ withdrawnAt }) => withdrawnAt === null).length >= mostSpectraAStone) throw refused(`This stone has ${mostSpectraAStone} spectra already. Withdraw one that is not needed.`);
  if (theirs.length >= 5 * mostSpectraAStone) throw refused("Too many spectra of this stone were withdrawn: no more are taken.");
  return Math.max(0, ...theirs.map(({ sequence }) => sequence)) + 1;
}

async function findByRequest({ db, laboratoryId, actorId }: LabContext, requestId: SpectrumId, stoneCode: string) {
  const [row] = await db
    .select({ sequence: spectra.sequence, peaks: spectra.peaks, createdBy: spectra.createdBy, code: stones.code })
    .from(spectra)
    .innerJoin(stones, and(eq(stones.laboratoryId, spectra.laboratoryId), eq(stones.id, spectra.stoneId)))
    .where(and(eq(spectra.laboratoryId, laboratoryId), eq(spectra.requestId, requestId)));
  if (!row) return undefined;
  if (row.createdBy !== actorId || row.code !== stoneCode) throw new AppError("conflict", "This form was sent for another spectrum before. Open the page anew and send it again.");
  return { sequence: row.sequence, peakCount: row.peaks.length };
}

function readOrRefuse(bytes: Buffer, assumed: AssumedUnits): MeasuredSpectrum {
  if (bytes.length > largestSpectrumBytes) throw refused(`This file has ${(bytes.length / 1e6).toFixed(1)} MB; spectra of up to ${largestSpectrumBytes / 1e6} MB are taken.`);
  const result = readSpectrumFile(decodeTextFile(bytes), assumed);
  if (!result.ok) throw refused(result.problem.line === null ? result.problem.message : `Line ${result.problem.line}: ${result.problem.message}`);
  return result.spectrum;
}

function refused(message: string): AppError {
  return new AppError("invalid_input", message, { fieldErrors: { file: [message] } });
}

/** Seven digits are more than any spectrometer gives. */
const short = (value: number) => Number(value.toPrecision(7));

/** The last part of a path, without what cannot be seen. */
function plainFileName(name: string): string {
  const last = name.split(/[\\/]/).at(-1) ?? "";
  return last.normalize("NFC").replace(/\p{C}/gu, "").trim().slice(0, 160) || "spectrum";
}
