import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, Link, redirect } from "react-router";
import { ReferenceFields, type ReferenceFieldset } from "#app/components/instruments/reference-fields.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { checkboxProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { instrumentKindNames } from "#app/domain/instrument-kind.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { editReferenceMaterial } from "#app/features/reference-materials/edit-reference-material.server.ts";
import { getReferenceMaterial } from "#app/features/reference-materials/get-reference-material.server.ts";
import { editReferenceForm } from "#app/features/reference-materials/reference-forms.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/reference";

function referenceIdOf(ref: string) {
  const id = idFromShortRef<"referenceMaterial">(ref);
  if (!id) throw data({ userMessage: "There is no such reference." }, { status: 404 });
  return id;
}

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  return { reference: await orResponse(getReferenceMaterial(ctx, referenceIdOf(params.referenceRef))), canManage: isAllowed(ctx.roles, "instruments.manage") };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "instruments.manage");
  const id = referenceIdOf(params.referenceRef);
  const submission = parseWithZod(await request.formData(), { schema: editReferenceForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await editReferenceMaterial(ctx, id, submission.value);
    return redirect(`/lab/${params.labSlug}/instruments/references`, { headers: { "Set-Cookie": await noticeHeader("The changes are saved.") } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `${(loaderData as { reference?: { name: string } } | undefined)?.reference?.name ?? "Reference"} · Isogyre` }];

export default function ReferenceRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { reference, canManage } = loaderData;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`/lab/${params.labSlug}/instruments/references`} className="text-ink-3">
            References
          </Link>
        }
        title={reference.name}
        note={`checks a ${instrumentKindNames[reference.forKind].toLowerCase()}`}
        actions={reference.isRetired ? <Chip>Retired</Chip> : null}
      />
      <Card className="max-w-3xl">
        <CardBody>
          {canManage ? (
            <EditReference key={reference.version} reference={reference} lastResult={actionData?.result} />
          ) : (
            <Facts
              rows={[
                { name: "Value", value: reference.nominalValue === null ? reference.expectedText : `${reference.nominalValue} ± ${reference.limitValue}` },
                { name: "Source", value: reference.source },
                { name: "Condition", value: [reference.condition, reference.conditionSeenOn ? formatCalendarDate(reference.conditionSeenOn) : ""].filter(Boolean).join(", ") },
              ]}
            />
          )}
        </CardBody>
      </Card>
    </>
  );
}

type LoaderData = Route.ComponentProps["loaderData"];

function EditReference({ reference, lastResult }: { reference: LoaderData["reference"]; lastResult: NonNullable<Route.ComponentProps["actionData"]>["result"] | undefined }) {
  const text = (value: number | null) => (value === null ? "" : String(value));
  const [form, fields] = useForm<Record<keyof ReferenceFieldset | "isRetired", string>>({
    id: "edit-reference",
    lastResult,
    defaultValue: {
      name: reference.name,
      forKind: reference.forKind,
      unit: reference.unit ?? "",
      nominalValue: text(reference.nominalValue),
      standardUncertainty: text(reference.standardUncertainty),
      limitValue: text(reference.limitValue),
      expectedText: reference.expectedText,
      source: reference.source,
      condition: reference.condition,
      conditionSeenOn: reference.conditionSeenOn ?? "",
      isRetired: reference.isRetired ? "on" : "",
    },
  });
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-4">
      <FormAlert errors={form.errors} id={form.errorId} />
      {/* The newest version, not the one that was sent: whoever saves again after a conflict has read the sentence. */}
      <input type="hidden" name="version" value={reference.version} />
      <ReferenceFields fields={fields as unknown as ReferenceFieldset} />
      <CheckboxField key={fields.isRetired.key} {...checkboxProps(fields.isRetired)} label="Retired: no longer read" />
      <div>
        <Button>Save the changes</Button>
      </div>
    </Form>
  );
}
