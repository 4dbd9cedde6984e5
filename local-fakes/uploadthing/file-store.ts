import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { loadJson, saveJson } from "../json-file.ts";

export type StoredFile = {
  key: string;
  name: string;
  type: string;
  sizeBytes: number;
  customId: string | null;
  acl: string;
  disposition: string;
  hash: string;
  uploadedAt: number;
};

export type FileStore = ReturnType<typeof openFileStore>;

/** Files by key: in a folder, so that they outlive a restart, or else in memory. */
export function openFileStore(folder?: string) {
  const indexFile = folder && path.join(folder, "index.json");
  const files = new Map(Object.entries(loadJson<Record<string, StoredFile>>(indexFile, {})));
  const inMemory = new Map<string, Buffer>();
  const saveIndex = () => saveJson(indexFile, Object.fromEntries(files));
  // A key comes from outside: its digest names the file.
  const fileOf = (key: string) => path.join(folder!, createHash("sha256").update(key).digest("hex"));

  return {
    find: ({ fileKey, customId }: { fileKey?: unknown; customId?: unknown }) =>
      typeof fileKey === "string" ? files.get(fileKey) : [...files.values()].find((file) => file.customId !== null && file.customId === customId),

    list: () => [...files.values()],

    put(file: Omit<StoredFile, "hash" | "sizeBytes" | "uploadedAt">, bytes: Buffer): StoredFile {
      const stored = { ...file, sizeBytes: bytes.length, hash: createHash("md5").update(bytes).digest("hex"), uploadedAt: Date.now() };
      if (folder) {
        fs.mkdirSync(folder, { recursive: true });
        fs.writeFileSync(fileOf(file.key), bytes);
      } else inMemory.set(file.key, bytes);
      files.set(file.key, stored);
      saveIndex();
      return stored;
    },

    bytes: (key: string): Buffer => (folder ? fs.readFileSync(fileOf(key)) : inMemory.get(key)!),

    update(key: string, fields: Partial<Pick<StoredFile, "name" | "acl">>): void {
      const file = files.get(key);
      if (!file) return;
      Object.assign(file, fields);
      saveIndex();
    },

    remove(key: string): boolean {
      if (!files.delete(key)) return false;
      if (folder) fs.rmSync(fileOf(key), { force: true });
      inMemory.delete(key);
      saveIndex();
      return true;
    },
  };
}
