import { newId } from "#app/db/new-id.server.ts";

/** For the hidden field of a form that makes something: sent twice, it makes one thing. */
export function newRequestId(): string {
  return newId<"request">();
}
