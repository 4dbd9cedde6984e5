import { eq } from "drizzle-orm";
import { laboratories } from "#app/db/schema/index.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { requireRole } from "#app/features/require-role.ts";

/** Everything an owner may set, with the version it was read at. */
export async function getLaboratorySettings(ctx: LabContext) {
  requireRole(ctx, "laboratory.manage");
  const [row] = await ctx.db
    .select({
      name: laboratories.name,
      slug: laboratories.slug,
      prefix: laboratories.prefix,
      currency: laboratories.currency,
      isSolePractice: laboratories.isSolePractice,
      timeZone: laboratories.timeZone,
      addressLines: laboratories.addressLines,
      phone: laboratories.phone,
      email: laboratories.email,
      taxShareE4: laboratories.taxShareE4,
      taxLabel: laboratories.taxLabel,
      usualDays: laboratories.usualDays,
      selfCheckDelayHours: laboratories.selfCheckDelayHours,
      custodyLimitMinor: laboratories.custodyLimitMinor,
      version: laboratories.version,
    })
    .from(laboratories)
    .where(eq(laboratories.id, ctx.laboratoryId));
  if (!row) throw new AppError("not_found", "There is no such laboratory.");
  return row;
}
