import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, Link } from "react-router";
import { DeadLink } from "#app/components/accounts/dead-link.tsx";
import { newPasswordHint, PasswordField } from "#app/components/accounts/password-field.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { AppError } from "#app/domain/app-error.ts";
import { acceptInvitation } from "#app/features/accounts/accept-invitation.server.ts";
import { acceptInvitationForm } from "#app/features/accounts/account-forms.server.ts";
import { findInvitation } from "#app/features/accounts/find-invitation.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { findAsker } from "#app/web/find-asker.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { signedInRedirect } from "#app/web/signed-in-redirect.server.ts";
import type { Route } from "./+types/invitation";

const hideFields = ["password"];

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const app = context.get(appContext);
  const [invitation, asker] = await Promise.all([findInvitation(app, params.token), findAsker(app, request)]);
  return data({ invitation: invitation ?? null, asker: asker ? { name: asker.name, email: asker.email } : null }, { status: invitation ? 200 : 404 });
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const app = context.get(appContext);
  const submission = parseWithZod(await request.formData(), { schema: acceptInvitationForm });
  if (submission.status !== "success") return formInvalid(submission, { hideFields });
  const input = submission.value;
  try {
    const asker = await findAsker(app, request);
    if (input.intent === "join" && !asker) throw new AppError("conflict", "You are not signed in any more. Sign in, and open the link again.");
    const by = input.intent === "join" ? { signedInAs: asker!.userId } : { name: input.name, password: input.password };
    const { userId, goTo } = await acceptInvitation(app, { token: params.token, by });
    return await signedInRedirect(app, request, { userId, to: goTo, notice: "Welcome. The invitation is accepted." });
  } catch (error) {
    return formRefused(submission, error, { hideFields });
  }
}

export const meta: Route.MetaFunction = () => [{ title: "An invitation · Isogyre" }];

export default function InvitationRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { invitation, asker } = loaderData;
  const [form, fields] = useForm<{ name: string; password: string }>({ id: "accept", lastResult: actionData?.result, defaultValue: { name: invitation?.name } });
  if (!invitation) return <DeadLink again={{ to: "/", label: "To the first page" }} />;
  const isForAsker = asker?.email.toLowerCase() === invitation.email;
  return (
    <>
      <PageHeader
        title={invitation.laboratoryName}
        note={invitation.kind === "staff" ? `invites you to the team, as: ${invitation.roleNames.join(", ")}.` : "has opened pages of your own for you: your items, invoices and reports."}
      />
      <Card>
        <CardBody>
          <FormAlert errors={form.errors} id={form.errorId} />
          {isForAsker ? (
            <Form method="post">
              <p className="mb-4">You are signed in as {asker?.name}.</p>
              <Button name="intent" value="join">
                Accept the invitation
              </Button>
            </Form>
          ) : asker ? (
            <div className="grid gap-3">
              <p>
                The invitation is for <strong>{invitation.email}</strong>, and you are signed in as {asker.email}. Sign out, then open the link of the letter again.
              </p>
              <form method="post" action="/sign-out">
                <Button look="quiet">Sign out</Button>
              </form>
            </div>
          ) : invitation.hasAccount ? (
            <div className="grid gap-3">
              <p>
                <strong>{invitation.email}</strong> has an account already. Sign in with it to accept.
              </p>
              <p>
                <LinkButton look="primary" to={`/sign-in?next=${encodeURIComponent(`/invitation/${params.token}`)}`}>
                  Sign in
                </LinkButton>
              </p>
            </div>
          ) : (
            <Form method="post" {...getFormProps(form)} className="grid gap-4">
              <p>
                An account is opened for <strong>{invitation.email}</strong>. Choose how you are called and a password.
              </p>
              <input type="text" name="username" autoComplete="username" value={invitation.email} readOnly tabIndex={-1} aria-hidden="true" className="sr-only" />
              <TextField key={fields.name.key} {...fieldProps(fields.name)} label="Your name" hint={invitation.kind === "staff" ? "As you sign reports." : undefined} autoComplete="name" maxLength={120} />
              <PasswordField id={fields.password.id} name={fields.password.name} errors={fields.password.errors} label="Password" autoComplete="new-password" hint={newPasswordHint} />
              <Button name="intent" value="newAccount" className="justify-self-start">
                Accept the invitation
              </Button>
            </Form>
          )}
        </CardBody>
      </Card>
      <p className="mt-4 text-sm text-ink-3">
        Do you not know this laboratory? Then leave the page; nothing happens. <Link to="/" className="text-tint">What Isogyre is</Link>
      </p>
    </>
  );
}
