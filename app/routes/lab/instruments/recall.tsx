import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { FieldNotes } from "#app/components/ui/field-frame.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FilterNav } from "#app/components/ui/filter-nav.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { RadioGroupField } from "#app/components/ui/choice-field.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { TextAreaField } from "#app/components/ui/text-field.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { observationKindNames } from "#app/domain/reading.ts";
import { mostRecalled, recallDeedNames, recallDeeds, type RecallDeed } from "#app/domain/recall.ts";
import { reportStateNames } from "#app/domain/report-state.ts";
import { examinationStateNames } from "#app/domain/stone-state.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { listRecall } from "#app/features/recalls/list-recall.server.ts";
import { recallForm } from "#app/features/recalls/recall-forms.server.ts";
import { workRecall } from "#app/features/recalls/work-recall.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/recall";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const show = url.searchParams.get("show") === "done" ? ("done" as const) : ("open" as const);
  const readings = await orResponse(listRecall(ctx, { show }));
  return { readings: readings.slice(0, mostRecalled), hasMore: readings.length > mostRecalled, show, timeZone: ctx.laboratory.timeZone, canWork: isAllowed(ctx.roles, "instruments.manage") };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "instruments.manage");
  const submission = parseWithZod(await request.formData(), { schema: recallForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await workRecall(ctx, submission.value);
    const { length } = submission.value.items;
    return redirect(`/lab/${params.labSlug}/instruments/recall`, { headers: { "Set-Cookie": await noticeHeader(length === 1 ? "One reading is answered for." : `${length} readings are answered for.`) } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Recall list · Isogyre" }];

export default function RecallRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { readings, hasMore, show, canWork } = loaderData;
  const lab = `/lab/${params.labSlug}`;
  const base = `${lab}/instruments/recall`;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`${lab}/instruments`} className="text-ink-3">
            Instruments
          </Link>
        }
        title="Recall list"
        note="Readings made on an instrument that failed its next check, and the reports that rely on them."
        actions={
          <a href={`${base}.csv${show === "done" ? "?show=done" : ""}`} className="text-tint">
            Export CSV
          </a>
        }
      />
      <FilterNav label="Recall list" base={base} name="show" current={show === "done" ? "done" : null} choices={[{ value: null, label: "To be answered for" }, { value: "done", label: "Done" }]} />
      {hasMore ? <p className="mb-3 text-sm text-ink-2">The first {mostRecalled} are shown; the others follow as these are answered for.</p> : null}
      {readings.length === 0 ? (
        <Card>
          <EmptyState title={show === "done" ? "Nothing was called back yet" : "Nothing is called back"}>
            {show === "done" ? "What is done about readings of an instrument that failed a check is kept here, with who did it and when." : "When a check fails, what was read on that instrument since its last good check appears here."}
          </EmptyState>
        </Card>
      ) : show === "open" && canWork ? (
        <Work key={readings.map(({ stoneCode, sequence }) => `${stoneCode}/${sequence}`).join()} {...loaderData} lab={lab} lastResult={actionData?.result} />
      ) : (
        <Card>
          <Readings {...loaderData} lab={lab} chosen={null} />
        </Card>
      )}
    </>
  );
}

type LoaderData = Route.ComponentProps["loaderData"];

const deedHints: Readonly<Record<RecallDeed, string>> = {
  remeasured: "A later reading of the same kind, on an instrument in check, stands in its place.",
  accepted: "The failure cannot have mattered to it: say why, so that a colleague could follow it.",
  reportWithdrawn: "The report that relied on it was withdrawn, by an owner on the report’s page.",
};

function Work({ lab, lastResult, ...loaderData }: LoaderData & { lab: string; lastResult: SubmissionResult<string[]> | undefined }) {
  const [form, fields] = useForm<{ items: string[]; deed: string; reason: string }>({ id: "recall", lastResult });
  const typed = lastResult?.initialValue?.items;
  const chosen = typeof typed === "string" ? [typed] : Array.isArray(typed) ? typed.map(String) : [];
  return (
    <Form method="post" {...getFormProps(form)} className="grid items-start gap-5 xl:grid-cols-[minmax(0,1fr)_24rem]">
      <Card>
        <Readings {...loaderData} lab={lab} chosen={chosen} />
      </Card>
      <Card title="What was done" className="xl:sticky xl:top-4">
        <CardBody className="grid gap-3.5">
          <FormAlert errors={form.errors} id={form.errorId} />
          <FieldNotes id={fields.items.id} errors={Object.entries(form.allErrors).flatMap(([name, messages]) => (name.startsWith("items") ? messages : []))} />
          <RadioGroupField
            key={fields.deed.key}
            id={fields.deed.id}
            name={fields.deed.name}
            label="About the readings ticked"
            errors={fields.deed.errors}
            defaultValue={fields.deed.initialValue}
            options={recallDeeds.map((value) => ({ value, label: recallDeedNames[value], hint: deedHints[value] }))}
          />
          <TextAreaField key={fields.reason.key} {...fieldProps(fields.reason)} label="Reason" isRequired={false} rows={3} maxLength={1000} hint="Needed where readings are accepted." />
          <Button>Record it</Button>
          <p className="text-[12.5px] text-ink-3">Kept with your name and the time. A reading leaves the list in no other way.</p>
        </CardBody>
      </Card>
    </Form>
  );
}

function Readings({ readings, show, timeZone, lab, chosen }: LoaderData & { lab: string; /** Null where nothing can be ticked. */ chosen: readonly string[] | null }) {
  return (
    <Table caption={show === "done" ? "What was done, the latest first" : "Readings called back, the oldest failure first"}>
      <thead>
        <tr>
          {chosen ? (
            <HeaderCell>
              <span className="sr-only">Choose</span>
            </HeaderCell>
          ) : null}
          <HeaderCell>Stone</HeaderCell>
          <HeaderCell>Reading</HeaderCell>
          <HeaderCell>Instrument</HeaderCell>
          <HeaderCell>Reports</HeaderCell>
          <HeaderCell>{show === "done" ? "Done" : "State"}</HeaderCell>
        </tr>
      </thead>
      <tbody>
        {readings.map((reading) => {
          const value = `${reading.stoneCode}/${reading.sequence}`;
          return (
            <tr key={`${value} ${reading.done?.at.toISOString() ?? ""}`}>
              {chosen ? (
                <Cell>
                  <label className="flex min-h-6 min-w-6 items-center pointer-coarse:min-h-11 pointer-coarse:min-w-11">
                    <input type="checkbox" name="items" value={value} defaultChecked={chosen.includes(value)} aria-label={`Reading ${reading.sequence} of ${formatStoneCode(reading.stoneCode)}`} className="size-4.5 accent-tint" />
                  </label>
                </Cell>
              ) : null}
              <RowHeaderCell isMono to={`${lab}/stones/${reading.stoneCode}#reading-${reading.sequence}`}>
                {formatStoneCode(reading.stoneCode)}
              </RowHeaderCell>
              <Cell>
                no. {reading.sequence}, {observationKindNames[reading.kind].toLowerCase()} {reading.shown ? <span className="font-mono">{reading.shown}</span> : null}
                <span className="block text-[12.5px] text-ink-3">
                  {formatInstant(reading.observedAt, timeZone)}, {reading.observer}
                </span>
                {reading.isStruck ? <Chip tone="plain">struck since</Chip> : null}
              </Cell>
              <Cell>
                <span className="font-mono">{reading.instrument}</span>
                <span className="block text-[12.5px] text-ink-3">
                  failed on {reading.failedOn}, {formatInstant(reading.failedAt, timeZone)}
                </span>
              </Cell>
              <Cell>
                {reading.reports.length === 0 ? (
                  <span className="text-ink-3">none</span>
                ) : (
                  <ul className="grid gap-0.5">
                    {reading.reports.map(({ number, state }) => (
                      <li key={number}>
                        <Link to={`${lab}/reports/${number}`} className="font-mono text-tint">
                          {number}
                        </Link>{" "}
                        <span className={state === "issued" || state === "authorised" ? "font-medium text-red" : "text-ink-3"}>{reportStateNames[state].toLowerCase()}</span>
                      </li>
                    ))}
                  </ul>
                )}
              </Cell>
              <Cell>
                {reading.done ? (
                  <>
                    {recallDeedNames[reading.done.deed]}
                    {reading.done.reason ? <span className="block">{reading.done.reason}</span> : null}
                    <span className="block text-[12.5px] text-ink-3">
                      {reading.done.by}, {formatInstant(reading.done.at, timeZone)}
                    </span>
                  </>
                ) : (
                  <>
                    {examinationStateNames[reading.stoneState]}
                    {reading.remeasured.length > 0 ? <span className="block text-[12.5px] text-green">measured again: no. {reading.remeasured.join(", ")}</span> : null}
                  </>
                )}
              </Cell>
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}
