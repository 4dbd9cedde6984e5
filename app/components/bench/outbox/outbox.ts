import { announceOutbox } from "./outbox-news.ts";
import { openOutbox, type Deed, type KeptDeed } from "./outbox-store.ts";

export type Whose = Readonly<{ person: string; labSlug: string }>;

/** Keeps a deed behind those that wait already. Kept twice, it is there once. */
export async function keepDeed(deed: Omit<Deed, "refusal">): Promise<void> {
  const db = await openOutbox();
  const write = db.transaction("deeds", "readwrite", { durability: "strict" });
  if (!(await write.store.index("id").getKey(deed.id))) await write.store.add({ ...deed, refusal: null });
  await write.done;
  announceOutbox();
}

/** What waits or was refused, in the order of making; of one stone, or of all. */
export async function deedsOf({ person, labSlug }: Whose, stoneCode?: string): Promise<KeptDeed[]> {
  const all = (await (await openOutbox()).getAll("deeds")) as KeptDeed[];
  return all.filter((deed) => deed.person === person && deed.labSlug === labSlug && (stoneCode === undefined || deed.stoneCode === stoneCode));
}

export async function dropDeed(place: number): Promise<void> {
  await (await openOutbox()).delete("deeds", place);
  announceOutbox();
}

export async function markRefused(place: number, refusal: string): Promise<void> {
  const db = await openOutbox();
  const write = db.transaction("deeds", "readwrite", { durability: "strict" });
  const deed = await write.store.get(place);
  if (deed) await write.store.put({ ...deed, refusal });
  await write.done;
  announceOutbox();
}
