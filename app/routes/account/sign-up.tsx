import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect } from "react-router";
import { NewLaboratoryFields, type NewLaboratoryFieldset } from "#app/components/accounts/new-laboratory-fields.tsx";
import { newPasswordHint, PasswordField } from "#app/components/accounts/password-field.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { openLaboratoryForm, signUpForm } from "#app/features/accounts/account-forms.server.ts";
import { signUpLaboratory } from "#app/features/accounts/sign-up-laboratory.server.ts";
import { asNewLaboratory } from "#app/features/laboratories/laboratory-forms.server.ts";
import { openLaboratory } from "#app/features/laboratories/open-laboratory.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { appContext } from "#app/web/contexts.server.ts";
import { findAsker } from "#app/web/find-asker.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { laboratoryChoices } from "#app/web/laboratory-choices.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import type { Route } from "./+types/sign-up";

export async function loader({ request, context }: Route.LoaderArgs) {
  const asker = await findAsker(context.get(appContext), request);
  return { requestId: newRequestId(), askerName: asker?.name ?? null, choices: laboratoryChoices };
}

export async function action({ request, context }: Route.ActionArgs) {
  const app = context.get(appContext);
  const asker = await findAsker(app, request);
  const formData = await request.formData();
  if (asker) {
    const submission = parseWithZod(formData, { schema: openLaboratoryForm });
    if (submission.status !== "success") return formInvalid(submission);
    try {
      const { slug } = await openLaboratory(app, { ownerId: asker.userId, laboratory: asNewLaboratory(submission.value) });
      return redirect(`/lab/${slug}/settings`, { headers: { "Set-Cookie": await noticeHeader("The laboratory is open. Enter its letterhead, then look over the fees: they are examples.") } });
    } catch (error) {
      return formRefused(submission, error);
    }
  }
  const submission = parseWithZod(formData, { schema: signUpForm });
  if (submission.status !== "success") return formInvalid(submission, { hideFields: ["password"] });
  const { name, email, password, requestId, ...laboratory } = submission.value;
  try {
    await signUpLaboratory(app, { name, email, password, requestId, laboratory: asNewLaboratory(laboratory) });
    return redirect("/sign-up/sent");
  } catch (error) {
    return formRefused(submission, error, { hideFields: ["password"] });
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Open a laboratory · Isogyre" }];

type SignUpNames = "name" | "email" | "password" | "requestId" | keyof NewLaboratoryFieldset;

export default function SignUpRoute({ loaderData, actionData }: Route.ComponentProps) {
  const { requestId, askerName, choices } = loaderData;
  const [form, fields] = useForm<Record<SignUpNames, string>>({ id: "sign-up", lastResult: actionData?.result, defaultValue: { requestId, practice: "laboratory" } });
  return (
    <>
      <PageHeader title="Open a laboratory" note={askerName ? `A further one, owned by you, ${askerName}.` : "For a laboratory with its people, or for one person who values alone."} />
      <Form method="post" {...getFormProps(form)} className="grid gap-5">
        <FormAlert errors={form.errors} id={form.errorId} />
        {askerName ? null : (
          <Card title="You">
            <CardBody className="grid gap-4">
              <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
              <TextField key={fields.name.key} {...fieldProps(fields.name)} label="Your name" hint="As you sign reports." autoComplete="name" maxLength={120} />
              <TextField key={fields.email.key} {...fieldProps(fields.email)} label="E-mail address" hint="A letter with a link goes there; nothing is opened before you follow it." type="email" autoComplete="username" autoCapitalize="none" spellCheck={false} maxLength={254} />
              <PasswordField id={fields.password.id} name={fields.password.name} errors={fields.password.errors} label="Password" autoComplete="new-password" hint={newPasswordHint} />
            </CardBody>
          </Card>
        )}
        <Card title="The laboratory">
          <CardBody className="grid gap-4">
            <NewLaboratoryFields fields={fields as unknown as NewLaboratoryFieldset} {...choices} />
          </CardBody>
        </Card>
        <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
          <Button>{askerName ? "Open the laboratory" : "Send me the link"}</Button>
          <Link to={askerName ? "/laboratories" : "/sign-in"} className="text-tint">
            {askerName ? "Back to your laboratories" : "I have an account"}
          </Link>
        </div>
      </Form>
    </>
  );
}
