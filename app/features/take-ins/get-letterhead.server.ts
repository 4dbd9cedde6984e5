import { eq } from "drizzle-orm";
import { laboratories } from "#app/db/schema/index.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

export type Letterhead = { name: string; addressLines: string[]; phone: string; email: string };

/** Who we are, as a receipt says it. */
export async function getLetterhead(ctx: LabContext): Promise<Letterhead> {
  requireRole(ctx, "takeIn.read");
  const [row] = await ctx.db
    .select({ name: laboratories.name, addressLines: laboratories.addressLines, phone: laboratories.phone, email: laboratories.email })
    .from(laboratories)
    .where(eq(laboratories.id, ctx.laboratoryId));
  if (!row) throw new Error("a member of a laboratory that does not exist");
  return row;
}
