import { and, eq, inArray, sql } from "drizzle-orm";
import { items, laboratories, stones } from "#app/db/schema/index.ts";
import type { LabScope } from "#app/features/lab-context.ts";

export type CustodyStanding = { heldMinor: number; limitMinor: number | null };

/**
 * What the goods in the house were declared to be worth, all together, against what the insurer lets lie there.
 * Goods that are away with an outside laboratory are insured on their way and there, and do not count.
 */
export async function custodyStanding({ db, laboratoryId }: Pick<LabScope, "db" | "laboratoryId">): Promise<CustodyStanding> {
  const inTheHouse = db
    .selectDistinct({ itemId: stones.itemId })
    .from(stones)
    .where(and(eq(stones.laboratoryId, laboratoryId), inArray(stones.goodsState, ["safe", "bench"])));
  const [row] = await db
    .select({
      limitMinor: laboratories.custodyLimitMinor,
      heldMinor: sql<string>`(select coalesce(sum(${items.declaredValueMinor}), 0) from ${items} where ${items.laboratoryId} = ${laboratoryIdParam(laboratoryId)} and ${inArray(items.id, inTheHouse)})`,
    })
    .from(laboratories)
    .where(eq(laboratories.id, laboratoryId));
  return { heldMinor: Number(row?.heldMinor ?? 0), limitMinor: row?.limitMinor ?? null };
}

function laboratoryIdParam(laboratoryId: string) {
  return sql.param(laboratoryId, items.laboratoryId);
}
