type Message = { id: string; to: string[]; subject: string; text: string };

/** The first letter to an address whose subject fits, as soon as it has come. */
export async function letterTo(mailboxUrl: string, { to, subject }: { to: string; subject: RegExp }): Promise<Message> {
  const deadline = Date.now() + 20_000;
  for (;;) {
    const messages = (await (await fetch(`${mailboxUrl}/messages.json?to=${encodeURIComponent(to)}`)).json()) as Message[];
    const found = messages.find((message) => subject.test(message.subject));
    if (found) return found;
    if (Date.now() > deadline) throw new Error(`No letter to ${to} about ${subject}; there are: ${messages.map((message) => message.subject).join(" | ")}`);
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

/** The address in a letter that begins with a path of ours. */
export function linkIn({ text }: Message, pathStart: string): string {
  const found = [...text.matchAll(/https?:\/\/\S+/g)].map(([link]) => link.replace(/[.,)]+$/, "")).find((link) => new URL(link).pathname.startsWith(pathStart));
  if (!found) throw new Error(`No link to ${pathStart} in:\n${text}`);
  return found;
}
