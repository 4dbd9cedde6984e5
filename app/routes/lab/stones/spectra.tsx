import { parseWithZod } from "@conform-to/zod/v4";
import { Link, redirect } from "react-router";
import { StoneHeader } from "#app/components/bench/stone-header.tsx";
import { SpectrumCard } from "#app/components/spectra/spectrum-card.tsx";
import { SpectrumForm } from "#app/components/spectra/spectrum-form.tsx";
import { SpectrumViewForm } from "#app/components/spectra/spectrum-view-form.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { newRequestId } from "#app/features/new-request-id.server.ts";
import { addSpectrum } from "#app/features/spectra/add-spectrum.server.ts";
import { listSpectra } from "#app/features/spectra/list-spectra.server.ts";
import { spectrumForm } from "#app/features/spectra/spectrum-forms.server.ts";
import { withdrawSpectrum } from "#app/features/spectra/withdraw-spectrum.server.ts";
import { getStoneHead } from "#app/features/stones/get-bench.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { spectrumViewOf } from "#app/web/spectrum-view.server.ts";
import type { Route } from "./+types/spectra";

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const [spectra, { stone, isCheckerBlind }] = await orResponse(Promise.all([listSpectra(ctx, params), getStoneHead(ctx, params)]));
  if (isCheckerBlind) throw redirect(`/lab/${params.labSlug}/stones/${params.stoneCode}/second-check`);
  const when = (instant: Date) => formatInstant(instant, ctx.laboratory.timeZone);
  return {
    stone,
    checkName: ctx.laboratory.isSolePractice ? "Self-check" : "Second check",
    spectra: spectra.map(({ createdAt, withdrawal, ...spectrum }) => ({ ...spectrum, when: when(createdAt), withdrawal: withdrawal && { when: when(withdrawal.at), by: withdrawal.by, reason: withdrawal.reason } })),
    canRecord: isAllowed(ctx.roles, "readings.record") && stone.goodsState !== "released" && ["received", "examining", "returned"].includes(stone.state),
    requestId: newRequestId(),
    view: spectrumViewOf(request),
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "readings.record");
  const submission = parseWithZod(await request.formData(), { schema: spectrumForm });
  // A file is never sent back: it has to be chosen again.
  if (submission.status !== "success") return formInvalid(submission, { hideFields: ["file"] });
  const input = submission.value;
  const { stoneCode } = params;
  const here = `/lab/${params.labSlug}/stones/${stoneCode}/spectra`;
  try {
    if (input.intent === "withdraw") {
      await withdrawSpectrum(ctx, { stoneCode, sequence: input.sequence, reason: input.reason });
      return redirect(here, { headers: { "Set-Cookie": await noticeHeader(`Spectrum ${input.sequence} is withdrawn. It stays in its place.`) } });
    }
    const { requestId, file, xUnit, yUnit, note } = input;
    const { sequence, peakCount } = await addSpectrum(ctx, { requestId, stoneCode, bytes: Buffer.from(await file.arrayBuffer()), fileName: file.name, note, assumed: { xUnit, yUnit } });
    const peaks = peakCount === 0 ? "no peaks" : peakCount === 1 ? "1 peak" : `${peakCount} peaks`;
    return redirect(here, { headers: { "Set-Cookie": await noticeHeader(`Spectrum ${sequence} is kept, with ${peaks} to look at.`) } });
  } catch (error) {
    return formRefused(submission, error, { hideFields: ["file"] });
  }
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Spectra of ${params.stoneCode} · Isogyre` }];

export default function SpectraRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, spectra, canRecord, requestId, checkName } = loaderData;
  const base = `/lab/${params.labSlug}/stones/${stone.code}`;
  const result = actionData?.result;
  const isOfWithdrawal = result?.initialValue?.intent === "withdraw";
  return (
    <>
      <StoneHeader stone={stone} labSlug={params.labSlug} checkName={checkName} title="Measured spectra" actions={<LinkButton to={base}>To the bench</LinkButton>} />
      <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <div className="grid min-w-0 gap-5">
          {spectra.length === 0 ? (
            <Card>
              <EmptyState title="No spectrum is attached">{canRecord ? "The file of a spectrometer is drawn here, and its peaks are offered for a reading." : "None was attached while the stone was examined."}</EmptyState>
            </Card>
          ) : (
            spectra
              .toReversed()
              .map((spectrum) => (
                <SpectrumCard
                  key={spectrum.sequence}
                  spectrum={spectrum}
                  benchHref={canRecord ? base : null}
                  sourceHref={`${base}/spectra/${spectrum.sequence}/file`}
                  canWithdraw={canRecord}
                  reason={isOfWithdrawal && String(result?.initialValue?.sequence) === String(spectrum.sequence) ? { value: String(result?.initialValue?.reason ?? ""), errors: result?.error?.reason ?? result?.error?.[""] ?? [] } : undefined}
                />
              ))
          )}
        </div>
        <div className="grid gap-3">
          {canRecord ? (
            <Card title="Attach a spectrum">
              <CardBody>
                <SpectrumForm key={spectra.length} requestId={requestId} lastResult={isOfWithdrawal ? undefined : result} />
              </CardBody>
            </Card>
          ) : null}
          <Card title="As a hand spectroscope shows it" note="for this browser">
            <CardBody>
              <SpectrumViewForm view={loaderData.view} />
            </CardBody>
          </Card>
          <p className="px-1 text-sm text-ink-2">
            A measured spectrum stands beside what was seen: what it means is recorded as a reading <Link to={`${base}?test=spectroscope`} className="text-link">with the spectroscope</Link>.
          </p>
        </div>
      </div>
    </>
  );
}
