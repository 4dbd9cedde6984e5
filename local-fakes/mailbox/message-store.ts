import { randomUUID } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import type { ParsedMail } from "mailparser";
import { loadJson, saveJson } from "../json-file.ts";

export type ReceivedMessage = {
  id: string;
  receivedAt: number;
  from: string;
  /** Whom the sender named to the server, which a hidden recipient is and a "To" line may not show. */
  to: string[];
  subject: string;
  text: string;
  html: string;
  headers: [name: string, line: string][];
  attachments: { name: string; type: string; sizeBytes: number }[];
};

export type MessageStore = ReturnType<typeof openMessageStore>;

/** What was sent, oldest first: in a folder, a file a message, or else in memory. */
export function openMessageStore(folder?: string) {
  const messages: ReceivedMessage[] = [];
  if (folder && fs.existsSync(folder)) {
    for (const name of fs.readdirSync(folder)) {
      const message = name.endsWith(".json") ? loadJson<ReceivedMessage | null>(path.join(folder, name), null) : null;
      if (message) messages.push(message);
    }
    messages.sort((a, b) => a.receivedAt - b.receivedAt);
  }
  return {
    messages,
    find: (id: string) => messages.find((message) => message.id === id),
    add(parsed: ParsedMail, to: string[]): ReceivedMessage {
      const message: ReceivedMessage = {
        id: randomUUID(),
        receivedAt: Date.now(),
        from: parsed.from?.text ?? "",
        to,
        subject: parsed.subject ?? "",
        text: parsed.text ?? "",
        html: typeof parsed.html === "string" ? parsed.html : "",
        headers: parsed.headerLines.map(({ key, line }) => [key, line]),
        attachments: parsed.attachments.map(({ filename, contentType, size }) => ({ name: filename ?? "", type: contentType, sizeBytes: size })),
      };
      messages.push(message);
      if (folder) saveJson(path.join(folder, `${message.id}.json`), message);
      return message;
    },
    clear(): void {
      for (const { id } of messages.splice(0)) if (folder) fs.rmSync(path.join(folder, `${id}.json`), { force: true });
    },
  };
}
