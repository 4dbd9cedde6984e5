import Stripe from "stripe";
import type { MailMessage, Services } from "#app/features/services.ts";
import { createPasswords } from "#app/integrations/passwords.server.ts";

const passwords = createPasswords();

/**
 * Doors that keep things in memory, for tests about something else. Tests about payment, uploads or mail pass services
 * whose real SDKs talk to the local fakes. The Stripe client points nowhere, so an unexpected call fails loudly.
 */
export function testServices(overrides: Partial<Services> = {}): Services & { sent: MailMessage[]; files: Map<string, Buffer> } {
  const sent: MailMessage[] = [];
  const files = new Map<string, Buffer>();
  return {
    sent,
    files,
    stripe: new Stripe("sk_test_nowhere", { host: "127.0.0.1", port: 9, protocol: "http", maxNetworkRetries: 0 }),
    stripeWebhookSecret: "whsec_test",
    uploads: {
      put: async ({ name, bytes }) => {
        const fileKey = `test-${files.size}-${name}`;
        files.set(fileKey, bytes);
        return { fileKey };
      },
      get: async (fileKey) => {
        const bytes = files.get(fileKey);
        if (!bytes) throw new Error(`no file ${fileKey}`);
        return bytes;
      },
      remove: async (fileKeys) => {
        for (const fileKey of fileKeys) files.delete(fileKey);
      },
    },
    mailer: { send: async (message) => void sent.push(message) },
    reportRenderer: {
      render: async (view) => {
        const { renderReport } = await import("#app/reports/render-report.ts");
        return renderReport(view as Parameters<typeof renderReport>[0]);
      },
    },
    passwords,
    publicOrigin: "http://127.0.0.1:3000",
    ...overrides,
  };
}
