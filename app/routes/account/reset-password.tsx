import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form } from "react-router";
import { DeadLink } from "#app/components/accounts/dead-link.tsx";
import { newPasswordHint, PasswordField } from "#app/components/accounts/password-field.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { newPasswordForm } from "#app/features/accounts/account-forms.server.ts";
import { findEmailToken } from "#app/features/accounts/find-email-token.server.ts";
import { landingPath } from "#app/features/accounts/landing-path.server.ts";
import { resetPassword } from "#app/features/accounts/reset-password.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { signedInRedirect } from "#app/web/signed-in-redirect.server.ts";
import type { Route } from "./+types/reset-password";

const hideFields = ["password"];

export async function loader({ context, params }: Route.LoaderArgs) {
  const found = await findEmailToken(context.get(appContext), { token: params.token, purposes: ["resetPassword"] });
  return data({ email: found?.email ?? null }, { status: found ? 200 : 404 });
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const app = context.get(appContext);
  const submission = parseWithZod(await request.formData(), { schema: newPasswordForm });
  if (submission.status !== "success") return formInvalid(submission, { hideFields });
  try {
    const userId = await resetPassword(app, { token: params.token, password: submission.value.password });
    return await signedInRedirect(app, request, { userId, to: await landingPath(app, userId), notice: "The password is changed. Everywhere else you are signed out." });
  } catch (error) {
    return formRefused(submission, error, { hideFields });
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Choose a new password · Isogyre" }];

export default function ResetPasswordRoute({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm<{ password: string }>({ id: "reset", lastResult: actionData?.result });
  if (!loaderData.email) return <DeadLink again={{ to: "/forgot-password", label: "Ask for a new letter" }} />;
  return (
    <>
      <PageHeader title="Choose a new password" note="Everywhere you are signed in now, you will be signed out." />
      <Card>
        <CardBody>
          <Form method="post" {...getFormProps(form)} className="grid gap-4">
            <FormAlert errors={form.errors} id={form.errorId} />
            <input type="text" name="username" autoComplete="username" value={loaderData.email} readOnly tabIndex={-1} aria-hidden="true" className="sr-only" />
            <PasswordField id={fields.password.id} name={fields.password.name} errors={fields.password.errors} label="New password" autoComplete="new-password" hint={newPasswordHint} />
            <Button className="justify-self-start">Set the password and sign in</Button>
          </Form>
        </CardBody>
      </Card>
    </>
  );
}
