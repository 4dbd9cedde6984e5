import { UTApi, UTFile } from "uploadthing/server";

type Settings = { token: string; apiUrl?: string; ingestUrl?: string; /** Where files are read; UploadThing's own host when absent. */ fileUrl?: string };

/** Files at UploadThing through its SDK. Keys are unguessable and stay on the server: pictures reach people through us. */
export function createUploads({ token, apiUrl, ingestUrl, fileUrl }: Settings) {
  const api = new UTApi({ token, ...(apiUrl && { apiUrl }), ...(ingestUrl && { ingestUrl }), logLevel: "Error" });
  const { appId } = JSON.parse(Buffer.from(token, "base64").toString("utf8")) as { appId: string };
  const urlOf = (fileKey: string) => (fileUrl ? `${fileUrl}/f/${fileKey}` : `https://${appId}.ufs.sh/f/${fileKey}`);

  return {
    async put({ name, mimeType, bytes }: { name: string; mimeType: string; bytes: Buffer }): Promise<{ fileKey: string }> {
      const result = await api.uploadFiles(new UTFile([new Uint8Array(bytes)], name, { type: mimeType }));
      if (result.error) throw new Error(`upload failed: ${result.error.code} ${result.error.message}`);
      return { fileKey: result.data.key };
    },
    async get(fileKey: string): Promise<Buffer> {
      const response = await fetch(urlOf(fileKey), { signal: AbortSignal.timeout(15_000), redirect: "error" });
      if (!response.ok) throw new Error(`file store answered ${response.status}`);
      return Buffer.from(await response.arrayBuffer());
    },
    async remove(fileKeys: readonly string[]): Promise<void> {
      if (fileKeys.length > 0) await api.deleteFiles([...fileKeys]);
    },
  };
}
