import { AppError } from "#app/domain/app-error.ts";
import { handleStripeEvent, largestEventBytes } from "#app/features/payments/handle-stripe-event.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { readTextUpTo } from "#app/web/read-text-up-to.server.ts";
import type { Route } from "./+types/stripe";

export async function action({ request, context }: Route.ActionArgs) {
  // The raw body: parsing before the signature is checked would check something else.
  const rawBody = await readTextUpTo(request, largestEventBytes);
  if (rawBody === undefined) return new Response("too large\n", { status: 413 });
  try {
    const outcome = await handleStripeEvent(context.get(appContext), { rawBody, signature: request.headers.get("stripe-signature") });
    return Response.json({ received: true, outcome });
  } catch (error) {
    if (error instanceof AppError && error.code === "invalid_input") return Response.json({ error: error.userMessage }, { status: 400 });
    // Anything else is a 500, so that the event is delivered again.
    throw error;
  }
}

export function loader() {
  return new Response("POST only\n", { status: 405, headers: { Allow: "POST" } });
}
