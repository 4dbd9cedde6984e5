import { and, eq } from "drizzle-orm";
import { items } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { ItemId } from "#app/domain/ids.ts";
import type { PhotoScope } from "./add-photo.server.ts";
import { requireRole } from "#app/features/require-role.ts";

/** The item that a photograph is sent for, asked before the file is accepted anywhere. */
export async function findItemForPhoto(scope: PhotoScope, itemNumber: string): Promise<ItemId> {
  requireRole(scope, "photos.add");
  const [item] = await scope.db
    .select({ id: items.id })
    .from(items)
    .where(and(eq(items.laboratoryId, scope.laboratoryId), eq(items.number, itemNumber)));
  if (!item) throw new AppError("not_found", "There is no such item.");
  return item.id;
}
