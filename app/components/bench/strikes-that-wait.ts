import type { KeptDeed } from "./outbox/outbox-store.ts";

/** Numbers of saved readings whose strike waits on this device; a refused one does not strike. */
export function strikesThatWait(deeds: readonly KeptDeed[]): ReadonlySet<number> {
  return new Set(deeds.flatMap(({ kind, fields, refusal }) => (kind === "strike" && refusal === null ? fields.flatMap(([name, value]) => (name === "named.sequence" ? [Number(value)] : [])) : [])));
}
