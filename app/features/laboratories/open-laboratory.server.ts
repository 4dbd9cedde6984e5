import { and, eq, or } from "drizzle-orm";
import { constraintKind } from "#app/db/errors.server.ts";
import { inTransaction } from "#app/db/in-transaction.server.ts";
import { newId } from "#app/db/new-id.server.ts";
import { laboratories, membershipRoles, memberships, prices } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LaboratoryId, UserId } from "#app/domain/ids.ts";
import type { NewLaboratory } from "#app/domain/new-laboratory.ts";
import { roles } from "#app/domain/roles.ts";
import { serviceCodes } from "#app/domain/take-in.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { recordAudit } from "#app/features/audit/record-audit.server.ts";
import { examplePrices } from "./example-prices.ts";
import { refuseTaken } from "./refuse-taken.ts";

/**
 * Opens a laboratory with its first owner and a price list of examples. In a sole practice the owner holds every role;
 * elsewhere owner and desk, until roles are given. Sent twice by the same person is opened once.
 * @throws AppError invalid_input beside slug or prefix when another laboratory has it
 */
export async function openLaboratory(app: Pick<AppContext, "db" | "now" | "services">, { ownerId, laboratory }: { ownerId: UserId; laboratory: NewLaboratory }): Promise<{ laboratoryId: LaboratoryId; slug: string }> {
  const { db, now, services } = app;
  try {
    return await inTransaction(db, async (tx) => {
      const taken = await tx
        .select({ id: laboratories.id, name: laboratories.name, slug: laboratories.slug, prefix: laboratories.prefix, firstOwner: memberships.userId })
        .from(laboratories)
        .leftJoin(memberships, and(eq(memberships.laboratoryId, laboratories.id), eq(memberships.userId, ownerId), eq(memberships.joinedAt, laboratories.createdAt)))
        .where(or(eq(laboratories.slug, laboratory.slug), eq(laboratories.prefix, laboratory.prefix)));
      const mine = taken.find((row) => row.firstOwner && row.slug === laboratory.slug && row.prefix === laboratory.prefix && row.name === laboratory.name);
      if (mine) return { laboratoryId: mine.id, slug: mine.slug };
      if (taken.length > 0) refuseTaken(laboratory, taken);
      const laboratoryId = newId<"laboratory">();
      await tx.insert(laboratories).values({ ...laboratory, id: laboratoryId, addressLines: [], createdAt: now });
      await tx.insert(memberships).values({ laboratoryId, userId: ownerId, joinedAt: now });
      const held = laboratory.isSolePractice ? roles : (["owner", "desk"] as const);
      await tx.insert(membershipRoles).values(held.map((role) => ({ laboratoryId, userId: ownerId, role })));
      await tx.insert(prices).values(
        serviceCodes.map((service, at) => ({ laboratoryId, id: newId<"price">(), service, ...examplePrices(laboratory.currency)[service], position: at + 1, changedAt: now, changedBy: ownerId })),
      );
      const scope = { db: tx, laboratoryId, actorId: ownerId, now, services };
      await recordAudit(scope, { action: "laboratory.opened", subject: { kind: "laboratory", id: laboratoryId } });
      return { laboratoryId, slug: laboratory.slug };
    });
  } catch (error) {
    if (constraintKind(error) !== "duplicate") throw error;
    // Somebody else was a moment faster; which of the two it is, the next try says.
    throw new AppError("conflict", "Another laboratory has just taken this short name or these letters. Send the form again.", { cause: error });
  }
}
