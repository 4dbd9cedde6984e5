import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { useRef } from "react";
import { Form, redirect, useNavigation } from "react-router";
import { moveOnByEnter } from "#app/components/bench/move-on-by-enter.ts";
import { useFirstField } from "#app/components/bench/use-first-field.ts";
import { CandidatesCard } from "#app/components/bench/candidates-card.tsx";
import { StoneHeader } from "#app/components/bench/stone-header.tsx";
import { ConclusionCard } from "#app/components/conclusion/conclusion-card.tsx";
import { ConclusionFields, type ConclusionShape } from "#app/components/conclusion/conclusion-fields.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { NatureCard } from "#app/components/conclusion/nature-card.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { CardSection } from "#app/components/ui/card-section.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { treatmentCodes } from "#app/domain/conclusion.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { observationKindNames } from "#app/domain/reading.ts";
import { conclusionForm } from "#app/features/identification/conclusion-forms.server.ts";
import { getConclusion, type ConclusionView } from "#app/features/identification/get-conclusion.server.ts";
import { proposeConclusion } from "#app/features/identification/propose-conclusion.server.ts";
import { natureOfStone } from "#app/features/identification/nature-of-stone.ts";
import { listSpeciesNames, rankStone } from "#app/features/identification/rank-stone.server.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { latestSize } from "#app/features/readings/latest-size.ts";
import { presentReadings } from "#app/features/readings/present-readings.ts";
import { isFigures, readingSeenText, readingValueText } from "#app/features/readings/reading-words.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/conclusion";

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const [bench, conclusion] = await orResponse(Promise.all([getBench(ctx, params), getConclusion(ctx, params)]));
  const { timeZone, isSolePractice } = ctx.laboratory;
  const readings = (bench.readings ?? []).filter(({ isOfSecondCheck }) => !isOfSecondCheck);
  const canConclude = isAllowed(ctx.roles, "conclusions.propose") && ["examining", "returned"].includes(bench.stone.state);
  return {
    stone: bench.stone,
    checkName: isSolePractice ? "Self-check" : "Second check",
    size: latestSize(readings),
    conclusion: conclusion ? { ...conclusion, concludedWhen: formatInstant(conclusion.concludedAt, timeZone) } : null,
    form: canConclude
      ? {
          requestId: newRequestId(),
          speciesNames: listSpeciesNames(),
          ...(await rankedWithNature(ctx, readings)),
          readings: presentReadings(readings.filter(({ strike }) => !strike), timeZone),
          startFrom: startFrom(conclusion, { isMounted: bench.stone.isMounted }),
        }
      : null,
  };
}

async function rankedWithNature(ctx: Parameters<typeof rankStone>[0], readings: NonNullable<Awaited<ReturnType<typeof getBench>>["readings"]>) {
  const ranking = (await rankStone(ctx, { readings })).bench;
  return { ranking, nature: natureOfStone(readings, ranking) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "conclusions.propose");
  const submission = parseWithZod(await request.formData(), { schema: conclusionForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await proposeConclusion(ctx, { ...submission.value, stoneCode: params.stoneCode });
    return redirect(`/lab/${params.labSlug}/stones/${params.stoneCode}/conclusion`, {
      headers: { "Set-Cookie": await noticeHeader(`Concluded. The stone waits for its ${ctx.laboratory.isSolePractice ? "self-check" : "second check"}.`) },
    });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Conclusion on ${params.stoneCode} · Isogyre` }];

export default function ConclusionRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, conclusion, form } = loaderData;
  const base = `/lab/${params.labSlug}/stones/${stone.code}`;
  return (
    <>
      <StoneHeader stone={stone} labSlug={params.labSlug} checkName={loaderData.checkName} size={loaderData.size} title="Conclusion" actions={<LinkButton to={base}>Back to the bench</LinkButton>} />
      {form ? (
        <Propose key={form.startFrom.requestKey} {...{ form, stone }} lastResult={actionData?.result} />
      ) : conclusion ? (
        <div className="max-w-4xl">
          <ConclusionCard conclusion={conclusion} />
        </div>
      ) : (
        <Card>
          <EmptyState title="Nothing is concluded yet" action={<LinkButton to={base}>Open the bench</LinkButton>}>
            A gemmologist concludes once two independent kinds of evidence were recorded.
          </EmptyState>
        </Card>
      )}
    </>
  );
}

type LoaderData = Route.ComponentProps["loaderData"];
type ProposeProps = { form: NonNullable<LoaderData["form"]>; stone: LoaderData["stone"]; lastResult: NonNullable<Route.ComponentProps["actionData"]>["result"] | undefined };

function Propose({ form: { requestId, speciesNames, ranking, nature, readings, startFrom }, stone, lastResult }: ProposeProps) {
  const [form, fields] = useForm<ConclusionShape>({ id: "conclusion", lastResult, defaultValue: { ...startFrom.values, requestId } });
  const element = useRef<HTMLFormElement>(null);
  useFirstField(element);
  const navigation = useNavigation();
  return (
    <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_24rem] xl:grid-cols-[minmax(0,1fr)_30.75rem]">
      <Card title="Propose a conclusion" note="a person concludes; the ranking only proposes">
        <Form method="post" {...getFormProps(form)} ref={element} onKeyDown={moveOnByEnter}>
          <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
          {/* The newest version, not the one that was sent: whoever sends again after a conflict has looked at the readings. */}
          <input type="hidden" name="version" value={stone.version} />
          {form.errors || Object.keys(form.allErrors).length > 0 ? (
            <div className="px-4.5 pt-1 sm:px-5">
              <FormAlert errors={form.errors ?? ["This conclusion cannot be drawn yet. The reasons stand beside their fields."]} id={form.errorId} />
            </div>
          ) : null}
          <ConclusionFields fields={fields} speciesNames={speciesNames} />
          <CardSection>
            <Button busyLabel={navigation.state === "submitting" && "Concluding"}>Conclude</Button>
          </CardSection>
        </Form>
      </Card>
      <div className="grid min-w-0 gap-5 lg:sticky lg:top-4">
        <Card title="Readings that stand">
          <CardBody>
            {readings.length > 0 ? (
              <ul className="grid gap-1.5 text-sm">
                {readings.map((reading) => (
                  <li key={reading.sequence}>
                    <span className="text-ink-3">no. {reading.sequence} </span>
                    {observationKindNames[reading.detail.kind]}{" "}
                    <span className={reading.quality !== "noResult" && isFigures(readingValueText(reading)) ? "font-mono" : ""}>{reading.quality === "noResult" ? `no reading: ${reading.noResultReason}` : readingValueText(reading)}</span> <span className="text-ink-2">{readingSeenText(reading)}</span>
                    {reading.doubt ? <span className="block text-xs font-medium text-red">{reading.doubt.text} It cannot carry “identified”.</span> : null}
                  </li>
                ))}
              </ul>
            ) : (
              <p className="text-ink-2">None. A conclusion needs two independent kinds of evidence.</p>
            )}
          </CardBody>
        </Card>
        <NatureCard nature={nature} />
        <CandidatesCard ranking={ranking} />
      </div>
    </div>
  );
}

/** The last conclusion as it was, where there is one to think again about; else nothing but what the take-in knows. */
function startFrom(previous: ConclusionView | null, { isMounted }: { isMounted: boolean }): { requestKey: string; values: Omit<ConclusionShape, "requestId" | "version"> & { version: string } } {
  const said = new Map(previous?.treatments.map((finding) => [finding.code, finding]));
  return {
    requestKey: String(previous?.version ?? 0),
    values: {
      version: "",
      speciesName: previous?.speciesName ?? "",
      variety: previous?.variety ?? "",
      nature: previous?.nature ?? "",
      natureEvidence: previous?.natureEvidence ?? "",
      confidence: previous?.confidence ?? "",
      treatments: treatmentCodes.map((code) => ({ code, status: said.get(code)?.status ?? "", extent: said.get(code)?.extent ?? "", evidence: said.get(code)?.evidence ?? "" })),
      evidence: previous?.evidence ?? "",
      limits: previous ? [...previous.limits] : ["benchOnly", ...(isMounted ? ["mounted"] : [])],
      rejected: Array.from({ length: Math.max(4, (previous?.rejected.length ?? 0) + 1) }, (_, at) => ({ row: String(at), name: previous?.rejected[at]?.name ?? "", because: previous?.rejected[at]?.because ?? "" })),
      contradictionsExplained: previous?.contradictionsExplained ?? "",
      description: previous?.description ?? { shape: "", cut: "", transparency: "", colour: "", colourLight: "", phenomenon: "", condition: "" },
      reasoning: previous?.reasoning ?? "",
    },
  };
}
