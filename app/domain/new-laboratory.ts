import type { CurrencyCode } from "./money/money.ts";

/** What a laboratory is opened with. */
export type NewLaboratory = Readonly<{
  name: string;
  /** In addresses: /lab/port-ellery. Never changed afterwards. */
  slug: string;
  /** Leads every number that people see: MQ-26-0417. Never changed afterwards. */
  prefix: string;
  isSolePractice: boolean;
  timeZone: string;
  currency: CurrencyCode;
}>;
