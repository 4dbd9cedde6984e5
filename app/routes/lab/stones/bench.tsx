import type { SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { useMemo, useState } from "react";
import { Link, redirect } from "react-router";
import { NextTestsCard } from "#app/components/bench/next-tests-card.tsx";
import { FollowStone } from "#app/components/bench/follow-stone.tsx";
import { CheckOffer } from "#app/components/bench/check-offer.tsx";
import { NewReading } from "#app/components/bench/new-reading.tsx";
import { ReadingsTable } from "#app/components/bench/readings-table.tsx";
import { StoneHeader } from "#app/components/bench/stone-header.tsx";
import { TestChoice } from "#app/components/bench/test-choice.tsx";
import { LiveCandidates } from "#app/components/bench/live-candidates.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { isAllowed } from "#app/domain/permissions.ts";
import { observationKinds, type ObservationKind } from "#app/domain/reading.ts";
import { nextTestsForStone } from "#app/features/identification/next-tests-for-stone.ts";
import { absorptionLines } from "#app/features/species/absorption-lines.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { rankStone } from "#app/features/identification/rank-stone.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import type { ComposedReading } from "#app/features/readings/compose-reading.ts";
import { latestSize } from "#app/features/readings/latest-size.ts";
import { presentReadings } from "#app/features/readings/present-readings.ts";
import { readingForm } from "#app/features/readings/reading-forms.server.ts";
import { recordReading } from "#app/features/readings/record-reading.server.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { spectrumViewOf } from "#app/web/spectrum-view.server.ts";
import type { Route } from "./+types/bench";

const testOf = (url: URL): ObservationKind => observationKinds.find((kind) => kind === url.searchParams.get("test")) ?? "refractometer";
const checkName = (isSolePractice: boolean) => (isSolePractice ? "Self-check" : "Second check");

export async function loader({ request, context, params, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const { readings, conclusion, check, instruments, ...bench } = await orResponse(getBench(ctx, params));
  // A checker works on a page of their own until they compare; nothing of the examination leaves the server before.
  if (bench.isCheckerBlind) throw redirect(`/lab/${params.labSlug}/stones/${params.stoneCode}/second-check`);
  const { state } = bench.stone;
  const mayCheck = isAllowed(ctx.roles, "secondChecks.do") && state === "concluded" && !check && (!bench.isInvolved || ctx.laboratory.isSolePractice);
  const isOffered = mayCheck && !bench.isInvolved && url.searchParams.get("show") !== "examination";
  const shown = isOffered ? null : readings;
  const examined = shown?.filter(({ isOfSecondCheck }) => !isOfSecondCheck) ?? null;
  const ranking = examined && (await rankStone(ctx, { readings: examined })).bench;
  const areCandidatesHidden = url.searchParams.get("candidates") === "hidden";
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
    ranking,
    next: examined && nextTestsForStone(examined, loadSpeciesTable().table, { ...bench.stone, consents: bench.consents, instruments }),
    test: testOf(url),
    areCandidatesHidden,
    spectrum: {
      view: spectrumViewOf(request),
      candidates: testOf(url) === "spectroscope" && ranking?.hasEvidence && !areCandidatesHidden ? absorptionLines(loadSpeciesTable().table, ranking.candidates.map(({ speciesId }) => speciesId)) : [],
      taken: url.searchParams.getAll("line").join(", ").slice(0, 500),
    },
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
  const ctx = labContextFor(context, "readings.record");
  const submission = parseWithZod(await request.formData(), { schema: readingForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    const { sequence, warnings } = await recordReading(ctx, { ...submission.value, stoneCode: params.stoneCode });
    const notice = [`Reading ${sequence} is recorded.`, ...warnings].join(" ");
    url.searchParams.delete("line"); // what was taken from a measured spectrum is recorded now
    return redirect(`${url.pathname}${url.search}`, { headers: { "Set-Cookie": await noticeHeader(notice, warnings.length > 0 ? "caution" : "done") } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = ({ params, loaderData }) => [{ title: `${params.stoneCode}${loaderData ? `, ${loaderData.stone.description}` : ""} · Isogyre` }];

export default function BenchRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, conclusion, check, can, mayCheck, checkName: nameOfCheck } = loaderData;
  const base = `/lab/${params.labSlug}/stones/${stone.code}`;
  return (
    <>
      <StoneHeader
        stone={stone}
        labSlug={params.labSlug}
        checkName={nameOfCheck}
        size={loaderData.size}
        actions={
          <>
            {can.conclude ? (
              <LinkButton to={`${base}/conclusion`} look="primary">
                {conclusion ? "Conclude again" : "Conclude"}
              </LinkButton>
            ) : conclusion && can.readConclusion ? (
              <LinkButton to={`${base}/conclusion`}>Conclusion</LinkButton>
            ) : null}
            {check || mayCheck ? <LinkButton to={`${base}/second-check`}>{nameOfCheck}</LinkButton> : null}
          </>
        }
      />
      {check?.outcome === "returned" && stone.state !== "concluded" ? (
        <Caution className="mb-5">
          The check by {check.checker} returned this stone: {check.reason}
        </Caution>
      ) : null}
      {loaderData.isOffered ? (
        <CheckOffer base={base} />
      ) : loaderData.readings && loaderData.ranking ? (
        <Examination
          {...loaderData}
          readings={loaderData.readings}
          ranking={loaderData.ranking}
          base={base}
          mapHref={`/lab/${params.labSlug}/species/map?stone=${stone.code}${mayCheck ? "&show=examination" : ""}`}
          lastResult={actionData?.result}
        />
      ) : (
        <Card title="Readings and conclusions" className="max-w-3xl">
          <CardBody>
            <p className="text-ink-2">They are for those who examine and value. Custody, the label and the receipt are with the take-in.</p>
            <p className="mt-3">
              <LinkButton to={`/lab/${params.labSlug}/take-ins/${stone.takeInNumber}`}>Take-in {stone.takeInNumber}</LinkButton>
            </p>
          </CardBody>
        </Card>
      )}
    </>
  );
}

type LoaderData = Route.ComponentProps["loaderData"];
type ExaminationProps = Omit<LoaderData, "readings" | "ranking"> & { readings: NonNullable<LoaderData["readings"]>; ranking: NonNullable<LoaderData["ranking"]>; base: string; mapHref: string; lastResult: SubmissionResult<string[]> | undefined };

function Examination({ readings, ranking, next, instruments, test, requestId, areCandidatesHidden, spectrum, can, condition, stone, base, mapHref, lastResult }: ExaminationProps) {
  const [typed, setTyped] = useState<ComposedReading | null>(null);
  const examined = useMemo(() => readings.filter(({ isOfSecondCheck }) => !isOfSecondCheck), [readings]);
  const struckCount = readings.filter(({ strike }) => strike).length;
  const hidden = areCandidatesHidden ? "&candidates=hidden" : "";
  return (
    <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_24rem] xl:grid-cols-[minmax(0,1fr)_30.75rem]">
      <FollowStone base={base} mark={stone.version} />
      <div className="grid min-w-0 gap-5">
        {can.record ? (
          <Card title="New reading" note="kept as you type it, never overwritten">
            <TestChoice current={test} hrefOf={(kind) => `?test=${kind}${hidden}`} />
            <NewReading
              // One's own saved reading clears the form; a refused one keeps what was typed, and a colleague's leaves it alone.
              key={`${test}-${readings.filter(({ isOwn }) => isOwn).length}`}
              {...{ kind: test, instruments, requestId, lastResult, areCandidatesHidden, spectrum }}
              onDraft={setTyped}
            />
          </Card>
        ) : null}
        <Card
          title="Readings"
          note={`${readings.length - struckCount} kept, ${struckCount} struck`}
          aside={
            <span className="no-print flex flex-wrap gap-x-4 text-sm">
              <Link to={`${base}/spectra`} className="text-ink-2">
                Measured spectra
              </Link>
              {readings.length > 0 ? (
                <Link to={`${base}/sheet`} className="text-ink-2">
                  Bench sheet
                </Link>
              ) : null}
            </span>
          }
        >
          <ReadingsTable
            readings={readings}
            strikeHref={(sequence) => `${base}/readings/${sequence}/strike`}
            canStrike={({ isOwn, isOfSecondCheck }) => !isOfSecondCheck && (can.strikeAll || (can.strikeOwn && isOwn))}
          />
        </Card>
        {condition ? (
          <p className="px-1 text-sm text-ink-2">
            Condition when taken in: {condition}
            {stone.isMounted ? `. Weight with the setting: ${stone.itemMass}.` : ""}
          </p>
        ) : null}
      </div>
      <div className="grid min-w-0 gap-5">
        {areCandidatesHidden ? (
          <Card title="Candidates" note="hidden while you read">
            <CardBody>
              <p className="text-ink-2">Readings made now are marked as made without candidates in view.</p>
              <p className="mt-3">
                <Link to={`?test=${test}`} preventScrollReset className="text-link">
                  Show the candidates
                </Link>
              </p>
            </CardBody>
          </Card>
        ) : (
          <>
            <LiveCandidates saved={ranking} readings={examined} typed={can.record ? typed : null} />
            {next && can.record ? <NextTestsCard next={next} hrefOf={(kind) => `?test=${kind}`} /> : null}
            <p className="no-print flex flex-wrap gap-x-5 gap-y-1 px-1 text-sm">
              <Link to={mapHref} className="text-link">
                On the index and density map
              </Link>
              {can.record ? (
                <Link to={`?test=${test}&candidates=hidden`} preventScrollReset className="text-link">
                  Hide the candidates while reading
                </Link>
              ) : null}
            </p>
          </>
        )}
      </div>
    </div>
  );
}
