import { AppError } from "#app/domain/app-error.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { freezePhoto } from "./freeze-photo.server.ts";
import { previewReport } from "./preview-report.server.ts";

/** The draft as a PDF, marked as such on every page; rendered for this one look and kept nowhere. */
export async function renderDraft(ctx: LabContext, { stoneCode }: { stoneCode: string }): Promise<{ pdf: Buffer; fileName: string }> {
  const { stone, view } = await previewReport(ctx, { stoneCode });
  if (!view) throw new AppError("conflict", "There is a draft only while the stone is checked and not yet authorised.");
  const jpeg = view.photograph ? await freezePhoto(ctx, { stoneId: stone.id }) : undefined;
  const pdf = await ctx.services.reportRenderer.render({ ...view, photograph: jpeg && view.photograph ? { ...view.photograph, jpeg: new Uint8Array(jpeg) } : null });
  return { pdf: Buffer.from(pdf), fileName: `${stoneCode}-draft.pdf` };
}
