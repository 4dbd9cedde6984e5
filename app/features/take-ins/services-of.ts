import type { ServiceCode } from "#app/domain/take-in.ts";

/** Identification always, a second person's check wherever there is one, a valuation when the client asks for it. */
export function servicesOf({ isSolePractice, isValuationWanted }: { isSolePractice: boolean; isValuationWanted: boolean }): ServiceCode[] {
  return ["identification", ...(isSolePractice ? [] : (["secondCheck"] as const)), ...(isValuationWanted ? (["valuation"] as const) : [])];
}
