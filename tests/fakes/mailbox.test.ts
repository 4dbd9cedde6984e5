import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { expect, test } from "vitest";
import { createMailer } from "#app/integrations/mailer.server.ts";
import { startFakeMailbox } from "#fakes/mailbox/server.ts";

const from = "Marram Quay <no-reply@isogyre.example>";
const invitation = { to: { address: "bench@example.test", name: "Bench" }, subject: "Invitation — Größe ≤ 5", html: `<p>Open <a href="http://127.0.0.1:9/join/abc">the invitation</a><script>alert(1)</script></p>`, text: "Open http://127.0.0.1:9/join/abc" };

test("a message sent by the mailer is read on the page, with links, and nothing in it can run", async () => {
  await using mailbox = await startFakeMailbox();
  const mailer = createMailer({ smtpUrl: mailbox.smtpUrl, from });
  await mailer.send(invitation);
  mailer.close();
  const message = await mailbox.waitFor(({ to }) => to.includes("bench@example.test"));
  expect(message).toMatchObject({ subject: "Invitation — Größe ≤ 5", to: ["bench@example.test"] });
  expect(message.from).toContain("no-reply@isogyre.example");
  expect(await (await fetch(mailbox.url)).text()).toContain(`/messages/${message.id}`);
  const page = await fetch(`${mailbox.url}/messages/${message.id}`);
  const html = await page.text();
  expect(html).toContain(`<a href="http://127.0.0.1:9/join/abc">`);
  expect(html).toContain(`sandbox="allow-popups allow-popups-to-escape-sandbox"`);
  expect(html).not.toContain("<script");
  expect(page.headers.get("content-security-policy")).toContain("default-src 'none'");
});

test("tests ask for the messages of one person as JSON, and wait for those to come", async () => {
  await using mailbox = await startFakeMailbox();
  const mailer = createMailer({ smtpUrl: mailbox.smtpUrl, from });
  const later = mailbox.waitFor(({ subject }) => subject === "Second");
  await mailer.send({ ...invitation, to: { address: "other@example.test", name: "" }, subject: "First" });
  await mailer.send({ ...invitation, subject: "Second" });
  mailer.close();
  expect((await later).to).toEqual(["bench@example.test"]);
  const found = (await (await fetch(`${mailbox.url}/messages.json?to=other@example.test`)).json()) as { subject: string }[];
  expect(found.map(({ subject }) => subject)).toEqual(["First"]);
  await expect(mailbox.waitFor(({ subject }) => subject === "Never", { timeoutMs: 20 })).rejects.toThrow("First | Second");
});

test("mail outlives a restart where it has a folder, until the mailbox is emptied", async () => {
  const folder = mkdtempSync(path.join(tmpdir(), "isogyre-mail-"));
  try {
    const first = await startFakeMailbox({ folder });
    const mailer = createMailer({ smtpUrl: first.smtpUrl, from });
    await mailer.send(invitation);
    mailer.close();
    await first.close();
    await using second = await startFakeMailbox({ folder });
    expect(second.messages.map(({ subject }) => subject)).toEqual(["Invitation — Größe ≤ 5"]);
    await fetch(`${second.url}/clear`, { method: "POST" });
    await using third = await startFakeMailbox({ folder });
    expect(third.messages).toEqual([]);
  } finally {
    rmSync(folder, { recursive: true });
  }
});
