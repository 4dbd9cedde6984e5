import type Stripe from "stripe";

/** A message that a mail server takes; both bodies say the same. */
export type MailMessage = Readonly<{ to: { address: string; name: string }; subject: string; html: string; text: string }>;

/** The outside world as the features see it: real SDKs behind thin, typed doors, passed in so that nothing is mocked. */
export type Services = Readonly<{
  stripe: Stripe;
  stripeWebhookSecret: string;
  uploads: Readonly<{
    put: (file: { name: string; mimeType: string; bytes: Buffer }) => Promise<{ fileKey: string }>;
    get: (fileKey: string) => Promise<Buffer>;
    remove: (fileKeys: readonly string[]) => Promise<void>;
  }>;
  mailer: Readonly<{ send: (message: MailMessage) => Promise<void> }>;
  reportRenderer: Readonly<{ render: (view: unknown) => Promise<Uint8Array> }>;
  /** bcrypt is slow on purpose and runs in a worker thread. */
  passwords: Readonly<{
    hash: (password: string) => Promise<string>;
    /** Takes as long for a missing hash as for a wrong password. */
    matches: (password: string, hash: string | null) => Promise<boolean>;
  }>;
  /** Scheme, host and port that people reach us at, without a slash at the end: goes into mails and QR codes. */
  publicOrigin: string;
}>;
