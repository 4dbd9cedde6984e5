import { and, asc, desc, eq, sql } from "drizzle-orm";
import { conclusions, invoices, items, stones, users, valuationComparables, valuations } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/**
 * The valuation page of a stone: the checked identity, the newest valuation, and, once that is signed, the declared value
 * and the fee. Until then those two never leave the database (workflow 1.2: a declared value must not be an anchor).
 */
export async function getValuation(ctx: LabContext, { stoneCode }: { stoneCode: string }) {
  requireRole(ctx, "valuations.read");
  const { laboratoryId } = ctx;
  const [row] = await ctx.db
    .select({
      stone: {
        code: stones.code,
        description: stones.description,
        state: stones.examinationState,
        isValuationOrdered: stones.isValuationOrdered,
        weightText: stones.weightText,
        receivedAt: stones.receivedAt,
      },
      conclusion: { speciesName: conclusions.speciesName, variety: conclusions.variety, nature: conclusions.nature, treatments: conclusions.treatments, description: conclusions.description },
      valuation: valuations,
      signedByName: users.name,
      declaredValueMinor: sql<number | null>`if(${valuations.state} = 'signed', ${items.declaredValueMinor}, null)`.mapWith(Number),
      declaredCurrency: items.declaredCurrency,
      feeMinor: sql<number | null>`if(${valuations.state} = 'signed', (select ${invoices.totalMinor} from ${invoices}
        where ${invoices.laboratoryId} = ${stones.laboratoryId} and ${invoices.takeInId} = ${stones.takeInId} order by ${invoices.id} desc limit 1), null)`.mapWith(Number),
    })
    .from(stones)
    .innerJoin(items, and(eq(items.laboratoryId, stones.laboratoryId), eq(items.id, stones.itemId)))
    .leftJoin(conclusions, and(eq(conclusions.laboratoryId, stones.laboratoryId), eq(conclusions.stoneId, stones.id)))
    .leftJoin(valuations, and(eq(valuations.laboratoryId, stones.laboratoryId), eq(valuations.stoneId, stones.id)))
    .leftJoin(users, eq(users.id, valuations.signedBy))
    .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
    .orderBy(desc(conclusions.version), desc(valuations.version))
    .limit(1);
  if (!row) throw new AppError("not_found", "There is no such stone.");
  const comparables = row.valuation
    ? await ctx.db
        .select()
        .from(valuationComparables)
        .where(and(eq(valuationComparables.laboratoryId, laboratoryId), eq(valuationComparables.valuationId, row.valuation.id)))
        .orderBy(asc(valuationComparables.position))
    : [];
  const isSigned = row.valuation?.state === "signed";
  const { id: _id, laboratoryId: _lab, stoneId: _stone, conclusionId: _conclusion, writtenBy: _writer, signedBy: _signer, ...shown } = row.valuation ?? ({} as NonNullable<typeof row.valuation>);
  return {
    stone: row.stone,
    conclusion: row.conclusion,
    valuation: row.valuation ? shown : null,
    comparables: comparables.map(({ laboratoryId: _l, valuationId: _v, ...comparable }) => comparable),
    signedByName: row.signedByName,
    afterSigning: isSigned
      ? {
          declaredValue: row.declaredValueMinor === null || !row.declaredCurrency ? null : formatMoney({ amountMinor: row.declaredValueMinor, currency: row.declaredCurrency }),
          fee: row.feeMinor === null ? null : formatMoney({ amountMinor: row.feeMinor, currency: ctx.laboratory.currency }),
        }
      : null,
  };
}
