import { escapeHtml, formatInstant, page } from "../page.ts";
import type { FileStore } from "./file-store.ts";

export const note = "A local stand-in for UploadThing. Files stay on this machine.";

export function filesPage(store: FileStore): string {
  const files = store.list().reverse();
  const rows = files.slice(0, 500).map(
    (file) =>
      `<tr><td><a href="/f/${encodeURIComponent(file.key)}">${escapeHtml(file.name)}</a><br><code>${escapeHtml(file.key)}</code></td><td>${escapeHtml(file.type)}</td><td class="number">${file.sizeBytes.toLocaleString("en-GB")}</td><td>${formatInstant(file.uploadedAt)}</td></tr>`,
  );
  const table = `<table><caption>${files.length === 1 ? "One file" : `${files.length} files`}, newest first</caption><thead><tr><th scope="col">File</th><th scope="col">Type</th><th scope="col">Bytes</th><th scope="col">Received</th></tr></thead><tbody>${rows.join("")}</tbody></table>`;
  return page({ title: "Stand-in for UploadThing", note, body: files.length === 0 ? "<p>No file yet. One appears when a picture or a report is stored.</p>" : table });
}
