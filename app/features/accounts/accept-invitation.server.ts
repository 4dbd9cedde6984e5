import { constraintKind } from "#app/db/errors.server.ts";
import { AppError } from "#app/domain/app-error.ts";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { acceptClientInvitation } from "./accept-client-invitation.server.ts";
import { acceptStaffInvitation } from "./accept-staff-invitation.server.ts";
import { findInvitation } from "./find-invitation.server.ts";
import { normalPassword } from "./normal-password.ts";
import { requireGoodPassword } from "./require-good-password.server.ts";
import { deadLinkSentence } from "./spend-email-token.server.ts";

type By = { signedInAs: UserId } | { name: string; password: string };

/** Accepts an invitation of either kind, by an account that is signed in or by a new one. */
export async function acceptInvitation(app: AppContext, { token, by }: { token: string; by: By }): Promise<{ userId: UserId; goTo: string }> {
  await consume(app, { door: "link", key: app.clientAddress });
  const invitation = await findInvitation(app, token);
  if (!invitation) throw new AppError("not_found", deadLinkSentence);
  const accept = invitation.kind === "staff" ? acceptStaffInvitation : acceptClientInvitation;
  if ("signedInAs" in by) return accept(app, { token, ...by });
  requireGoodPassword({ password: by.password, name: by.name, email: invitation.email, laboratoryName: invitation.laboratoryName });
  const passwordHash = await app.services.passwords.hash(normalPassword(by.password));
  try {
    return await accept(app, { token, name: by.name, passwordHash });
  } catch (error) {
    // The same address got an account by another link in this very moment.
    if (constraintKind(error) === "duplicate") throw new AppError("conflict", `${invitation.email} has an account by now. Sign in with it, and open the link again.`, { cause: error });
    throw error;
  }
}
