import { isId, type Id } from "#app/domain/ids.ts";

/** Where a list goes on, in a URL: an instant and a row id, both as they were in the last row shown. */
export type Cursor<Noun extends string> = { createdAt: Date; id: Id<Noun> };

export function writeCursor<Noun extends string>({ createdAt, id }: Cursor<Noun>): string {
  return `${createdAt.getTime().toString(36)}.${id}`;
}

/** @returns undefined for anything that is not a cursor: the list then starts at its beginning */
export function readCursor<Noun extends string>(text: string | null): Cursor<Noun> | undefined {
  const [at, id] = (text ?? "").split(".");
  if (!at || !id || !/^[0-9a-z]{1,11}$/.test(at) || !isId(id)) return undefined;
  const createdAt = new Date(parseInt(at, 36));
  return Number.isNaN(createdAt.getTime()) ? undefined : { createdAt, id: id as Id<Noun> };
}
