import { openDB, type DBSchema, type IDBPDatabase } from "idb";

/** A reading or a strike that was made without the line, as its form would have sent it. */
export type Deed = Readonly<{
  /** Made by the device; the server keeps a deed of one id once. */
  id: string;
  kind: "reading" | "strike";
  /** Whose it is: nobody else on this device sees or sends it. */
  person: string;
  labSlug: string;
  stoneCode: string;
  fields: ReadonlyArray<readonly [name: string, value: string]>;
  /** By this device's clock, ISO 8601. */
  madeAt: string;
  /** Why the server will not have it; null while it waits. */
  refusal: string | null;
}>;
/** With its place in the order of making. */
export type KeptDeed = Deed & Readonly<{ place: number }>;

interface OutboxSchema extends DBSchema {
  deeds: { key: number; value: Deed & { place?: number }; indexes: { id: string } };
  /** What a stone's page last showed, to go from test to test without the line. */
  pages: { key: string; value: { person: string; keptAt: number; loaderData: unknown } };
}

let opened: Promise<IDBPDatabase<OutboxSchema>> | undefined;

export function openOutbox(): Promise<IDBPDatabase<OutboxSchema>> {
  opened ??= openDB<OutboxSchema>("isogyre-bench", 1, {
    upgrade(db) {
      db.createObjectStore("deeds", { keyPath: "place", autoIncrement: true }).createIndex("id", "id", { unique: true });
      db.createObjectStore("pages");
    },
    // Another tab brings a newer page: let it change the store, and open it anew when asked again.
    blocking(_current, _blocked, event) {
      (event.target as IDBDatabase).close();
      opened = undefined;
    },
    terminated() {
      opened = undefined;
    },
  });
  return opened;
}
