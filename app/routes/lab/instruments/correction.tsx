import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, Link, redirect } from "react-router";
import { correctionWords, decimalsFor, signed } from "#app/components/instruments/correction-words.ts";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { FieldNotes } from "#app/components/ui/field-frame.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { RadioGroupField } from "#app/components/ui/choice-field.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { AppError } from "#app/domain/app-error.ts";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { idFromShortRef, shortRef } from "#app/domain/short-ref.ts";
import { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { correctionChoiceForm, startCorrectionForm } from "#app/features/instruments/instrument-forms.server.ts";
import { previewCorrection } from "#app/features/instruments/preview-correction.server.ts";
import { startCorrection } from "#app/features/instruments/start-correction.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/correction";

function instrumentIdOf(ref: string) {
  const id = idFromShortRef<"instrument">(ref);
  if (!id) throw data({ userMessage: "There is no such instrument." }, { status: 404 });
  return id;
}

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  await orResponse((async () => requireRole(ctx, "instruments.manage"))());
  const id = instrumentIdOf(params.instrumentRef);
  const instrument = await orResponse(getInstrument(ctx, id));
  const chosen = url.searchParams.getAll("checks");
  return {
    instrument: { name: instrument.name, ref: instrument.ref, unit: instrument.unit },
    checks: instrument.checks.filter(({ readingValue }) => readingValue !== null),
    chosen,
    model: url.searchParams.get("model") === "line" ? ("line" as const) : ("offset" as const),
    timeZone: ctx.laboratory.timeZone,
    requestId: newRequestId(),
    ...(chosen.length > 0 ? await workedOut(ctx, id, url.searchParams) : { preview: null, problem: null }),
  };
}

async function workedOut(ctx: Parameters<typeof previewCorrection>[0], id: Parameters<typeof previewCorrection>[1], query: URLSearchParams) {
  const submission = parseWithZod(query, { schema: correctionChoiceForm });
  if (submission.status !== "success") return { preview: null, problem: Object.values(submission.error ?? {}).flat()[0] ?? "Choose checks and a model." };
  try {
    const { points, residuals, ...fitted } = await previewCorrection(ctx, id, { checkIds: submission.value.checks, model: submission.value.model });
    return { preview: { ...fitted, points: points.map((point, at) => ({ ...point, ref: shortRef(point.id), residual: residuals[at]! })) }, problem: null };
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    return { preview: null, problem: error.userMessage };
  }
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "instruments.manage");
  const id = instrumentIdOf(params.instrumentRef);
  const submission = parseWithZod(await request.formData(), { schema: startCorrectionForm });
  if (submission.status !== "success") return formInvalid(submission);
  const { checks, ...rest } = submission.value;
  try {
    await startCorrection(ctx, id, { ...rest, checkIds: checks });
    return redirect(`/lab/${params.labSlug}/instruments/${params.instrumentRef}`, { headers: { "Set-Cookie": await noticeHeader("The correction is in force. Record a check with it: it is judged with the correction added.") } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Correction · Isogyre" }];

export default function CorrectionRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { instrument, checks, chosen, model, timeZone, preview, problem } = loaderData;
  const base = `/lab/${params.labSlug}/instruments/${instrument.ref}`;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={base} className="text-ink-3">
            {instrument.name}
          </Link>
        }
        title="Correction from the checks"
        note="What is added to a reading to bring it to the references’ values."
      />
      {checks.length === 0 ? (
        <Card>
          <EmptyState title="No checks to work from">A correction comes from what the instrument showed of references whose values are known.</EmptyState>
        </Card>
      ) : (
        <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_26rem]">
          <Card title="1. Choose the checks" note="those of one state of the instrument, at least two references for a line">
            <Form method="get" id="choose">
              <Table caption="Checks to work from, latest first">
                <thead>
                  <tr>
                    <HeaderCell>Use</HeaderCell>
                    <HeaderCell>Reference</HeaderCell>
                    <HeaderCell isNumber>Shown</HeaderCell>
                    <HeaderCell isNumber>Should be</HeaderCell>
                    <HeaderCell>Outcome</HeaderCell>
                    <HeaderCell>When</HeaderCell>
                  </tr>
                </thead>
                <tbody>
                  {checks.map((check) => (
                    <tr key={check.id}>
                      <Cell>
                        <label className="flex min-h-6 min-w-6 items-center pointer-coarse:min-h-11 pointer-coarse:min-w-11">
                          <input type="checkbox" name="checks" value={check.ref} defaultChecked={chosen.includes(check.ref)} aria-label={`Use the check with ${check.referenceMaterial} of ${formatInstant(check.checkedAt, timeZone)}`} className="size-4.5 accent-tint" />
                        </label>
                      </Cell>
                      <Cell>{check.referenceMaterial}</Cell>
                      <Cell isNumber>{check.readingText}</Cell>
                      <Cell isNumber>{check.nominalValue}</Cell>
                      <Cell>{check.isPassed ? "Passed" : "Failed"}</Cell>
                      <Cell className="whitespace-nowrap">{formatInstant(check.checkedAt, timeZone)}</Cell>
                    </tr>
                  ))}
                </tbody>
              </Table>
              <CardBody className="grid gap-3">
                <RadioGroupField
                  id="model"
                  name="model"
                  label="Correct by"
                  defaultValue={model}
                  options={[
                    { value: "offset", label: "an offset", hint: "The same amount over the whole scale." },
                    { value: "line", label: "a line", hint: "An amount that grows along the scale: a tilted or stretched one." },
                  ]}
                />
                <FieldNotes id="checks" errors={problem ? [problem] : []} />
                <div>
                  <Button look="quiet">Work it out</Button>
                </div>
              </CardBody>
            </Form>
          </Card>
          {preview ? <Start key={`${model}-${chosen.join()}`} {...loaderData} preview={preview} lastResult={actionData?.result} /> : null}
        </div>
      )}
    </>
  );
}

type LoaderData = Route.ComponentProps["loaderData"];
type StartProps = Omit<LoaderData, "preview"> & { preview: NonNullable<LoaderData["preview"]>; lastResult: SubmissionResult<string[]> | undefined };

function Start({ preview, chosen, model, requestId, checks, lastResult }: StartProps) {
  const [form, fields] = useForm<{ reason: string; checks: string[]; model: string }>({ id: "start-correction", lastResult });
  const { correction, widening, points, unit } = preview;
  const decimals = decimalsFor(correction.uOffset);
  const nameOf = (ref: string) => checks.find((check) => check.ref === ref)?.referenceMaterial ?? "";
  const isWithinNoise = Math.abs(correction.offset) < 2 * correction.uOffset && Math.abs(correction.slope) <= 2 * correction.uSlope;
  return (
    <Card title="2. What comes out" className="lg:sticky lg:top-4">
      <CardBody className="grid gap-4">
        <Facts
          rows={[
            { name: "Added", value: correctionWords(correction, unit), isMono: true },
            { name: "At the middle", value: `${signed(correction.offset, decimals)} ± ${correction.uOffset.toFixed(decimals)} at ${correction.centre.toFixed(3)}`, isMono: true },
            { name: "Scatter", value: widening > 1 ? `${widening.toFixed(1)} times what the uncertainties allow: they are widened by it.` : "Within the uncertainties." },
          ]}
        />
        <ul className="grid gap-1 text-sm">
          {points.map(({ ref, reading, nominal, residual }) => (
            <li key={ref} className="flex flex-wrap justify-between gap-x-3">
              <span>{nameOf(ref)}</span>
              <span className="font-mono">
                {reading} → {(nominal - residual).toFixed(decimals)}, left {signed(residual, decimals)}
              </span>
            </li>
          ))}
        </ul>
        {isWithinNoise ? <p className="text-sm text-straw">This is less than twice its own uncertainty: the checks do not show that a correction is needed.</p> : null}
        <Form method="post" {...getFormProps(form)} className="grid gap-3">
          <FormAlert errors={form.errors} id={form.errorId} />
          <FieldNotes id="start-checks" errors={[...(fields.checks.errors ?? []), ...(fields.model.errors ?? [])]} />
          <input type="hidden" name="requestId" value={requestId} />
          <input type="hidden" name="model" value={model} />
          {chosen.map((ref) => (
            <input key={ref} type="hidden" name="checks" value={ref} />
          ))}
          <TextField key={fields.reason.key} {...fieldProps(fields.reason)} label="Why" autoComplete="off" maxLength={300} hint="Scale knocked, new prism, after service." />
          <Button>Correct readings from now on</Button>
          <p className="text-[12.5px] text-ink-3">Readings made before stay as they are. What the instrument shows is kept beside every corrected figure, and the correction’s uncertainty is added to it.</p>
        </Form>
      </CardBody>
    </Card>
  );
}
