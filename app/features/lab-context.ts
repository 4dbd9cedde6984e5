import type { Db, Tx } from "#app/db/client.server.ts";
import type { LaboratoryId, UserId } from "#app/domain/ids.ts";
import type { CurrencyCode } from "#app/domain/money/money.ts";
import type { Role } from "#app/domain/roles.ts";
import type { Services } from "./services.ts";

/** In which laboratory something happens, when, and through what. The actor is null when no person acts (a payment event). */
export type LabScope = Readonly<{
  /** Pass the transaction here and every operation joins it. */
  db: Db | Tx;
  laboratoryId: LaboratoryId;
  actorId: UserId | null;
  /** The only clock a feature reads. */
  now: Date;
  services: Services;
}>;

/** A signed-in member acting in one laboratory: the first argument of every operation on its behalf. */
export type LabContext = LabScope &
  Readonly<{
    actorId: UserId;
    person: Readonly<{ name: string; email: string; title: string }>;
    roles: readonly Role[];
    laboratory: Readonly<{
      slug: string;
      name: string;
      prefix: string;
      isSolePractice: boolean;
      timeZone: string;
      currency: CurrencyCode;
      taxShareE4: number;
      taxLabel: string;
      usualDays: number;
      selfCheckDelayHours: number;
    }>;
  }>;
