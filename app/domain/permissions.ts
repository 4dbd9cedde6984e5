import type { Role } from "./roles.ts";

/**
 * Who may do what inside a laboratory, decided here and nowhere else.
 * An owner runs the laboratory; the professional acts (readings, conclusions, checks, values, signatures)
 * need the professional role as well, which an owner may hold and a sole practitioner does.
 */
export const allowedRoles = {
  "laboratory.read": ["owner", "gemmologist", "appraiser", "desk"],
  "laboratory.manage": ["owner"],
  "team.manage": ["owner"],
  "prices.manage": ["owner"],
  "prices.read": ["owner", "desk"],
  "instruments.read": ["owner", "gemmologist", "appraiser", "desk"],
  "instruments.manage": ["owner", "gemmologist"],
  "clients.read": ["owner", "gemmologist", "appraiser", "desk"],
  "clients.manage": ["owner", "desk"],
  "clients.grantTerms": ["owner"],
  "takeIn.create": ["owner", "desk"],
  "takeIn.read": ["owner", "gemmologist", "appraiser", "desk"],
  "custody.record": ["owner", "gemmologist", "desk"],
  "custody.release": ["owner", "desk"],
  "declaredValue.read": ["owner", "desk"],
  "stones.read": ["owner", "gemmologist", "appraiser", "desk"],
  "stones.decline": ["owner", "desk"],
  "photos.add": ["owner", "gemmologist", "desk"],
  "readings.read": ["owner", "gemmologist", "appraiser"],
  "readings.record": ["gemmologist"],
  "conclusions.read": ["owner", "gemmologist", "appraiser"],
  "conclusions.propose": ["gemmologist"],
  "secondChecks.do": ["gemmologist"],
  "valuations.read": ["owner", "appraiser"],
  "valuations.write": ["appraiser"],
  "invoices.read": ["owner", "desk"],
  "invoices.manage": ["owner", "desk"],
  "reports.read": ["owner", "gemmologist", "appraiser", "desk"],
  "reports.authoriseIdentification": ["gemmologist"],
  "reports.authoriseValuation": ["appraiser"],
  "reports.issue": ["owner", "gemmologist", "appraiser", "desk"],
  "reports.withdraw": ["owner"],
  "audit.read": ["owner"],
} as const satisfies Record<string, readonly Role[]>;

export type Operation = keyof typeof allowedRoles;
export const operations = Object.keys(allowedRoles) as Operation[];

export function isAllowed(held: readonly Role[], operation: Operation): boolean {
  return held.some((role) => (allowedRoles[operation] as readonly Role[]).includes(role));
}
