import { and, eq, inArray } from "drizzle-orm";
import { clients, items, stoneSearchTokens, stones, takeIns } from "#app/db/schema/index.ts";
import type { StoneId } from "#app/domain/ids.ts";
import type { LabScope } from "#app/features/lab-context.ts";
import { indexTokens } from "./search-tokens.ts";

const rowsPerInsert = 2_000;

/** Writes anew what the search box finds these stones by: code, description, client and take-in. */
export async function indexStoneSearch(scope: LabScope, stoneIds: readonly StoneId[]): Promise<void> {
  if (stoneIds.length === 0) return;
  const { db, laboratoryId } = scope;
  const rows = await db
    .select({
      stoneId: stones.id,
      receivedAt: stones.receivedAt,
      code: stones.code,
      description: stones.description,
      itemDescription: items.description,
      client: clients.name,
      takeIn: takeIns.number,
    })
    .from(stones)
    .innerJoin(items, and(eq(items.laboratoryId, stones.laboratoryId), eq(items.id, stones.itemId)))
    .innerJoin(takeIns, and(eq(takeIns.laboratoryId, stones.laboratoryId), eq(takeIns.id, stones.takeInId)))
    .innerJoin(clients, and(eq(clients.laboratoryId, stones.laboratoryId), eq(clients.id, stones.clientId)))
    .where(and(eq(stones.laboratoryId, laboratoryId), inArray(stones.id, [...stoneIds])));
  await db.delete(stoneSearchTokens).where(and(eq(stoneSearchTokens.laboratoryId, laboratoryId), inArray(stoneSearchTokens.stoneId, [...stoneIds])));
  const tokens = rows.flatMap((row) =>
    indexTokens([row.code, row.description, row.itemDescription, row.client, row.takeIn]).map((token) => ({
      laboratoryId,
      token,
      receivedAt: row.receivedAt,
      stoneId: row.stoneId,
    })),
  );
  for (let at = 0; at < tokens.length; at += rowsPerInsert) await db.insert(stoneSearchTokens).values(tokens.slice(at, at + rowsPerInsert));
}
