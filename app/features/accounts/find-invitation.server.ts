import { eq } from "drizzle-orm";
import { laboratories, users } from "#app/db/schema/index.ts";
import { roleNames } from "#app/domain/roles.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { findEmailToken } from "./find-email-token.server.ts";

export type Invitation = Readonly<{
  kind: "staff" | "client";
  email: string;
  name: string;
  laboratoryName: string;
  roleNames: readonly string[];
  /** Told to those who hold the link from that address' mailbox only. */
  hasAccount: boolean;
}>;

/** What an invitation's link offers; undefined when it does not work any more. */
export async function findInvitation(app: AppContext, token: string): Promise<Invitation | undefined> {
  const found = await findEmailToken(app, { token, purposes: ["inviteStaff", "inviteClient"] });
  if (!found?.laboratoryId) return undefined;
  const [row] = await app.db
    .select({ laboratoryName: laboratories.name, userId: users.id })
    .from(laboratories)
    .leftJoin(users, eq(users.email, found.email))
    .where(eq(laboratories.id, found.laboratoryId));
  if (!row) return undefined;
  return {
    kind: found.purpose === "inviteStaff" ? "staff" : "client",
    email: found.email,
    name: found.payload.name ?? "",
    laboratoryName: row.laboratoryName,
    roleNames: (found.payload.roles ?? []).map((role) => roleNames[role]),
    hasAccount: row.userId !== null,
  };
}
