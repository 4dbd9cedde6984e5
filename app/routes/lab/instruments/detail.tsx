import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, Link, redirect } from "react-router";
import { CheckCard } from "#app/components/instruments/check-card.tsx";
import { ChecksTable } from "#app/components/instruments/checks-table.tsx";
import { CorrectionsCard } from "#app/components/instruments/corrections-card.tsx";
import { InstrumentFields, type InstrumentFieldset } from "#app/components/instruments/instrument-fields.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { addDays, calendarDateIn } from "#app/domain/calendar-date.ts";
import { instrumentKindNames } from "#app/domain/instrument-kind.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { editInstrument } from "#app/features/instruments/edit-instrument.server.ts";
import { endCorrection } from "#app/features/instruments/end-correction.server.ts";
import { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { editInstrumentForm, endCorrectionForm, instrumentCheckForm } from "#app/features/instruments/instrument-forms.server.ts";
import { instrumentStatusNames } from "#app/features/instruments/instrument-kinds.ts";
import { recordInstrumentCheck } from "#app/features/instruments/record-instrument-check.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { listReferenceMaterials } from "#app/features/reference-materials/list-reference-materials.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/detail";

function instrumentIdOf(ref: string) {
  const id = idFromShortRef<"instrument">(ref);
  if (!id) throw data({ userMessage: "There is no such instrument." }, { status: 404 });
  return id;
}

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const instrument = await orResponse(getInstrument(ctx, instrumentIdOf(params.instrumentRef)));
  const canManage = isAllowed(ctx.roles, "instruments.manage");
  const today = calendarDateIn(ctx.now, ctx.laboratory.timeZone);
  return { instrument, timeZone: ctx.laboratory.timeZone, tomorrow: addDays(today, 1), usualNextDueOn: addDays(today, instrument.usualDays), canManage, references: canManage ? await listReferenceMaterials(ctx, { forKind: instrument.kind }) : [], requestId: newRequestId() };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "instruments.manage");
  const id = instrumentIdOf(params.instrumentRef);
  const formData = await request.formData();
  const intent = formData.get("intent") === "check" ? ("check" as const) : formData.get("intent") === "endCorrection" ? ("endCorrection" as const) : ("edit" as const);
  const answer = ({ data: { result }, init }: ReturnType<typeof formInvalid>) => data({ intent, result }, init ?? {});
  const done = async (text: string, tone: "done" | "caution" = "done") => redirect(`/lab/${params.labSlug}/instruments/${params.instrumentRef}`, { headers: { "Set-Cookie": await noticeHeader(text, tone) } });
  if (intent === "check") {
    const submission = parseWithZod(formData, { schema: instrumentCheckForm });
    if (submission.status !== "success") return answer(formInvalid(submission));
    try {
      const { isPassed } = await recordInstrumentCheck(ctx, id, submission.value);
      return done(isPassed ? "The check is passed." : "The check failed, so the instrument is out of service now. What was read on it since its last good check is on the recall list.", isPassed ? "done" : "caution");
    } catch (error) {
      return answer(formRefused(submission, error));
    }
  }
  if (intent === "endCorrection") {
    const submission = parseWithZod(formData, { schema: endCorrectionForm });
    if (submission.status !== "success") return answer(formInvalid(submission));
    try {
      await endCorrection(ctx, id, submission.value);
      return done("The correction has ended: readings are taken as the instrument shows them.");
    } catch (error) {
      return answer(formRefused(submission, error));
    }
  }
  const submission = parseWithZod(formData, { schema: editInstrumentForm });
  if (submission.status !== "success") return answer(formInvalid(submission));
  try {
    await editInstrument(ctx, id, submission.value);
    return done("The changes are saved.");
  } catch (error) {
    return answer(formRefused(submission, error));
  }
}

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `${(loaderData as { instrument?: { name: string } } | undefined)?.instrument?.name ?? "Instrument"} · Isogyre` }];

export default function InstrumentRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { instrument, timeZone, canManage } = loaderData;
  const base = `/lab/${params.labSlug}/instruments`;
  const resultOf = (intent: string) => (actionData?.intent === intent ? actionData.result : undefined);
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={base} className="text-ink-3">
            Instruments
          </Link>
        }
        title={instrument.name}
        note={[instrumentKindNames[instrument.kind], instrument.description, instrument.serial && `no. ${instrument.serial}`, instrument.location].filter(Boolean).join(", ")}
        actions={<Chip tone={instrument.status === "inService" ? "green" : instrument.status === "restricted" ? "straw" : "red"}>{instrumentStatusNames[instrument.status]}</Chip>}
      />
      {instrument.statusReason ? <p className="mb-4 text-ink-2">{instrument.statusReason}</p> : null}
      <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_26rem]">
        <div className="grid content-start gap-5">
          {instrument.outOfCheck || instrument.isRecalling ? (
            <Caution>
              {instrument.outOfCheck ? `${instrument.outOfCheck} Readings on it are marked, and none of them carries “identified”. ` : ""}
              {instrument.isRecalling ? (
                <>
                  Readings made before a failed check wait on the{" "}
                  <Link to={`${base}/recall`} className="underline">
                    recall list
                  </Link>
                  .
                </>
              ) : null}
            </Caution>
          ) : null}
          <Card title="Checks" id="checks">
            {instrument.checks.length === 0 ? (
              <EmptyState title="Never checked">{canManage ? "Read a reference whose value is known, and record it beside." : "A gemmologist records the first check."}</EmptyState>
            ) : (
              <ChecksTable checks={instrument.checks} timeZone={timeZone} />
            )}
          </Card>
          {instrument.unit ? <CorrectionsCard key={`correction-${instrument.corrections.length}`} {...{ instrument, timeZone, canManage }} workOutTo={`${base}/${instrument.ref}/correction`} lastResult={resultOf("endCorrection")} /> : null}
          {canManage ? <EditCard key={instrument.version} instrument={instrument} lastResult={resultOf("edit")} /> : null}
        </div>
        {canManage ? <CheckCard key={`check-${instrument.checks.length}`} {...loaderData} lastResult={resultOf("check")} /> : null}
      </div>
    </>
  );
}

type LoaderData = Route.ComponentProps["loaderData"];

function EditCard({ instrument, lastResult }: { instrument: LoaderData["instrument"]; lastResult: SubmissionResult<string[]> | undefined }) {
  const text = (value: number | null) => (value === null ? "" : String(value));
  const [form, fields] = useForm<Record<keyof InstrumentFieldset | "status" | "statusReason", string>>({
    id: "edit",
    lastResult,
    defaultValue: {
      kind: instrument.kind,
      name: instrument.name,
      description: instrument.description,
      serial: instrument.serial,
      location: instrument.location,
      scaleUnit: instrument.scaleUnit ?? "",
      checkDays: text(instrument.checkDays),
      resolution: text(instrument.resolution),
      standardUncertainty: text(instrument.standardUncertainty),
      upperLimit: text(instrument.upperLimit),
      prismIndex: text(instrument.prismIndex),
      status: instrument.status,
      statusReason: instrument.statusReason,
    },
  });
  return (
    <Card title="Change what is known of it" id="change">
      <CardBody>
        <Form method="post" {...getFormProps(form)}>
          <FormAlert errors={form.errors} id={form.errorId} />
          <input type="hidden" name="intent" value="edit" />
          {/* The newest version, not the one that was sent: whoever saves again after a conflict has read the sentence. */}
          <input type="hidden" name="version" value={instrument.version} />
          <InstrumentFields fields={fields as unknown as InstrumentFieldset} />
          <div className="mt-4 grid gap-4 sm:grid-cols-2">
            <SelectField key={fields.status.key} {...fieldProps(fields.status)} label="State" options={Object.entries(instrumentStatusNames).map(([value, label]) => ({ value, label }))} />
            <TextField key={fields.statusReason.key} {...fieldProps(fields.statusReason)} label="Why not in full service" isRequired={false} autoComplete="off" maxLength={300} />
          </div>
          <div className="mt-5">
            <Button>Save the changes</Button>
          </div>
        </Form>
      </CardBody>
    </Card>
  );
}
