import type { Db, Tx } from "#app/db/client.server.ts";
import type { Services } from "./services.ts";

/** Where no laboratory is chosen yet: signing in, the public register, a payment provider's call. */
export type AppContext = Readonly<{
  db: Db | Tx;
  now: Date;
  services: Services;
  /** Of the asker, for rate limits; "unknown" when the server in front does not tell. */
  clientAddress: string;
}>;
