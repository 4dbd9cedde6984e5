import path from "node:path";
import { startFakeMailbox } from "./mailbox/server.ts";
import { startFakeStripe } from "./stripe/server.ts";
import { startFakeUploadThing } from "./uploadthing/server.ts";

/**
 * The stand-ins that `npm start` asks for, in one process. Each is started when its port is set; the settings that the
 * application needs to talk to them go back over the channel to the parent, and when that closes all of them end.
 */
const { FAKE_FOLDER = ".data/fakes", STRIPE_PORT, UPLOADTHING_PORT, MAIL_PORT, MAILBOX_PORT, STRIPE_WEBHOOK_URL, STRIPE_WEBHOOK_SECRET } = process.env;
const running: { close: () => Promise<void> }[] = [];
const settings: Record<string, string> = {};

if (STRIPE_PORT) {
  const stripe = await startFakeStripe({
    port: Number(STRIPE_PORT),
    webhookSecret: STRIPE_WEBHOOK_SECRET,
    webhookUrl: STRIPE_WEBHOOK_URL,
    stateFile: path.join(FAKE_FOLDER, "stripe.json"),
  });
  running.push(stripe);
  Object.assign(settings, { STRIPE_API_URL: stripe.url, STRIPE_SECRET_KEY: stripe.secretKey, STRIPE_WEBHOOK_SECRET: stripe.webhookSecret });
}
if (UPLOADTHING_PORT) {
  const uploads = await startFakeUploadThing({ port: Number(UPLOADTHING_PORT), folder: path.join(FAKE_FOLDER, "uploads") });
  running.push(uploads);
  Object.assign(settings, { UPLOADTHING_TOKEN: uploads.token, UPLOADTHING_API_URL: uploads.url, UPLOADTHING_INGEST_URL: uploads.url, UPLOADTHING_FILE_URL: uploads.url });
}
if (MAIL_PORT) {
  const mailbox = await startFakeMailbox({ port: Number(MAILBOX_PORT ?? 0), smtpPort: Number(MAIL_PORT), folder: path.join(FAKE_FOLDER, "mail") });
  running.push(mailbox);
  Object.assign(settings, { SMTP_URL: mailbox.smtpUrl, MAILBOX_URL: mailbox.url });
}

let isStopping = false;
async function stop(): Promise<void> {
  if (isStopping) return;
  isStopping = true;
  for (const fake of running) await fake.close();
  process.exit(0);
}
for (const signal of ["SIGTERM", "SIGINT", "SIGHUP"] as const) process.on(signal, () => void stop());
process.on("disconnect", () => void stop());
process.send?.({ settings });
