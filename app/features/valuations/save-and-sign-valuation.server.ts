import { inTransaction } from "#app/db/in-transaction.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { saveValuation } from "./save-valuation.server.ts";
import { signValuation } from "./sign-valuation.server.ts";
import type { ValuationInput } from "./valuation-forms.server.ts";

/** Saves the draft as it stands in the form and signs it, or neither: a refused signature leaves the form's version valid. */
export async function saveAndSignValuation(ctx: LabContext, { stoneCode, input }: { stoneCode: string; input: ValuationInput }): Promise<void> {
  await inTransaction(ctx.db, async (tx) => {
    const scope = { ...ctx, db: tx };
    await saveValuation(scope, { stoneCode, input });
    await signValuation(scope, { stoneCode, rowVersion: input.rowVersion + 1 });
  });
}
