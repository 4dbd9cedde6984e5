import { AppError } from "#app/domain/app-error.ts";
import type { NewLaboratory } from "#app/domain/new-laboratory.ts";

/** Says which of the two another laboratory has. @throws AppError invalid_input */
export function refuseTaken(wanted: Pick<NewLaboratory, "slug" | "prefix">, taken: ReadonlyArray<{ slug: string; prefix: string }>): never {
  const slug = `Another laboratory is at /lab/${wanted.slug}. Choose another short name.`;
  const prefix = `Another laboratory numbers with ${wanted.prefix}. Choose other letters.`;
  const isSlugTaken = taken.some((row) => row.slug === wanted.slug);
  const isPrefixTaken = taken.some((row) => row.prefix === wanted.prefix);
  throw new AppError("invalid_input", isSlugTaken ? slug : prefix, {
    fieldErrors: { ...(isSlugTaken && { slug: [slug] }), ...(isPrefixTaken && { prefix: [prefix] }) },
  });
}
