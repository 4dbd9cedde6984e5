import type { FileStore } from "./file-store.ts";
import { signUrl } from "./signature.ts";

type Deps = { store: FileStore; apiKey: string; urlOf: (key: string) => string };
type Body = Record<string, unknown>;
type Answer = { status: number; body: unknown };

const byteLimit = 2 ** 31;

/** The calls of UTApi (REST version 6). An unknown one gives undefined. */
export function callRestApi({ store, apiKey, urlOf }: Deps, call: string, body: Body): Answer | undefined {
  switch (call) {
    case "deleteFiles": {
      const keys = [...texts(body.fileKeys), ...texts(body.customIds).map((customId) => store.find({ customId })?.key ?? "")];
      return ok({ success: true, deletedCount: keys.filter((key) => store.remove(key)).length });
    }
    case "listFiles": {
      const [offset, limit] = [Number(body.offset ?? 0), Number(body.limit ?? 500)];
      const all = store.list();
      const files = all
        .slice(offset, offset + limit)
        .map(({ key, customId, name, sizeBytes, uploadedAt }) => ({ id: key, key, customId, name, size: sizeBytes, status: "Uploaded", uploadedAt }));
      return ok({ hasMore: all.length > offset + limit, files });
    }
    case "renameFiles":
      for (const { newName, ...which } of updates(body)) store.update(store.find(which)?.key ?? "", { name: String(newName) });
      return ok({ success: true });
    case "updateACL":
      for (const { acl, ...which } of updates(body)) store.update(store.find(which)?.key ?? "", { acl: String(acl) });
      return ok({ success: true });
    case "getUsageInfo": {
      const totalBytes = store.list().reduce((sum, { sizeBytes }) => sum + sizeBytes, 0);
      return ok({ totalBytes, appTotalBytes: totalBytes, filesUploaded: store.list().length, limitBytes: byteLimit });
    }
    case "requestFileAccess": {
      const file = store.find(body);
      if (!file) return { status: 404, body: { error: "File not found" } };
      const url = new URL(urlOf(file.key));
      url.searchParams.append("expires", String(Date.now() + Number(body.expiresIn ?? 300) * 1_000));
      const signed = signUrl(url, apiKey);
      return ok({ url: signed, ufsUrl: signed });
    }
    case "getFileUrl":
      return ok({ data: texts(body.fileKeys).filter((fileKey) => store.find({ fileKey })).map((key) => ({ key, url: urlOf(key) })) });
    default:
      return undefined;
  }
}

function ok(body: unknown): Answer {
  return { status: 200, body };
}

function texts(value: unknown): string[] {
  return Array.isArray(value) ? value.filter((item): item is string => typeof item === "string") : [];
}

function updates(body: Body): Body[] {
  return Array.isArray(body.updates) ? (body.updates as Body[]) : [];
}
