import { Authenticator } from "remix-auth";
import { FormStrategy } from "remix-auth-form";
import type { UserId } from "#app/domain/ids.ts";
import type { AppContext } from "#app/features/app-context.ts";
import { verifyPassword } from "#app/features/accounts/verify-password.server.ts";
import { runtimeEnv } from "./runtime.server.ts";

/**
 * Who a sign-in form is from: e-mail address and password, checked by the account feature. The strategy reads a clone of
 * the request, so the body must not have been read before.
 */
export function authenticate(app: AppContext, request: Request): Promise<UserId> {
  const authenticator = new Authenticator<UserId>().use(
    new FormStrategy(({ form }) =>
      verifyPassword(app, { email: String(form.get("email") ?? ""), password: String(form.get("password") ?? ""), mayBeDemonstration: runtimeEnv().ISOGYRE_DEMO === "1" }),
    ),
    "form",
  );
  return authenticator.authenticate("form", request);
}
