import type { Id } from "#app/domain/ids.ts";
import { idFromShortRef, shortRef } from "#app/domain/short-ref.ts";

/** Where a list goes on, in a URL: the sorted column's value and the row, as the last row shown had them. */
export function writeRefCursor({ key, id }: { key: string; id: Id<string> }): string {
  return `${shortRef(id)}.${key}`;
}

/** @returns undefined for anything that is not a cursor: the list then starts at its beginning */
export function readRefCursor<Noun extends string>(text: string | null, keyShape: RegExp): { key: string; id: Id<Noun> } | undefined {
  const at = (text ?? "").indexOf(".");
  if (!text || at < 0) return undefined;
  const id = idFromShortRef<Noun>(text.slice(0, at));
  const key = text.slice(at + 1);
  return id && keyShape.test(key) ? { key, id } : undefined;
}
