import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form } from "react-router";
import { DeadLink } from "#app/components/accounts/dead-link.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { confirmForm } from "#app/features/accounts/account-forms.server.ts";
import { confirmEmail } from "#app/features/accounts/confirm-email.server.ts";
import { findSignUp } from "#app/features/accounts/find-sign-up.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { signedInRedirect } from "#app/web/signed-in-redirect.server.ts";
import type { Route } from "./+types/confirm-email";

export async function loader({ context, params }: Route.LoaderArgs) {
  const signUp = await findSignUp(context.get(appContext), params.token);
  return data({ signUp: signUp ?? null }, { status: signUp ? 200 : 404 });
}

// By a button, not by opening the link: mail scanners open links.
export async function action({ request, context, params }: Route.ActionArgs) {
  const app = context.get(appContext);
  const submission = parseWithZod(await request.formData(), { schema: confirmForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    const { userId, labSlug } = await confirmEmail(app, { token: params.token, ...submission.value });
    return await signedInRedirect(app, request, { userId, to: `/lab/${labSlug}/settings`, notice: "Your laboratory is open. Enter its letterhead, then look over the fees: they are examples." });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Confirm your address · Isogyre" }];

export default function ConfirmEmailRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { signUp } = loaderData;
  const [form, fields] = useForm<{ slug: string; prefix: string }>({ id: "confirm", lastResult: actionData?.result, defaultValue: { slug: signUp?.laboratory.slug, prefix: signUp?.laboratory.prefix } });
  if (!signUp) return <DeadLink again={{ to: "/sign-up", label: "Open a laboratory" }} />;
  return (
    <>
      <PageHeader title="Confirm your address" note={signUp.email} />
      <Card>
        <CardBody>
          <Form method="post" {...getFormProps(form)} className="grid gap-4">
            <FormAlert errors={form.errors} id={form.errorId} />
            <p>
              With this, <strong>{signUp.laboratory.name}</strong> is open and you are signed in. These two stay as they are from here on:
            </p>
            <div className="grid gap-4 sm:grid-cols-2">
              <TextField key={fields.slug.key} {...fieldProps(fields.slug)} label="Short name" hint="In addresses." isMono autoCapitalize="none" spellCheck={false} autoComplete="off" maxLength={40} />
              <TextField key={fields.prefix.key} {...fieldProps(fields.prefix)} label="Letters of your numbers" hint={`As in ${signUp.laboratory.prefix}-R-26-00001.`} isMono spellCheck={false} autoComplete="off" maxLength={6} />
            </div>
            <Button className="justify-self-start">Confirm and open the laboratory</Button>
          </Form>
        </CardBody>
      </Card>
    </>
  );
}
