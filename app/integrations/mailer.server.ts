import nodemailer from "nodemailer";

type Message = { to: { address: string; name: string }; subject: string; html: string; text: string };

export function createMailer({ smtpUrl, from }: { smtpUrl: string; from: string }) {
  const isLoopback = ["127.0.0.1", "localhost", "[::1]"].includes(new URL(smtpUrl).hostname);
  const transport = nodemailer.createTransport(
    // A loopback server has no certificate; anything further away must speak TLS.
    { url: smtpUrl, pool: true, maxConnections: 2, ignoreTLS: isLoopback, requireTLS: !isLoopback && smtpUrl.startsWith("smtp:"), connectionTimeout: 10_000, socketTimeout: 20_000 },
    { from },
  );
  return {
    async send({ to, subject, html, text }: Message): Promise<void> {
      await transport.sendMail({ to, subject, html, text, headers: { "Auto-Submitted": "auto-generated" } });
    },
    close: () => transport.close(),
  };
}
