import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect } from "react-router";
import { ReferenceFields, type ReferenceFieldset } from "#app/components/instruments/reference-fields.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { instrumentKindNames } from "#app/domain/instrument-kind.ts";
import { scaleUnitSigns } from "#app/domain/instrument-scale.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { addReferenceMaterial } from "#app/features/reference-materials/add-reference-material.server.ts";
import { listReferenceMaterials } from "#app/features/reference-materials/list-reference-materials.server.ts";
import { addReferenceForm } from "#app/features/reference-materials/reference-forms.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/references";

export async function loader({ context }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  return { references: await orResponse(listReferenceMaterials(ctx)), canManage: isAllowed(ctx.roles, "instruments.manage"), requestId: newRequestId() };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "instruments.manage");
  const submission = parseWithZod(await request.formData(), { schema: addReferenceForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await addReferenceMaterial(ctx, submission.value);
    return redirect(`/lab/${params.labSlug}/instruments/references`, { headers: { "Set-Cookie": await noticeHeader(`${submission.value.name} is on the list.`) } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "References · Isogyre" }];

export default function ReferencesRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { references, canManage } = loaderData;
  const base = `/lab/${params.labSlug}/instruments`;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={base} className="text-ink-3">
            Instruments
          </Link>
        }
        title="References"
        note="Pieces whose value or look is known, and where it is known from."
      />
      <div className="grid items-start gap-5 xl:grid-cols-[minmax(0,1fr)_28rem]">
        <Card>
          {references.length === 0 ? (
            <EmptyState title="No references yet">A quartz, a synthetic spinel and a check weight are where most begin.</EmptyState>
          ) : (
            <Table caption="References by name">
              <thead>
                <tr>
                  <HeaderCell>Name</HeaderCell>
                  <HeaderCell>Checks a</HeaderCell>
                  <HeaderCell isNumber>Value</HeaderCell>
                  <HeaderCell>Source</HeaderCell>
                  <HeaderCell hideBelow="md">Condition</HeaderCell>
                </tr>
              </thead>
              <tbody>
                {references.map((reference) => (
                  <tr key={reference.ref}>
                    <RowHeaderCell to={`${base}/references/${reference.ref}`}>{reference.name}</RowHeaderCell>
                    <Cell>
                      {instrumentKindNames[reference.forKind]}
                      {reference.isRetired ? <span className="block text-[12.5px] text-ink-3">retired</span> : null}
                    </Cell>
                    <Cell isNumber>
                      {reference.nominalValue === null ? <span className="font-sans whitespace-normal">{reference.expectedText}</span> : `${reference.nominalValue} ± ${reference.limitValue} ${reference.unit ? scaleUnitSigns[reference.unit] : ""}`}
                      {reference.standardUncertainty ? <span className="block text-[12.5px] text-ink-3">u {reference.standardUncertainty}</span> : null}
                    </Cell>
                    <Cell>{reference.source}</Cell>
                    <Cell hideBelow="md">
                      {reference.condition}
                      {reference.conditionSeenOn ? <span className="block text-[12.5px] text-ink-3">seen {formatCalendarDate(reference.conditionSeenOn)}</span> : null}
                    </Cell>
                  </tr>
                ))}
              </tbody>
            </Table>
          )}
        </Card>
        {canManage ? <AddCard key={references.length} requestId={loaderData.requestId} lastResult={actionData?.result} /> : null}
      </div>
    </>
  );
}

type AddCardProps = { requestId: string; lastResult: NonNullable<Route.ComponentProps["actionData"]>["result"] | undefined };

function AddCard({ requestId, lastResult }: AddCardProps) {
  const [form, fields] = useForm<Record<keyof ReferenceFieldset | "requestId", string>>({ id: "add-reference", lastResult, defaultValue: { requestId } });
  return (
    <Card title="Add a reference">
      <CardBody>
        <Form method="post" {...getFormProps(form)} className="grid gap-4">
          <FormAlert errors={form.errors} id={form.errorId} />
          <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
          <ReferenceFields fields={fields as unknown as ReferenceFieldset} />
          <Button>Add it</Button>
        </Form>
      </CardBody>
    </Card>
  );
}
