import { uuidv7 } from "uuidv7";
import type { Id } from "#app/domain/ids.ts";

export function newId<Noun extends string>(): Id<Noun> {
  return uuidv7() as Id<Noun>;
}
