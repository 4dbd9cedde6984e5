import { and, desc, eq } from "drizzle-orm";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { conclusions, stones, valuationComparables, valuations } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ValuationId } from "#app/domain/ids.ts";
import { money } from "#app/domain/money/money.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";
import { adjustComparable } from "./adjust-comparable.ts";
import type { ValuationInput } from "./valuation-forms.server.ts";

/**
 * Keeps the draft of a valuation, on a checked identity only. `rowVersion` is 0 for a new draft, else what the form was
 * made from: a stale one is refused and nothing is overwritten.
 */
export async function saveValuation(ctx: LabContext, { stoneCode, input }: { stoneCode: string; input: ValuationInput }): Promise<ValuationId> {
  requireRole(ctx, "valuations.write");
  const { laboratoryId } = ctx;
  return inTransaction(ctx.db, async (tx) => {
    const [stone] = await tx
      .select({ id: stones.id, state: stones.examinationState, isOrdered: stones.isValuationOrdered })
      .from(stones)
      .where(and(eq(stones.laboratoryId, laboratoryId), eq(stones.code, stoneCode)))
      .for("update");
    if (!stone) throw new AppError("not_found", "There is no such stone.");
    if (!stone.isOrdered) throw new AppError("conflict", "The client did not order a valuation of this stone.");
    if (stone.state !== "checked") throw new AppError("conflict", "Only a checked identity can be valued. The examination of this stone is not there, or its report is already authorised.");
    const [conclusion] = await tx
      .select({ id: conclusions.id })
      .from(conclusions)
      .where(and(eq(conclusions.laboratoryId, laboratoryId), eq(conclusions.stoneId, stone.id)))
      .orderBy(desc(conclusions.version))
      .limit(1);
    if (!conclusion) throw new Error("a checked stone has no conclusion");
    const [current] = await tx
      .select({ id: valuations.id, version: valuations.version, state: valuations.state, rowVersion: valuations.rowVersion })
      .from(valuations)
      .where(and(eq(valuations.laboratoryId, laboratoryId), eq(valuations.stoneId, stone.id)))
      .orderBy(desc(valuations.version))
      .limit(1);

    const draft = current?.state === "draft" ? current : undefined;
    if ((draft?.rowVersion ?? 0) !== input.rowVersion) {
      throw new AppError("conflict", "This draft was changed meanwhile, so yours was not saved. Copy what you wrote, open the page again and compare.");
    }
    const { comparables, amount: _, rowVersion: _v, ...fields } = input;
    const row = { ...fields, conclusionId: conclusion.id, writtenBy: ctx.actorId, writtenAt: ctx.now, rowVersion: input.rowVersion + 1 };
    const id = draft?.id ?? newId<"valuation">();
    if (draft) {
      await tx.update(valuations).set(row).where(and(eq(valuations.laboratoryId, laboratoryId), eq(valuations.id, id)));
      await tx.delete(valuationComparables).where(and(eq(valuationComparables.laboratoryId, laboratoryId), eq(valuationComparables.valuationId, id)));
    } else {
      await tx.insert(valuations).values({ laboratoryId, id, stoneId: stone.id, version: (current?.version ?? 0) + 1, state: "draft", ...row });
    }
    if (comparables.length > 0) {
      await tx.insert(valuationComparables).values(
        comparables.map(({ amount: _amount, ...comparable }, index) => ({
          laboratoryId,
          valuationId: id,
          position: index + 1,
          ...comparable,
          adjustedMinor: adjustComparable({
            price: money(comparable.amountMinor, comparable.currency),
            currency: input.currency,
            exchangeRate: comparable.exchangeRate,
            adjustmentFactor: comparable.adjustmentFactor,
          }).amountMinor,
        })),
      );
    }
    await recordAudit({ ...ctx, db: tx }, { action: "valuation.saved", subject: { kind: "valuation", id } });
    return id;
  });
}
