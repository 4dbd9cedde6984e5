import type { SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { useCallback, useMemo, useState } from "react";
import { Link, redirect } from "react-router";
import { uuidv7 } from "uuidv7";
import { HiddenCandidatesCard, HideCandidatesForm } from "#app/components/bench/hide-candidates-card.tsx";
import { RankingViewForm } from "#app/components/bench/ranking-view-form.tsx";
import { BenchKeys } from "#app/components/bench/bench-keys.tsx";
import { BenchQueries } from "#app/components/bench/bench-queries.tsx";
import { keptPage } from "#app/components/bench/outbox/kept-page.ts";
import { deedsOf, keepDeed } from "#app/components/bench/outbox/outbox.ts";
import { useOutbox } from "#app/components/bench/outbox/use-outbox.ts";
import { useOfflineBench } from "#app/components/bench/outbox/use-offline-bench.ts";
import { strikesThatWait } from "#app/components/bench/strikes-that-wait.ts";
import { useWaitingReadings } from "#app/components/bench/use-waiting-readings.ts";
import { WaitingReadings } from "#app/components/bench/waiting-readings.tsx";
import { NextTestsCard } from "#app/components/bench/next-tests-card.tsx";
import { FollowStone } from "#app/components/bench/follow-stone.tsx";
import { CheckOffer } from "#app/components/bench/check-offer.tsx";
import { NewReading } from "#app/components/bench/new-reading.tsx";
import { ReadingsTable } from "#app/components/bench/readings-table.tsx";
import { StoneHeader } from "#app/components/bench/stone-header.tsx";
import { TestChoice } from "#app/components/bench/test-choice.tsx";
import { LiveCandidates } from "#app/components/bench/live-candidates.tsx";
import { isWithoutLine, noteLine } from "#app/components/layout/line-state.ts";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { isAllowed } from "#app/domain/permissions.ts";
import { observationKinds, type ObservationKind } from "#app/domain/reading.ts";
import { nextTestsForStone } from "#app/features/identification/next-tests-for-stone.ts";
import { absorptionLines } from "#app/features/species/absorption-lines.ts";
import { loadSpeciesTable } from "#app/features/species/load-species-table.server.ts";
import { rankStone } from "#app/features/identification/rank-stone.server.ts";
import { readingsAsOf, type RankingView } from "#app/features/identification/readings-as-of.ts";
import { planFromSearch, planLeft, planSearch } from "#app/features/readings/reading-plan.ts";
import { readingDraftFromForm } from "#app/features/readings/reading-draft.ts";
import { shortRef } from "#app/domain/short-ref.ts";
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
function viewOf(url: URL): RankingView {
  const at = Number(url.searchParams.get("at") || Number.NaN);
  return { atSequence: Number.isSafeInteger(at) ? at : null, areStruckCounted: url.searchParams.get("struck") === "on" };
}
const isLookedBack = ({ atSequence, areStruckCounted }: RankingView) => atSequence !== null || areStruckCounted;
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
  const view = viewOf(url);
  const compare = [...new Set(url.searchParams.getAll("compare").filter(Boolean))].slice(0, 2);
  const prior = url.searchParams.get("prior") === "even" ? ("even" as const) : ("prevalence" as const);
  const plan = planFromSearch(url.searchParams);
  const left = planLeft(plan, examined ?? []);
  const ranking = examined && (await rankStone(ctx, { readings: readingsAsOf(examined, view), compare, prior })).bench;
  const areCandidatesHidden = url.searchParams.get("candidates") === "hidden" && (plan.kinds.length === 0 || left.length > 0);
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
    view: { ...view, compare, prior, standing: isLookedBack(view) && examined ? readingsAsOf(examined, view).filter(({ strike }) => !strike).map(({ sequence }) => sequence) : null },
    next: examined && nextTestsForStone(examined, loadSpeciesTable().table, { ...bench.stone, consents: bench.consents, instruments }),
    test: testOf(url),
    areCandidatesHidden,
    plan: { ...plan, left },
    spectrum: {
      view: spectrumViewOf(request),
      candidates: testOf(url) === "spectroscope" && ranking?.hasEvidence && !areCandidatesHidden ? absorptionLines(loadSpeciesTable().table, ranking.candidates.map(({ speciesId }) => speciesId)) : [],
      taken: url.searchParams.getAll("line").join(", ").slice(0, 500),
    },
    requestId: newRequestId(),
    person: shortRef(ctx.actorId),
    /** Shown from the device, without the line. */
    isKept: false,
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

/** Without the line, the page as it was last shown, with the test that was asked for. */
export async function clientLoader({ serverLoader, request, params }: Route.ClientLoaderArgs) {
  try {
    const loaded = await serverLoader();
    noteLine("up");
    return loaded;
  } catch (error) {
    if (isWithoutLine(error)) noteLine("down");
    const kept = isWithoutLine(error) ? await keptPage<Awaited<ReturnType<typeof serverLoader>>>(params.labSlug, params.stoneCode) : null;
    if (!kept) throw error;
    return { ...kept, test: testOf(new URL(request.url)), requestId: uuidv7(), isKept: true };
  }
}

/** Sends a reading, or keeps it on the device: without the line, and behind what waits there already. */
export async function clientAction({ serverAction, request, params }: Route.ClientActionArgs) {
  const form = await request.clone().formData();
  const kept = await keptPage<Route.ComponentProps["loaderData"]>(params.labSlug, params.stoneCode);
  if (!kept) return serverAction();
  const whose = { person: kept.person, labSlug: params.labSlug };
  if ((await deedsOf(whose, params.stoneCode)).every(({ refusal }) => refusal !== null)) {
    try {
      return await serverAction();
    } catch (error) {
      if (!isWithoutLine(error)) throw error;
      noteLine("down");
    }
  }
  const instrument = kept.instruments.find(({ ref }) => ref === form.get("instrument")) ?? null;
  const { composeAnyReading } = await import("#app/features/readings/compose-any-reading.ts");
  const { problems } = composeAnyReading(readingDraftFromForm(form), instrument);
  const fields = [...form].flatMap(([name, value]): Array<[string, string]> => (typeof value === "string" ? [[name, value]] : []));
  if (problems) return { result: { status: "error", initialValue: Object.fromEntries(fields), error: problems } as SubmissionResult<string[]> };
  await keepDeed({ id: String(form.get("requestId")), kind: "reading", ...whose, stoneCode: params.stoneCode, fields, madeAt: new Date().toISOString() });
  return null;
}

export const meta: Route.MetaFunction = ({ params, loaderData }) => [{ title: `${params.stoneCode}${loaderData ? `, ${loaderData.stone.description}` : ""} · Isogyre` }];

export default function BenchRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, conclusion, check, can, mayCheck, checkName: nameOfCheck } = loaderData;
  const base = `/lab/${params.labSlug}/stones/${stone.code}`;
  useOfflineBench({ labSlug: params.labSlug, stoneCode: params.stoneCode, person: loaderData.person, loaderData: loaderData.readings && !loaderData.isKept ? loaderData : null });
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
        <BenchQueries>
        <Examination
          {...loaderData}
          labSlug={params.labSlug}
          readings={loaderData.readings}
          ranking={loaderData.ranking}
          base={base}
          mapHref={`/lab/${params.labSlug}/species/map?stone=${stone.code}${mayCheck ? "&show=examination" : ""}`}
          lastResult={actionData?.result}
        />
        </BenchQueries>
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
type ExaminationProps = Omit<LoaderData, "readings" | "ranking"> & { labSlug: string; readings: NonNullable<LoaderData["readings"]>; ranking: NonNullable<LoaderData["ranking"]>; base: string; mapHref: string; lastResult: SubmissionResult<string[]> | undefined };

function Examination({ labSlug, person, isKept, readings, ranking, next, instruments, test, requestId, areCandidatesHidden, plan, view, spectrum, can, condition, stone, base, mapHref, lastResult }: ExaminationProps) {
  const examined = useMemo(() => readings.filter(({ isOfSecondCheck }) => !isOfSecondCheck), [readings]);
  const canStrike = ({ isOwn, isOfSecondCheck }: (typeof readings)[number]) => !isOfSecondCheck && (can.strikeAll || (can.strikeOwn && isOwn));
  const latestStrikeable = readings.findLast((reading) => !reading.strike && canStrike(reading));
  const struckCount = readings.filter(({ strike }) => strike).length;
  const hidden = areCandidatesHidden ? `&candidates=hidden${planSearch(plan)}` : "";
  const standing = useMemo(() => (view.standing ? examined.filter(({ sequence }) => view.standing!.includes(sequence)).map((reading) => ({ ...reading, strike: null })) : examined), [examined, view.standing]);
  const whose = useMemo(() => ({ person, labSlug }), [person, labSlug]);
  const deeds = useOutbox(whose, stone.code);
  const waiting = useWaitingReadings(deeds, instruments);
  // One's own saved reading clears the form; a refused one keeps what was typed, and a colleague's leaves it alone.
  const formKey = `${test}-${readings.filter(({ isOwn }) => isOwn).length}-${deeds.length}`;
  const [draft, setDraft] = useState<{ formKey: string; reading: ComposedReading | null }>({ formKey: "", reading: null });
  const onDraft = useCallback((reading: ComposedReading | null) => setDraft({ formKey, reading }), [formKey]);
  const typed = draft.formKey === formKey ? draft.reading : null;
  const strikesWaiting = useMemo(() => strikesThatWait(deeds), [deeds]);
  const counted = useMemo(() => [...standing.filter(({ sequence }) => !strikesWaiting.has(sequence)), ...waiting.filter(({ isStruck }) => !isStruck).map(({ reading }) => ({ ...reading, sequence: null }))], [standing, waiting, strikesWaiting]);
  return (
    <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_24rem] xl:grid-cols-[minmax(0,1fr)_30.75rem]">
      <FollowStone base={base} mark={stone.version} />
      <BenchKeys concludeTo={can.conclude ? `${base}/conclusion` : null} strikeTo={latestStrikeable ? `${base}/readings/${latestStrikeable.sequence}/strike` : null} />
      <div className="grid min-w-0 gap-5">
        {isKept ? <Caution>No line. This page is as it was last shown here; what you record waits on this device and is sent, in order, when the line is back.</Caution> : null}
        {can.record ? (
          <Card title="New reading" note="kept as you type it, never overwritten">
            <TestChoice current={test} hrefOf={(kind) => `?test=${kind}${hidden}`} />
            <NewReading
              key={formKey}
              {...{ kind: test, instruments, requestId, lastResult, areCandidatesHidden, spectrum }}
              onDraft={onDraft}
            />
          </Card>
        ) : null}
        <WaitingReadings deeds={deeds} readings={waiting} whose={whose} stoneCode={stone.code} />
        <Card
          title="Readings"
          note={`${readings.length - struckCount} kept, ${struckCount} struck`}
          aside={
            <span className="no-print flex flex-wrap gap-x-4 text-sm">
              <Link to={`${base}/inclusions`} className="text-ink-2">
                Inclusions
              </Link>
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
            strikesWaiting={strikesWaiting}
            strikeHere={
              isKept || deeds.length > 0
                ? (sequence, reason) => keepDeed({ id: uuidv7(), kind: "strike", ...whose, stoneCode: stone.code, fields: [["reason", reason], ["named.sequence", String(sequence)]], madeAt: new Date().toISOString() })
                : undefined
            }
            canStrike={canStrike}
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
          <HiddenCandidatesCard planLeft={plan.left} showHref={`?test=${test}`} />
        ) : (
          <>
            {view.standing ? <Caution>The ranking {view.atSequence === null ? "with what the struck readings said" : `as it was after reading ${view.atSequence}`}. <Link to={`?test=${test}`} preventScrollReset className="text-link">Back to now</Link></Caution> : null}
            <LiveCandidates saved={ranking} readings={counted} compare={view.compare} prior={view.prior} typed={can.record && !view.standing ? typed : null} />
            {next && can.record ? <NextTestsCard next={next} hrefOf={(kind) => `?test=${kind}`} /> : null}
            <RankingViewForm
              key={`${view.prior}-${view.atSequence}-${view.areStruckCounted}-${view.compare.join("-")}`}
              test={test}
              moments={examined.map(({ sequence, when, detail }) => ({ sequence, when, kind: detail.kind }))}
              hasStruck={struckCount > 0}
              view={view}
              comparable={ranking.comparable}
              compare={view.compare}
              prior={view.prior}
              isOpen={view.standing !== null || view.compare.length > 0 || view.prior === "even"}
            />
            {can.record ? <HideCandidatesForm test={test} lastSequence={readings.at(-1)?.sequence ?? 0} /> : null}
            <p className="no-print px-1 text-sm">
              <Link to={mapHref} className="text-link">
                On the index and density map
              </Link>
            </p>
          </>
        )}
      </div>
    </div>
  );
}
