import { openDb, type OpenDb } from "#app/db/client.server.ts";
import { readEnv, type Env } from "#app/env.server.ts";
import { renderInProcess } from "#app/features/reports/render-in-process.server.ts";
import type { Services } from "#app/features/services.ts";
import { createMailer } from "#app/integrations/mailer.server.ts";
import { createPasswords } from "#app/integrations/passwords.server.ts";
import { createReportRenderer } from "#app/integrations/report-renderer.server.ts";
import { createStripe } from "#app/integrations/stripe.server.ts";
import { createUploads } from "#app/integrations/uploads.server.ts";

type Runtime = OpenDb & { env: Env; services: Services };
let runtime: Runtime | undefined;

/** What one process shares: the pool and the doors to outside services. Opened when first asked for. */
export function getRuntime(): Runtime {
  if (runtime) return runtime;
  const env = readEnv();
  const services: Services = {
    stripe: createStripe({ secretKey: env.STRIPE_SECRET_KEY, apiUrl: env.STRIPE_API_URL }),
    stripeWebhookSecret: env.STRIPE_WEBHOOK_SECRET,
    uploads: createUploads({
      token: env.UPLOADTHING_TOKEN,
      apiUrl: env.UPLOADTHING_API_URL,
      ingestUrl: env.UPLOADTHING_INGEST_URL,
      fileUrl: env.UPLOADTHING_FILE_URL,
    }),
    mailer: createMailer({ smtpUrl: env.SMTP_URL, from: env.MAIL_FROM }),
    reportRenderer: createReportRenderer({ renderInProcess }),
    passwords: createPasswords(),
    publicOrigin: env.PUBLIC_ORIGIN,
  };
  runtime = { ...openDb(env.DATABASE_URL), env, services };
  return runtime;
}

export function runtimeEnv(): Env {
  return getRuntime().env;
}
