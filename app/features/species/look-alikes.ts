import type { LookalikeRow, SpeciesRow } from "#app/gemmology/species/species-row.ts";

/** Another form that is taken for this one, and what separates them. */
export type Separation = Readonly<{ formId: string; by: string }>;
/** Forms whose constants are alike, and what settles it at the bench and in a laboratory. */
export type AlikeGroup = Readonly<{ shared: string; formIds: readonly string[]; bench: readonly string[]; laboratory: readonly string[] }>;

/**
 * What one form is taken for: what the others show, from its own row; and what it shows itself against those that
 * only their own rows name.
 */
export function separationsOf(row: SpeciesRow, rows: readonly SpeciesRow[]): { theyShow: Separation[]; itShows: Separation[] } {
  const theyShow = row.separated_from.map(({ id, by }) => ({ formId: id, by }));
  const named = new Set(theyShow.map(({ formId }) => formId));
  const itShows = rows.flatMap(({ id, separated_from: separated }) => (named.has(id) ? [] : separated.filter((one) => one.id === row.id).map(({ by }) => ({ formId: id, by }))));
  return { theyShow, itShows };
}

export function alikeGroupsOf(formIds: readonly string[], lookalikes: readonly LookalikeRow[]): AlikeGroup[] {
  return lookalikes.filter(({ members }) => formIds.every((id) => members.includes(id))).map(({ shared, members, bench, laboratory }) => ({ shared, formIds: members, bench, laboratory }));
}
