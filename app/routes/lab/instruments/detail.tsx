import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, Link, redirect } from "react-router";
import { InstrumentFields, type InstrumentFieldset } from "#app/components/instruments/instrument-fields.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Chip, StateWord } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { addDays, calendarDateIn, formatInstant } from "#app/domain/calendar-date.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import { editInstrument } from "#app/features/instruments/edit-instrument.server.ts";
import { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { editInstrumentForm, instrumentCheckForm } from "#app/features/instruments/instrument-forms.server.ts";
import { instrumentKindNames, instrumentStatusNames } from "#app/features/instruments/instrument-kinds.ts";
import { recordInstrumentCheck } from "#app/features/instruments/record-instrument-check.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
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
  const today = calendarDateIn(ctx.now, ctx.laboratory.timeZone);
  return { instrument, timeZone: ctx.laboratory.timeZone, tomorrow: addDays(today, 1), inAWeek: addDays(today, 7), canManage: isAllowed(ctx.roles, "instruments.manage"), requestId: newRequestId() };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "instruments.manage");
  const id = instrumentIdOf(params.instrumentRef);
  const formData = await request.formData();
  const intent = formData.get("intent") === "check" ? ("check" as const) : ("edit" as const);
  const answer = ({ data: { result }, init }: ReturnType<typeof formInvalid>) => data({ intent, result }, init ?? {});
  const done = async (text: string, tone: "done" | "caution" = "done") => redirect(`/lab/${params.labSlug}/instruments/${params.instrumentRef}`, { headers: { "Set-Cookie": await noticeHeader(text, tone) } });
  if (intent === "check") {
    const submission = parseWithZod(formData, { schema: instrumentCheckForm });
    if (submission.status !== "success") return answer(formInvalid(submission));
    try {
      const { isPassed } = await recordInstrumentCheck(ctx, id, submission.value);
      return done(isPassed ? "The check is passed." : "The check failed, so the instrument is out of service now.", isPassed ? "done" : "caution");
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
  const resultOf = (intent: string) => (actionData?.intent === intent ? actionData.result : undefined);
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`/lab/${params.labSlug}/instruments`} className="text-ink-3">
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
          <Card title="Checks" id="checks">
            {instrument.checks.length === 0 ? (
              <EmptyState title="Never checked">{canManage ? "Read a reference whose value is known, and record it beside." : "A gemmologist records the first check."}</EmptyState>
            ) : (
              <Table caption="Checks, latest first">
                <thead>
                  <tr>
                    <HeaderCell>When</HeaderCell>
                    <HeaderCell>Reference</HeaderCell>
                    <HeaderCell isNumber>Shown</HeaderCell>
                    <HeaderCell isNumber>Should be</HeaderCell>
                    <HeaderCell>Outcome</HeaderCell>
                    <HeaderCell>Next</HeaderCell>
                    <HeaderCell>By</HeaderCell>
                  </tr>
                </thead>
                <tbody>
                  {instrument.checks.map((check) => (
                    <tr key={check.id}>
                      <Cell className="whitespace-nowrap">{formatInstant(check.checkedAt, timeZone)}</Cell>
                      <Cell>
                        {check.referenceMaterial}
                        {check.tempC === null ? null : <span className="text-ink-3">, {check.tempC} °C</span>}
                        {check.note ? <span className="block text-[12.5px] text-ink-3">{check.note}</span> : null}
                      </Cell>
                      <Cell isNumber>{check.readingText}</Cell>
                      <Cell isNumber>
                        {check.nominalValue} ± {check.limitValue}
                      </Cell>
                      <Cell>
                        <StateWord tone={check.isPassed ? "green" : "red"}>{check.isPassed ? "Passed" : "Failed"}</StateWord>
                      </Cell>
                      <Cell className="whitespace-nowrap">{formatWeekdayDate(check.nextDueOn)}</Cell>
                      <Cell>{check.checkedBy}</Cell>
                    </tr>
                  ))}
                </tbody>
              </Table>
            )}
          </Card>
          {canManage ? <EditCard key={instrument.version} instrument={instrument} lastResult={resultOf("edit")} /> : null}
        </div>
        {canManage ? <CheckCard key={instrument.checks.length} {...loaderData} lastResult={resultOf("check")} /> : null}
      </div>
    </>
  );
}

type LoaderData = Route.ComponentProps["loaderData"];

function CheckCard({ instrument, requestId, tomorrow, inAWeek, lastResult }: LoaderData & { lastResult: SubmissionResult<string[]> | undefined }) {
  const last = instrument.checks[0];
  const [form, fields] = useForm<Record<"requestId" | "referenceMaterial" | "nominal" | "reading" | "limit" | "tempC" | "nextDueOn" | "note", string>>({
    id: "check",
    lastResult,
    // The same reference as last time is likely; what the instrument shows is never filled in for anybody.
    defaultValue: { requestId, nextDueOn: inAWeek, referenceMaterial: last?.referenceMaterial, nominal: last ? String(last.nominalValue) : undefined, limit: last ? String(last.limitValue) : undefined },
  });
  const number = { inputMode: "decimal", isMono: true, autoComplete: "off", maxLength: 24 } as const;
  return (
    <Card title="Record a check" id="record-check" className="content-start self-start">
      <CardBody>
        <Form method="post" {...getFormProps(form)} className="grid gap-3.5">
          <FormAlert errors={form.errors} id={form.errorId} />
          <input type="hidden" name="intent" value="check" />
          <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
          <TextField key={fields.referenceMaterial.key} {...fieldProps(fields.referenceMaterial)} label="Reference" hint="A check weight, a piece of quartz." autoComplete="off" maxLength={120} />
          <div className="grid grid-cols-3 gap-3">
            <TextField key={fields.nominal.key} {...fieldProps(fields.nominal)} {...number} label="Its value" />
            <TextField key={fields.limit.key} {...fieldProps(fields.limit)} {...number} label="Limit ±" />
            <TextField key={fields.reading.key} {...fieldProps(fields.reading)} {...number} label="Shown" />
          </div>
          <div className="grid grid-cols-2 gap-3">
            <TextField key={fields.tempC.key} {...fieldProps(fields.tempC)} {...number} label="Temperature" unit="°C" isRequired={false} />
            <TextField key={fields.nextDueOn.key} {...fieldProps(fields.nextDueOn)} label="Next check" type="date" min={tomorrow} />
          </div>
          <TextField key={fields.note.key} {...fieldProps(fields.note)} label="Note" isRequired={false} autoComplete="off" maxLength={500} />
          <Button>Record the check</Button>
          <p className="text-[12.5px] text-ink-3">A check beyond its limit takes the instrument out of service at once.</p>
        </Form>
      </CardBody>
    </Card>
  );
}

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
