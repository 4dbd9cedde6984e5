import { createStripe } from "#app/integrations/stripe.server.ts";
import { startFakeStripe } from "#fakes/stripe/server.ts";
import { testServices } from "./test-services.ts";

/** Services whose real Stripe SDK talks to a stand-in of this test's own. Events go nowhere until the test delivers them. */
export async function stripeServices() {
  const fake = await startFakeStripe({ retryDelaysMs: [] });
  const services = testServices({ stripe: createStripe({ secretKey: fake.secretKey, apiUrl: fake.url }), stripeWebhookSecret: fake.webhookSecret });
  return { fake, services, [Symbol.asyncDispose]: () => fake.close() };
}
