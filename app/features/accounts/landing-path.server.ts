import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { listMyLaboratories } from "#app/features/laboratories/list-my-laboratories.server.ts";
import { isClientSomewhere } from "./is-client-somewhere.server.ts";

/** Where a person goes after signing in: the only laboratory, their own pages as a client, or a page to choose. */
export async function landingPath(app: Pick<AppContext, "db">, userId: UserId): Promise<string> {
  const laboratories = await listMyLaboratories(app, userId);
  if (laboratories.length === 1) return `/lab/${laboratories[0]!.slug}/stones`;
  if (laboratories.length > 1) return "/laboratories";
  return (await isClientSomewhere(app, userId)) ? "/my" : "/laboratories";
}
