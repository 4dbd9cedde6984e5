import type { SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, redirect } from "react-router";
import { StoneHeader } from "#app/components/bench/stone-header.tsx";
import { InclusionList } from "#app/components/inclusions/inclusion-list.tsx";
import { PhotoScaleForm } from "#app/components/inclusions/photo-scale-form.tsx";
import { PlottingCard } from "#app/components/inclusions/plotting-card.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { plotSides } from "#app/domain/inclusion.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { shortRef } from "#app/domain/short-ref.ts";
import { addMicroscopePhoto } from "#app/features/inclusions/add-microscope-photo.server.ts";
import { getInclusions } from "#app/features/inclusions/get-inclusions.server.ts";
import { inclusionForms, type InclusionIntent } from "#app/features/inclusions/inclusion-forms.server.ts";
import { recordInclusion } from "#app/features/inclusions/record-inclusion.server.ts";
import { setPhotoScale } from "#app/features/inclusions/set-photo-scale.server.ts";
import { setStoneOutline } from "#app/features/inclusions/set-stone-outline.server.ts";
import { strikeInclusion } from "#app/features/inclusions/strike-inclusion.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { getStoneHead } from "#app/features/stones/get-bench.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/inclusions";

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const { stone, isCheckerBlind, isExaminer } = await orResponse(getStoneHead(ctx, params));
  if (isCheckerBlind) throw redirect(`/lab/${params.labSlug}/stones/${params.stoneCode}/second-check`);
  const plotted = await orResponse(getInclusions(ctx, params));
  const when = (instant: Date) => formatInstant(instant, ctx.laboratory.timeZone);
  const canRecord = isAllowed(ctx.roles, "readings.record") && stone.goodsState !== "released" && ["received", "examining", "returned"].includes(stone.state);
  return {
    stone,
    checkName: ctx.laboratory.isSolePractice ? "Self-check" : "Second check",
    ...plotted,
    inclusions: plotted.inclusions.map(({ recordedAt, strike, ...mark }) => ({ ...mark, when: when(recordedAt), strike: strike && { when: when(strike.at), by: strike.by, reason: strike.reason } })),
    side: plotSides.find((side) => side === url.searchParams.get("side")) ?? "crown",
    photo: plotted.photos.find(({ ref }) => ref === url.searchParams.get("photo")) ?? plotted.photos[0] ?? null,
    isExaminer,
    canRecord,
    canPhotograph: canRecord && isAllowed(ctx.roles, "photos.add"),
    requestIds: { inclusion: newRequestId(), photo: newRequestId() },
  };
}

type Answer = { intent: string; result: SubmissionResult<string[]> };
/** Which of the page's forms an answer is for. */
const answer = (intent: string, { data: { result }, init }: ReturnType<typeof formInvalid>) => data<Answer>({ intent, result }, init ?? {});

export async function action({ request, context, params, url }: Route.ActionArgs) {
  const ctx = labContextFor(context, "readings.record");
  const form = await request.formData();
  const intent = String(form.get("intent") ?? "");
  if (!Object.hasOwn(inclusionForms, intent)) throw data({ userMessage: "This form is not known here. Open the page anew." }, { status: 400 });
  const submission = parseWithZod(form, { schema: inclusionForms[intent as InclusionIntent] });
  // A file is never sent back: it has to be chosen again.
  const hideFields = ["file"];
  if (submission.status !== "success") return answer(intent, formInvalid(submission, { hideFields }));
  try {
    const { notice, search = url.search } = await carryOut(ctx, params.stoneCode, submission.value, url);
    return redirect(`${url.pathname}${search}`, { headers: { "Set-Cookie": await noticeHeader(notice) } });
  } catch (error) {
    return answer(intent, formRefused(submission, error, { hideFields }));
  }
}

type Asked = NonNullable<ReturnType<(typeof inclusionForms)[InclusionIntent]["parse"]>>;

async function carryOut(ctx: LabContext, stoneCode: string, asked: Asked, url: URL): Promise<{ notice: string; search?: string }> {
  switch (asked.intent) {
    case "place": {
      const { sequence } = await recordInclusion(ctx, { ...asked, stoneCode });
      return { notice: `Inclusion ${sequence} is kept.` };
    }
    case "strike":
      await strikeInclusion(ctx, { stoneCode, sequence: asked.sequence, reason: asked.reason });
      return { notice: `Inclusion ${asked.sequence} is struck. It stays legible.` };
    case "outline":
      await setStoneOutline(ctx, { stoneCode, outline: asked.outline });
      return { notice: "The outline is drawn anew; what was placed keeps its place in it." };
    case "photo": {
      const { file, requestId, magnification, pictureWidth } = asked;
      const photoId = await addMicroscopePhoto(ctx, { stoneCode, bytes: Buffer.from(await file.arrayBuffer()), fileName: file.name, sourceKey: `form:${requestId}`, magnificationX: magnification?.value ?? null, pictureWidthMm: pictureWidth?.value ?? null });
      const search = new URLSearchParams(url.search);
      search.set("photo", shortRef(photoId));
      return { notice: "The photograph is kept.", search: `?${search}` };
    }
    case "scale":
      if (asked.photo) await setPhotoScale(ctx, { stoneCode, photoId: asked.photo, magnificationX: asked.magnification?.value ?? null, pictureWidthMm: asked.pictureWidth?.value ?? null });
      return { notice: "The scale is set." };
  }
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Inclusions of ${params.stoneCode} · Isogyre` }];

export default function InclusionsRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, checkName, outline, side, photos, photo, inclusions, canRecord, canPhotograph, isExaminer, requestIds } = loaderData;
  const labPath = `/lab/${params.labSlug}`;
  const base = `${labPath}/stones/${stone.code}`;
  const resultOf = (intent: string) => (actionData?.intent === intent ? actionData.result : undefined);
  const struck = resultOf("strike");
  const photoNumber = (ref: string) => photos.findIndex((one) => one.ref === ref) + 1;
  return (
    <>
      <StoneHeader stone={stone} labSlug={params.labSlug} checkName={checkName} title="Inclusions" actions={<LinkButton to={base}>To the bench</LinkButton>} />
      <div className="grid gap-5">
        {canRecord ? <Caution>Lamps heat: keep opal, oiled emerald and waxed stones out of a hot beam, and kunzite out of strong light. The laboratory’s own rules come first.</Caution> : null}
        <PlottingCard key={inclusions.length} {...{ labPath, outline, side, photos, photo, inclusions, canRecord }} requestId={requestIds.inclusion} lastResult={resultOf("place")} />
        <Card title="List" note={`${inclusions.filter(({ strike }) => !strike).length} kept, ${inclusions.filter(({ strike }) => strike).length} struck`}>
          {inclusions.length === 0 ? (
            <EmptyState title="Nothing is plotted">{canRecord ? "Tap the outline or the photograph where something lies, say what it is, and keep it." : "Nothing was plotted while the stone was examined."}</EmptyState>
          ) : (
            <InclusionList
              inclusions={inclusions}
              photoNumber={photoNumber}
              canStrike={({ isOwn }) => canRecord && (isOwn || isExaminer)}
              reason={struck ? { sequence: String(struck.initialValue?.sequence ?? ""), value: String(struck.initialValue?.reason ?? ""), errors: struck.error?.reason ?? struck.error?.[""] ?? [] } : undefined}
            />
          )}
        </Card>
        {canPhotograph ? (
          <div className="grid items-start gap-5 md:grid-cols-2">
            <Card title="Add a photograph" note="through the microscope">
              <CardBody>
                <PhotoScaleForm key={photos.length} of={{ intent: "photo", requestId: requestIds.photo }} lastResult={resultOf("photo")} />
              </CardBody>
            </Card>
            {photo ? (
              <Card title={`Scale of photograph ${photoNumber(photo.ref)}`}>
                <CardBody>
                  <PhotoScaleForm
                    key={`${photo.ref}-${photo.magnificationX}-${photo.pictureWidthMm}`}
                    of={{ intent: "scale", photoRef: photo.ref, magnification: photo.magnificationX ? String(photo.magnificationX) : "", pictureWidth: photo.pictureWidthMm ? String(photo.pictureWidthMm) : "" }}
                    lastResult={resultOf("scale")}
                  />
                </CardBody>
              </Card>
            ) : null}
          </div>
        ) : null}
      </div>
    </>
  );
}
