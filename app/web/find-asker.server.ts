import type { AppContext } from "#app/features/app-context.ts";
import { findSignedIn, type SignedIn } from "#app/features/accounts/find-signed-in.server.ts";
import { readSessionToken } from "./session-cookie.server.ts";

/** Who asks for a page that is open to everybody; undefined for strangers. */
export async function findAsker(app: AppContext, request: Request): Promise<SignedIn | undefined> {
  const token = await readSessionToken(request);
  return token ? findSignedIn(app, token) : undefined;
}
