import { parseWithZod } from "@conform-to/zod/v4";
import { useState } from "react";
import { redirect } from "react-router";
import { CheckOffer } from "#app/components/bench/check-offer.tsx";
import { NewReading } from "#app/components/bench/new-reading.tsx";
import { ReadingsTable } from "#app/components/bench/readings-table.tsx";
import { StoneHeader } from "#app/components/bench/stone-header.tsx";
import { TestChoice } from "#app/components/bench/test-choice.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { isAllowed } from "#app/domain/permissions.ts";
import { observationKindNames, observationKinds, type ObservationKind } from "#app/domain/reading.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import type { ComposedReading } from "#app/features/readings/compose-reading.ts";
import { latestSize } from "#app/features/readings/latest-size.ts";
import { presentReadings } from "#app/features/readings/present-readings.ts";
import { readingForm } from "#app/features/readings/reading-forms.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/bench";

const checkName = (isSolePractice: boolean) => (isSolePractice ? "Self-check" : "Second check");

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const { readings, conclusion, check, instruments, ...bench } = await orResponse(getBench(ctx, params));
  // A checker works on a page of their own until they compare; nothing of the examination leaves the server before.
  if (bench.isCheckerBlind) throw redirect(`/lab/${params.labSlug}/stones/${params.stoneCode}/second-check`);
  const { state } = bench.stone;
  const mayCheck = isAllowed(ctx.roles, "secondChecks.do") && state === "concluded" && !check && (!bench.isInvolved || ctx.laboratory.isSolePractice);
  const isOffered = mayCheck && !bench.isInvolved && url.searchParams.get("show") !== "examination";
  const shown = isOffered ? null : readings;
  return {
    stone: bench.stone,
    condition: bench.stone.condition,
    checkName: checkName(ctx.laboratory.isSolePractice),
    size: latestSize(shown ?? []),
    readings: shown && presentReadings(shown, ctx.laboratory.timeZone),
    isOffered,
    mayCheck,
    check: isOffered ? null : check && { kind: check.kind, checker: check.checker, isCompared: check.comparedAt !== null, outcome: check.outcome, reason: check.reason },
    conclusion: isOffered ? null : conclusion && { version: conclusion.version, by: conclusion.by },
    instruments: isOffered ? [] : instruments,
    requestId: newRequestId(),
    can: {
      record: isAllowed(ctx.roles, "readings.record") && bench.stone.goodsState !== "released" && ["received", "examining", "returned"].includes(state),
      conclude: isAllowed(ctx.roles, "conclusions.propose") && ["examining", "returned"].includes(state),
      strikeAll: bench.isExaminer && ["examining", "returned"].includes(state),
      strikeOwn: isAllowed(ctx.roles, "readings.record") && ["examining", "returned"].includes(state),
      readConclusion: isAllowed(ctx.roles, "conclusions.read"),
    },
  };
}

export async function action({ request, context, params, url }: Route.ActionArgs) {
  const ctx = context.get(labContext);
  const submission = parseWithZod(await request.formData(), { schema: readingForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    const { sequence, warnings } = await recordReading(ctx, { ...submission.value, stoneCode: params.stoneCode });
    const notice = [`Reading ${sequence} is recorded.`, ...warnings].join(" ");
    return redirect(`${url.pathname}${url.search}`, { headers: { "Set-Cookie": await noticeHeader(notice, warnings.length > 0 ? "caution" : "done") } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction<typeof loader> = ({ params, loaderData }) => [{ title: `${params.stoneCode}${loaderData ? `, ${loaderData.stone.description}` : ""} · Isogyre` }];

export default function BenchRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, readings, can } = loaderData;
  const base = `/lab/${params.labSlug}/stones/${stone.code}`;
  return (
    <>
      <StoneHeader
        stone={stone}
        labSlug={params.labSlug}
        checkName={loaderData.checkName}
        size={loaderData.size}
        actions={
          <>
            {can.readConclusion && loaderData.conclusion ? <LinkButton to={`${base}/conclusion`}>Conclusion</LinkButton> : null}
            {can.conclude && !loaderData.conclusion ? <LinkButton to={`${base}/conclusion`} look="primary">Conclude</LinkButton> : null}
            {loaderData.check || loaderData.mayCheck ? <LinkButton to={`${base}/second-check`}>{loaderData.checkName}</LinkButton> : null}
          </>
        }
      />
      {loaderData.isOffered ? <CheckOffer base={base} /> : null}
      {readings ? <Examination {...{ loaderData, params, base }} lastResult={actionData?.result} readings={readings} /> : loaderData.isOffered ? null : <ForTheDesk condition={loaderData.condition} takeInTo={`/lab/${params.labSlug}/take-ins/${stone.takeInNumber}`} />}
    </>
  );
}
