import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect } from "react-router";
import { ClientFields, type ClientFieldset } from "#app/components/clients/client-fields.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { shortRef } from "#app/domain/short-ref.ts";
import { createClientForm } from "#app/features/clients/client-forms.server.ts";
import { createClient } from "#app/features/clients/create-client.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/new";

export async function loader({ context }: Route.LoaderArgs) {
  await orResponse((async () => requireRole(context.get(labContext), "clients.manage"))());
  return { requestId: newRequestId() };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "clients.manage");
  const submission = parseWithZod(await request.formData(), { schema: createClientForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    const id = await createClient(ctx, submission.value);
    return redirect(`/lab/${params.labSlug}/clients/${shortRef(id)}`, { headers: { "Set-Cookie": await noticeHeader(`${submission.value.name} is entered.`) } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "New client · Isogyre" }];

export default function NewClientRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const [form, fields] = useForm<Record<keyof ClientFieldset | "requestId", string>>({ lastResult: actionData?.result, defaultValue: { requestId: loaderData.requestId } });
  return (
    <>
      <PageHeader title="New client" />
      <Form method="post" {...getFormProps(form)} className="max-w-3xl">
        <FormAlert errors={form.errors} id={form.errorId} />
        <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
        <Card>
          <CardBody className="pt-4">
            <ClientFields fields={fields as unknown as ClientFieldset} />
            <div className="mt-5 flex gap-2">
              <Button>Enter the client</Button>
              <LinkButton look="plain" to={`/lab/${params.labSlug}/clients`}>
                Back to the list
              </LinkButton>
            </div>
          </CardBody>
        </Card>
      </Form>
    </>
  );
}
