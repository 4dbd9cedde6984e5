import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { forgotPasswordForm } from "#app/features/accounts/account-forms.server.ts";
import { requestPasswordReset } from "#app/features/accounts/request-password-reset.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noSoonerThan } from "#app/web/no-sooner-than.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import type { Route } from "./+types/forgot-password";

/** Longer than writing a letter takes. */
const answerMs = 400;

export function loader() {
  return { requestId: newRequestId() };
}

export async function action({ request, context }: Route.ActionArgs) {
  const submission = parseWithZod(await request.formData(), { schema: forgotPasswordForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await noSoonerThan(answerMs, requestPasswordReset(context.get(appContext), submission.value));
    return redirect("/sign-in", { headers: { "Set-Cookie": await noticeHeader("If there is an account with this address, a letter with a link is on its way. The link works for an hour.") } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Forgot the password · Isogyre" }];

export default function ForgotPasswordRoute({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm<{ email: string; requestId: string }>({ id: "forgot", lastResult: actionData?.result, defaultValue: loaderData });
  return (
    <>
      <PageHeader title="Choose a new password" note="We send you a letter with a link. It works once, for an hour." />
      <Card>
        <CardBody>
          <Form method="post" {...getFormProps(form)} className="grid gap-4">
            <FormAlert errors={form.errors} id={form.errorId} />
            <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
            <TextField key={fields.email.key} {...fieldProps(fields.email)} label="E-mail address of the account" type="email" autoComplete="username" autoCapitalize="none" spellCheck={false} maxLength={254} />
            <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
              <Button>Send the letter</Button>
              <Link to="/sign-in" className="text-tint">
                Back to signing in
              </Link>
            </div>
          </Form>
        </CardBody>
      </Card>
    </>
  );
}
