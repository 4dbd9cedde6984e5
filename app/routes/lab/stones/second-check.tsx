import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect } from "react-router";
import { NewReading } from "#app/components/bench/new-reading.tsx";
import { ReadingsTable } from "#app/components/bench/readings-table.tsx";
import { StoneHeader } from "#app/components/bench/stone-header.tsx";
import { TestChoice } from "#app/components/bench/test-choice.tsx";
import { ComparisonCard } from "#app/components/conclusion/comparison-card.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { RadioGroupField } from "#app/components/ui/choice-field.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { natureNames, natures } from "#app/domain/conclusion.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { observationKinds, type ObservationKind } from "#app/domain/reading.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { presentReadings } from "#app/features/readings/present-readings.ts";
import { readingForm } from "#app/features/readings/reading-forms.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { requireRole } from "#app/features/require-role.ts";
import { compareReadings } from "#app/features/second-checks/compare-readings.ts";
import { compareSecondCheck } from "#app/features/second-checks/compare-second-check.server.ts";
import { decideSecondCheck } from "#app/features/second-checks/decide-second-check.server.ts";
import { ownReadingsProblem } from "#app/features/second-checks/own-readings-gate.ts";
import { compareCheckForm, decideCheckForm, startCheckForm } from "#app/features/second-checks/second-check-forms.server.ts";
import { startSecondCheck } from "#app/features/second-checks/start-second-check.server.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { spectrumViewOf } from "#app/web/spectrum-view.server.ts";
import type { Route } from "./+types/second-check";

export async function loader({ request, context, params, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const bench = await orResponse(readable(ctx, params.stoneCode));
  const { laboratory } = ctx;
  const { stone, check, conclusion, isInvolved, selfCheckFrom } = bench;
  const when = (instant: Date) => formatInstant(instant, laboratory.timeZone);
  const isSelf = check ? check.kind === "selfCheck" : laboratory.isSolePractice && isInvolved;
  const shared = { stone, checkName: isSelf ? "Self-check" : "Second check", isSelf, delayHours: laboratory.selfCheckDelayHours };
  const status = check && { checker: check.checker, isOwn: check.isOwn, started: when(check.startedAt), compared: check.comparedAt && when(check.comparedAt), outcome: check.outcome, reason: check.reason };

  if (bench.isCheckerBlind) {
    // Its readings are the checker's own: the rule sits where they are read. Nothing else of the examination goes in here.
    const own = bench.readings ?? [];
    return {
      ...shared,
      stage: "own" as const,
      status,
      own: { readings: presentReadings(own, laboratory.timeZone), instruments: bench.instruments, spectrum: { view: spectrumViewOf(request), candidates: [], taken: "" }, problem: ownReadingsProblem(own) ?? null, test: observationKinds.find((kind) => kind === url.searchParams.get("test")) ?? ("refractometer" as ObservationKind) },
      requestId: newRequestId(),
    };
  }
  if (check?.comparedAt && conclusion) {
    const readings = bench.readings ?? [];
    return {
      ...shared,
      stage: "compared" as const,
      status,
      comparison: { rows: compareReadings(readings.filter((one) => !one.isOfSecondCheck), readings.filter((one) => one.isOfSecondCheck)), found: conclusion.found, examiner: conclusion.by, own: check.own },
      canDecide: check.isOwn && check.outcome === null && stone.state === "concluded",
    };
  }
  const isWaiting = stone.state === "concluded" && !check;
  const whyNot = !isWaiting
    ? check
      ? `${check.checker} began the check on ${when(check.startedAt)} and has not compared yet.`
      : "This stone is not concluded, so there is nothing to check."
    : !isAllowed(ctx.roles, "secondChecks.do")
      ? "A gemmologist makes the check."
      : isInvolved && !laboratory.isSolePractice
        ? "You had a hand in this examination: the second check is somebody else's."
        : isInvolved && selfCheckFrom && ctx.now < selfCheckFrom
          ? `A self-check begins at least ${laboratory.selfCheckDelayHours} hours after the conclusion: from ${when(selfCheckFrom)}.`
          : null;
  return { ...shared, stage: "start" as const, status, whyNot, requestId: newRequestId() };
}

async function readable(ctx: Parameters<typeof getBench>[0], stoneCode: string) {
  requireRole(ctx, "conclusions.read");
  return getBench(ctx, { stoneCode });
}


export async function action({ request, context, params, url }: Route.ActionArgs) {
  const ctx = labContextFor(context, "secondChecks.do");
  const formData = await request.formData();
  const { stoneCode } = params;
  const page = `/lab/${params.labSlug}/stones/${stoneCode}/second-check`;
  const to = async (path: string, notice: string, tone?: "caution") => redirect(path, { headers: { "Set-Cookie": await noticeHeader(notice, tone) } });
  switch (formData.get("intent")) {
    case "start": {
      const submission = parseWithZod(formData, { schema: startCheckForm });
      if (submission.status !== "success") return formInvalid(submission);
      try {
        await startSecondCheck(ctx, { stoneCode, requestId: submission.value.requestId });
        return redirect(page);
      } catch (error) {
        return formRefused(submission, error);
      }
    }
    case "compare": {
      const submission = parseWithZod(formData, { schema: compareCheckForm });
      if (submission.status !== "success") return formInvalid(submission);
      try {
        await compareSecondCheck(ctx, { stoneCode, ...submission.value });
        return redirect(page);
      } catch (error) {
        return formRefused(submission, error);
      }
    }
    case "decide": {
      const submission = parseWithZod(formData, { schema: decideCheckForm });
      if (submission.status !== "success") return formInvalid(submission);
      try {
        await decideSecondCheck(ctx, { stoneCode, ...submission.value });
        return await to(`/lab/${params.labSlug}/stones/${stoneCode}`, submission.value.outcome === "agreed" ? "The check agrees with the conclusion." : "The stone goes back to its examiner with your reason.");
      } catch (error) {
        return formRefused(submission, error);
      }
    }
    default: {
      const submission = parseWithZod(formData, { schema: readingForm });
      if (submission.status !== "success") return formInvalid(submission);
      try {
        const { sequence, warnings } = await recordReading(ctx, { ...submission.value, stoneCode, isForSecondCheck: true });
        return await to(`${page}${url.search}`, [`Your reading is recorded as no. ${sequence}.`, ...warnings].join(" "), warnings.length > 0 ? "caution" : undefined);
      } catch (error) {
        return formRefused(submission, error);
      }
    }
  }
}

export const meta: Route.MetaFunction = ({ params, loaderData }) => [{ title: `${loaderData?.checkName ?? "Second check"} of ${params.stoneCode} · Isogyre` }];

export default function SecondCheckRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, checkName, isSelf, status } = loaderData;
  const base = `/lab/${params.labSlug}/stones/${stone.code}`;
  const lastResult = actionData?.result;
  return (
    <>
      <StoneHeader stone={stone} labSlug={params.labSlug} checkName={checkName} title={checkName} actions={loaderData.stage === "own" ? null : <LinkButton to={base}>To the bench</LinkButton>} />
      {isSelf ? (
        <p className="mb-4 max-w-prose text-ink-2">A self-check by the examiner, at least {loaderData.delayHours} hours later and without sight of the first result. It is not a second check, and a report says so.</p>
      ) : null}
      {loaderData.stage === "start" ? (
        <Card title={loaderData.whyNot === null ? "Begin without having seen" : "Not now"} className="max-w-3xl">
          <CardBody>
            {loaderData.whyNot === null ? (
              <StartForm requestId={loaderData.requestId} lastResult={lastResult} />
            ) : (
              <p className="text-ink-2">{loaderData.whyNot}</p>
            )}
          </CardBody>
        </Card>
      ) : loaderData.stage === "own" ? (
        <OwnReadings {...loaderData.own} requestId={loaderData.requestId} base={base} lastResult={lastResult} />
      ) : (
        <div className="grid items-start gap-5 xl:grid-cols-[minmax(0,1fr)_26rem]">
          <ComparisonCard {...loaderData.comparison} checker={status?.checker ?? ""} />
          {loaderData.canDecide ? (
            <DecideForm lastResult={lastResult} />
          ) : (
            <Card title={status?.outcome === "agreed" ? "The check agrees" : status?.outcome === "returned" ? "Returned to the examiner" : "Compared, not decided"}>
              <CardBody>
                <p className="text-ink-2">
                  {checkName} by {status?.checker}, compared on {status?.compared}.
                </p>
                {status?.reason ? <p className="mt-2">{status.reason}</p> : null}
              </CardBody>
            </Card>
          )}
        </div>
      )}
    </>
  );
}

type LastResult = SubmissionResult<string[]> | undefined;

function StartForm({ requestId, lastResult }: { requestId: string; lastResult: LastResult }) {
  const [form, fields] = useForm<{ requestId: string }>({ id: "start", lastResult, defaultValue: { requestId } });
  return (
    <Form method="post" {...getFormProps(form)}>
      <FormAlert errors={form.errors} id={form.errorId} />
      <p className="max-w-prose text-ink-2">
        You see the stone, what was said of it at take-in, and the instruments. The first readings, the candidates and the conclusion are kept from you until you have recorded an optical reading and one of another test, and said what you found.
      </p>
      <input type="hidden" name="intent" value="start" />
      <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
      <Button className="mt-4">Begin</Button>
    </Form>
  );
}

type OwnProps = Extract<Route.ComponentProps["loaderData"], { stage: "own" }>["own"] & { requestId: string; base: string; lastResult: LastResult };

function OwnReadings({ readings, instruments, spectrum, problem, test, requestId, base, lastResult }: OwnProps) {
  const [form, fields] = useForm<{ ownSpecies: string; ownNature: string }>({ id: "compare", lastResult });
  return (
    <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_24rem]">
      <div className="grid min-w-0 gap-5">
        <Card title="New reading" note="yours alone until you compare">
          <TestChoice current={test} hrefOf={(kind) => `?test=${kind}`} />
          <NewReading key={`${test}-${readings.length}`} {...{ kind: test, instruments, requestId, lastResult, spectrum }} areCandidatesHidden />
        </Card>
        <Card title="Your readings" note={`${readings.filter(({ strike }) => !strike).length} kept`}>
          <ReadingsTable readings={readings} strikeHref={(sequence) => `${base}/readings/${sequence}/strike`} canStrike={() => true} />
        </Card>
      </div>
      <Card title="What you found" note="said once, before you compare">
        <CardBody>
          <Form method="post" {...getFormProps(form)} className="grid gap-3.5">
            <FormAlert errors={form.errors} id={form.errorId} />
            <input type="hidden" name="intent" value="compare" />
            {problem ? <p className="text-sm text-straw">{problem}</p> : null}
            <TextField key={fields.ownSpecies.key} {...fieldProps(fields.ownSpecies)} label="Species, or “not determined”" autoComplete="off" maxLength={120} />
            <SelectField key={fields.ownNature.key} {...fieldProps(fields.ownNature)} label="Nature" emptyLabel="Choose" options={natures.map((value) => ({ value, label: natureNames[value] }))} />
            <div>
              <Button>Compare</Button>
            </div>
            <p className="text-xs text-ink-3">Afterwards your readings stay as they are.</p>
          </Form>
        </CardBody>
      </Card>
    </div>
  );
}

function DecideForm({ lastResult }: { lastResult: LastResult }) {
  const [form, fields] = useForm<{ outcome: string; reason: string }>({ id: "decide", lastResult });
  return (
    <Card title="Your decision">
      <CardBody>
        <Form method="post" {...getFormProps(form)} className="grid gap-3.5">
          <FormAlert errors={form.errors} id={form.errorId} />
          <input type="hidden" name="intent" value="decide" />
          <RadioGroupField
            key={fields.outcome.key}
            id={fields.outcome.id}
            name={fields.outcome.name}
            label="Outcome"
            errors={fields.outcome.errors}
            defaultValue={fields.outcome.initialValue}
            options={[
              { value: "agreed", label: "I agree with the conclusion", hint: "The stone goes on to its report." },
              { value: "returned", label: "I return it", hint: "The examiner takes it up again." },
            ]}
          />
          <TextAreaField key={fields.reason.key} {...fieldProps(fields.reason)} label="Reason" isRequired={false} maxLength={1000} hint="Needed when it goes back." />
          <div>
            <Button>Decide</Button>
          </div>
        </Form>
      </CardBody>
    </Card>
  );
}
