import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, Link, redirect } from "react-router";
import { ClientFields, type ClientFieldset } from "#app/components/clients/client-fields.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { serviceNames } from "#app/domain/take-in.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import { grantTermsForm, inviteClientForm, updateClientForm } from "#app/features/clients/client-forms.server.ts";
import { inviteClient } from "#app/features/accounts/invite-client.server.ts";
import { getClient } from "#app/features/clients/get-client.server.ts";
import { grantTerms } from "#app/features/clients/grant-terms.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { updateClient } from "#app/features/clients/update-client.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/detail";

function clientIdOf(ref: string) {
  const id = idFromShortRef<"client">(ref);
  if (!id) throw data({ userMessage: "There is no such client." }, { status: 404 });
  return id;
}

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const client = await orResponse(getClient(ctx, clientIdOf(params.clientRef)));
  return { client, requestId: newRequestId(), timeZone: ctx.laboratory.timeZone, canManage: isAllowed(ctx.roles, "clients.manage"), canGrant: isAllowed(ctx.roles, "clients.grantTerms"), canTakeIn: isAllowed(ctx.roles, "takeIn.create") };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "clients.manage");
  const clientId = clientIdOf(params.clientRef);
  const formData = await request.formData();
  const here = `/lab/${params.labSlug}/clients/${params.clientRef}`;
  if (formData.get("intent") === "terms") {
    const submission = parseWithZod(formData, { schema: grantTermsForm });
    if (submission.status !== "success") return formInvalid(submission);
    try {
      await grantTerms(ctx, clientId, submission.value);
    } catch (error) {
      return formRefused(submission, error);
    }
    return redirect(here, { headers: { "Set-Cookie": await noticeHeader(submission.value.terms === "account" ? "This client has account terms now." : "This client pays before issue again.") } });
  }
  if (formData.get("intent") === "invite") {
    const submission = parseWithZod(formData, { schema: inviteClientForm });
    if (submission.status !== "success") return formInvalid(submission);
    try {
      const { to } = await inviteClient(ctx, { clientId, requestId: submission.value.requestId });
      return redirect(here, { headers: { "Set-Cookie": await noticeHeader(`A link to their own pages is on its way to ${to}.`) } });
    } catch (error) {
      return formRefused(submission, error);
    }
  }
  const submission = parseWithZod(formData, { schema: updateClientForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await updateClient(ctx, clientId, submission.value);
  } catch (error) {
    return formRefused(submission, error);
  }
  return redirect(here, { headers: { "Set-Cookie": await noticeHeader("The changes are saved.") } });
}

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `${(loaderData as { client?: { name: string } } | undefined)?.client?.name ?? "Client"} · Isogyre` }];

export default function ClientRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { client, requestId, timeZone, canManage, canGrant, canTakeIn } = loaderData;
  const base = `/lab/${params.labSlug}`;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`${base}/clients`} className="text-ink-3">
            Clients
          </Link>
        }
        title={client.name}
        note={client.terms === "account" ? "Account terms" : "Pays before a report is issued"}
        actions={
          <>
            <LinkButton to={`${base}/stones?client=${client.ref}`}>Their stones</LinkButton>
            {canTakeIn ? (
              <LinkButton look="primary" to={`${base}/take-ins/new?client=${client.ref}`}>
                Take in from this client
              </LinkButton>
            ) : null}
          </>
        }
      />
      <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="grid content-start gap-5">
          <Card title="Take-ins" id="take-ins">
            {client.takeIns.length === 0 ? (
              <EmptyState title="Nothing taken in yet">What this client hands over is listed here.</EmptyState>
            ) : (
              <Table caption="Take-ins, latest first">
                <thead>
                  <tr>
                    <HeaderCell>Receipt</HeaderCell>
                    <HeaderCell>Received</HeaderCell>
                    <HeaderCell>As received</HeaderCell>
                    <HeaderCell>Services</HeaderCell>
                    <HeaderCell>Due</HeaderCell>
                  </tr>
                </thead>
                <tbody>
                  {client.takeIns.map((takeIn) => (
                    <tr key={takeIn.number}>
                      <RowHeaderCell isMono to={`${base}/take-ins/${takeIn.number}`}>
                        {takeIn.number}
                      </RowHeaderCell>
                      <Cell className="whitespace-nowrap">{formatInstant(takeIn.receivedAt, timeZone)}</Cell>
                      <Cell>{takeIn.items}</Cell>
                      <Cell>{takeIn.services.map((service) => serviceNames[service]).join(", ")}</Cell>
                      <Cell className="whitespace-nowrap">{formatWeekdayDate(takeIn.dueOn)}</Cell>
                    </tr>
                  ))}
                </tbody>
              </Table>
            )}
          </Card>
          {canManage ? <EditCard key={client.version} client={client} lastResult={actionData?.result} /> : null}
        </div>
        <div className="grid content-start gap-5">
          <Card title="Details" id="details">
            <CardBody>
              <Facts
                rows={[
                  { name: "Contact", value: client.contactName },
                  { name: "E-mail", value: client.email },
                  { name: "Telephone", value: client.phone },
                  { name: "Address", value: client.addressLines.length > 0 ? client.addressLines.map((line, index) => <span key={index} className="block">{line}</span>) : null },
                  { name: "Note", value: client.note ? <span className="whitespace-pre-wrap">{client.note}</span> : null },
                  { name: "Since", value: formatInstant(client.createdAt, timeZone) },
                ]}
              />
            </CardBody>
          </Card>
          {canManage ? (
            <Card title="Their own pages" id="own-pages">
              <CardBody>
                <p className="text-ink-2">With a link by e-mail the client can follow their items, pay, and fetch their reports.</p>
                {client.email ? (
                  <Form method="post" className="mt-3">
                    <input type="hidden" name="requestId" value={requestId} />
                    <Button look="quiet" name="intent" value="invite">
                      Send the link
                    </Button>
                  </Form>
                ) : (
                  <p className="mt-2 text-sm text-ink-3">There is no e-mail address yet. Add one first.</p>
                )}
              </CardBody>
            </Card>
          ) : null}
          <Card title="Terms" id="terms">
            <CardBody>
              <p className="text-ink-2">
                {client.terms === "account"
                  ? `Reports are issued and goods released before payment. Granted by ${client.termsGrantedBy ?? "an owner"}${client.termsGrantedAt ? `, ${formatInstant(client.termsGrantedAt, timeZone)}` : ""}.`
                  : "Reports are issued and goods released when the invoice is paid."}
              </p>
              {canGrant ? (
                <Form method="post" className="mt-3">
                  <input type="hidden" name="version" value={client.version} />
                  <input type="hidden" name="intent" value="terms" />
                  <Button look="quiet" name="terms" value={client.terms === "account" ? "prepaid" : "account"}>
                    {client.terms === "account" ? "End account terms" : "Give account terms"}
                  </Button>
                </Form>
              ) : (
                <p className="mt-2 text-[13px] text-ink-3">Only an owner changes the terms.</p>
              )}
            </CardBody>
          </Card>
        </div>
      </div>
    </>
  );
}

function EditCard({ client, lastResult }: { client: Route.ComponentProps["loaderData"]["client"]; lastResult: SubmissionResult<string[]> | undefined }) {
  const [form, fields] = useForm<Record<keyof ClientFieldset, string>>({
    lastResult,
    defaultValue: { name: client.name, contactName: client.contactName, email: client.email, phone: client.phone, addressLines: client.addressLines.join("\n"), note: client.note },
  });
  return (
    <Card title="Change the details" id="change">
      <CardBody>
        <Form method="post" {...getFormProps(form)}>
          <FormAlert errors={form.errors} id={form.errorId} />
          {/* The newest version, not the one that was sent: whoever saves again after a conflict has read the sentence. */}
          <input type="hidden" name="version" value={client.version} />
          <ClientFields fields={fields as unknown as ClientFieldset} />
          <div className="mt-5">
            <Button>Save the changes</Button>
          </div>
        </Form>
      </CardBody>
    </Card>
  );
}
