import { ApiError } from "./api-error.ts";
import { fieldsOf, textOf, type FormFields } from "./parse-form.ts";

export const listFields = ["limit", "starting_after", "ending_before", "created"];

type Listed = { id: string; created: number };

/** A page of the service's lists: newest first, `limit` 1–100 (10), cursors by id, `created` as a moment or a range. */
export function listPage<T extends Listed>({ path, all, fields }: { path: string; all: T[]; fields: FormFields }) {
  const limit = Number(textOf(fields.limit) ?? 10);
  if (!Number.isInteger(limit) || limit < 1 || limit > 100) throw new ApiError(400, "limit must be from 1 to 100.", { param: "limit" });
  // Within one second the later one comes first: objects keep the order in which they were made.
  const matching = all.filter(({ created }) => isWithin(created, fields)).reverse();
  const after = textOf(fields.starting_after);
  const before = textOf(fields.ending_before);
  if (after) {
    const start = indexOf(matching, after, "starting_after") + 1;
    return answer(path, matching.slice(start, start + limit), start + limit < matching.length);
  }
  if (before) {
    const end = indexOf(matching, before, "ending_before");
    return answer(path, matching.slice(Math.max(0, end - limit), end), end - limit > 0);
  }
  return answer(path, matching.slice(0, limit), matching.length > limit);
}

function answer<T>(url: string, data: T[], hasMore: boolean) {
  return { object: "list", url, has_more: hasMore, data };
}

function indexOf(items: Listed[], id: string, param: string): number {
  const index = items.findIndex((item) => item.id === id);
  if (index < 0) throw new ApiError(400, `No such object: '${id}'`, { param, code: "resource_missing" });
  return index;
}

function isWithin(created: number, fields: FormFields): boolean {
  const exact = textOf(fields.created);
  if (exact) return created === Number(exact);
  const { gt, gte, lt, lte } = fieldsOf(fields.created);
  return !(
    (typeof gt === "string" && !(created > Number(gt))) ||
    (typeof gte === "string" && !(created >= Number(gte))) ||
    (typeof lt === "string" && !(created < Number(lt))) ||
    (typeof lte === "string" && !(created <= Number(lte)))
  );
}
