import type { NewLaboratory } from "#app/domain/new-laboratory.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { findEmailToken } from "./find-email-token.server.ts";

/** What a confirmation link will open; undefined when it does not work any more. */
export async function findSignUp(app: AppContext, token: string): Promise<{ email: string; laboratory: NewLaboratory } | undefined> {
  const found = await findEmailToken(app, { token, purposes: ["confirmEmail"] });
  return found?.payload.signUp ? { email: found.email, laboratory: found.payload.signUp.laboratory } : undefined;
}
