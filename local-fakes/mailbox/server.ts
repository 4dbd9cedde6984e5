import type { AddressInfo } from "node:net";
import { simpleParser } from "mailparser";
import { SMTPServer } from "smtp-server";
import { redirect, sendJson, sendPage, serveLoopback } from "../serve-loopback.ts";
import { openMessageStore, type ReceivedMessage } from "./message-store.ts";
import { listPage, messagePage, notFoundPage } from "./pages.ts";

type Options = {
  /** Of the page; mail itself comes in on `smtpPort`. */
  port?: number;
  smtpPort?: number;
  /** Messages are kept there; in memory where absent. */
  folder?: string;
};

const mostMessageBytes = 20 * 1024 ** 2;

/** A mail server that delivers to a page: SMTP in, people read what was sent. */
export async function startFakeMailbox({ port, smtpPort = 0, folder }: Options = {}) {
  const store = openMessageStore(folder);
  const watchers = new Set<() => void>();

  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS"], // no certificate on loopback
    size: mostMessageBytes,
    onData(stream, session, done) {
      simpleParser(stream).then((parsed) => {
        store.add(
          parsed,
          session.envelope.rcptTo.map(({ address }) => address),
        );
        for (const watcher of watchers) watcher();
        done();
      }, done);
    },
  });
  smtp.on("error", () => {}); // a client that hangs up is not our fault
  await new Promise<void>((resolve, reject) => {
    smtp.server.once("error", reject);
    smtp.listen(smtpPort, "127.0.0.1", () => resolve());
  });

  const web = await serveLoopback({
    port,
    handlerFor: () => (request, response, url) => {
      const { pathname, searchParams } = url;
      if (request.method === "POST" && pathname === "/clear") {
        store.clear();
        return redirect(response, "/");
      }
      if (request.method !== "GET") return sendJson(response, 404, { error: `The mailbox does not know ${request.method} ${pathname}` });
      if (pathname === "/") return sendPage(response, listPage(store.messages));
      if (pathname === "/messages.json") {
        const to = searchParams.get("to");
        return sendJson(response, 200, to ? store.messages.filter((message) => message.to.includes(to)) : store.messages);
      }
      const message = pathname.startsWith("/messages/") ? store.find(pathname.slice("/messages/".length)) : undefined;
      if (message) return sendPage(response, messagePage(message));
      sendPage(response, notFoundPage(), 404);
    },
  }).catch(async (error: unknown) => {
    await new Promise<void>((done) => smtp.close(() => done()));
    throw error;
  });

  const close = async () => {
    await web.close();
    await new Promise<void>((done) => smtp.close(() => done()));
  };
  return {
    url: web.url,
    smtpUrl: `smtp://127.0.0.1:${(smtp.server.address() as AddressInfo).port}`,
    /** Oldest first. */
    messages: store.messages as readonly ReceivedMessage[],
    /** The newest message that fits, now or when it arrives. */
    waitFor(isWanted: (message: ReceivedMessage) => boolean, { timeoutMs = 10_000 } = {}): Promise<ReceivedMessage> {
      return new Promise((resolve, reject) => {
        const look = () => {
          const message = store.messages.findLast(isWanted);
          if (message) end(() => resolve(message));
        };
        const timer = setTimeout(() => end(() => reject(new Error(`no such mail within ${timeoutMs} ms; subjects: ${store.messages.map(({ subject }) => subject).join(" | ")}`))), timeoutMs);
        const end = (settle: () => void) => {
          clearTimeout(timer);
          watchers.delete(look);
          settle();
        };
        watchers.add(look);
        look();
      });
    },
    close,
    [Symbol.asyncDispose]: close,
  };
}

export type FakeMailbox = Awaited<ReturnType<typeof startFakeMailbox>>;
