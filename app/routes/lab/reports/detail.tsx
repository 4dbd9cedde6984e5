import { useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { Chip } from "#app/components/ui/chip.tsx";
import { Confirm } from "#app/components/ui/confirm.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField } from "#app/components/ui/text-field.tsx";
import { formatCalendarDate, formatInstant } from "#app/domain/calendar-date.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { reportStateNames, withdrawalReasonNames, withdrawalReasons } from "#app/domain/report-state.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { getReport } from "#app/features/reports/get-report.server.ts";
import { issueReportByNumber } from "#app/features/reports/issue-report-by-number.server.ts";
import { reopenStone } from "#app/features/reports/reopen-stone.server.ts";
import { reportAction } from "#app/features/reports/report-forms.server.ts";
import { reportTones } from "#app/features/reports/report-tone.ts";
import { retryPdf } from "#app/features/reports/retry-pdf.server.ts";
import { withdrawReport } from "#app/features/reports/withdraw-report.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/detail";

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const report = await orResponse(getReport(ctx, { number: params.number }));
  return { report, timeZone: ctx.laboratory.timeZone, canIssue: isAllowed(ctx.roles, "reports.issue"), canWithdraw: isAllowed(ctx.roles, "reports.withdraw") };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = context.get(labContext);
  const submission = parseWithZod(await request.formData(), { schema: reportAction });
  if (submission.status !== "success") return formInvalid(submission);
  const { number } = params;
  const input = submission.value;
  try {
    let to = `/lab/${params.labSlug}/reports/${number}`;
    let notice: string;
    if (input.intent === "issue") {
      await issueReportByNumber(ctx, { number });
      notice = `Report ${number} is issued.`;
    } else if (input.intent === "retryPdf") {
      await retryPdf(ctx, { number });
      notice = "The PDF is being made again.";
    } else if (input.intent === "withdraw") {
      await withdrawReport(ctx, { number, reason: input.reason, note: input.note });
      notice = `Report ${number} is withdrawn. The register shows it from now on.`;
    } else {
      const { stoneCode } = await getReport(ctx, { number });
      await reopenStone(ctx, { stoneCode, reason: input.note });
      to = `/lab/${params.labSlug}/stones/${stoneCode}`;
      notice = `The stone is on the bench again. Its next report will replace ${number}.`;
    }
    return redirect(to, { headers: { "Set-Cookie": await noticeHeader(notice) } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `${params.number} · Isogyre` }];

export default function ReportRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { report, timeZone, canIssue, canWithdraw } = loaderData;
  const [form, fields] = useForm<{ intent: string; reason: string; note: string }>({ lastResult: actionData?.result as never });
  const base = `/lab/${params.labSlug}/reports`;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={base} className="text-ink-3">
            Reports
          </Link>
        }
        title={<span className="font-mono text-[24px]">{report.number}</span>}
        note={`${report.kind === "identification" ? "Identification" : "Identification with valuation"}, version ${report.version}, for ${report.clientName}`}
        actions={<Chip tone={reportTones[report.state]}>{reportStateNames[report.state]}</Chip>}
      />
      <FormAlert errors={form.errors} id={form.errorId} />
      {report.recalled.length > 0 && report.state !== "withdrawn" ? (
        <Caution className="mb-5">
          {report.recalled.map(({ sequence, instrument, failedOn }) => `${instrument} failed its check with ${failedOn} after reading ${sequence}, which this report relies on.`).join(" ")} Until it is answered for on the{" "}
          <Link to={`/lab/${params.labSlug}/instruments/recall`} className="underline">
            recall list
          </Link>
          , do not rely on that reading: measure it again, say why it can stand, or withdraw the report.
        </Caution>
      ) : null}
      <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <Card title="The document" note={report.sizeBytes ? `PDF, ${Math.ceil(report.sizeBytes / 1024)} KB` : undefined}>
          <CardBody>
            {report.pdfState === "ready" ? (
              <>
                <iframe src={`${base}/${report.number}/file.pdf`} className="h-[60vh] w-full rounded-md border border-rule" title={`PDF of report ${report.number}`} />
                <p className="mt-3">
                  <a href={`${base}/${report.number}/file.pdf`} className="text-tint">
                    Open the PDF
                  </a>
                </p>
                <p className="mt-1 text-[13px] break-all text-ink-3">
                  SHA-256 <span className="font-mono">{report.sha256}</span>
                </p>
              </>
            ) : report.pdfState === "failed" ? (
              <div role="alert" className="rounded-md bg-red-bg px-3.5 py-2.5 text-red">
                <p className="font-semibold">The PDF could not be made</p>
                <p>{report.pdfFailure}</p>
                <p>Nothing was issued. The content is frozen and safe.</p>
                {canIssue ? (
                  <Form method="post" className="mt-2">
                    <Button look="quiet" name="intent" value="retryPdf">
                      Try again
                    </Button>
                  </Form>
                ) : null}
              </div>
            ) : (
              <p role="status" className="text-ink-2">
                The PDF is being made. Look again in a moment.
              </p>
            )}
          </CardBody>
        </Card>
        <div className="grid content-start gap-5">
          <Card title="Where it stands">
            <CardBody className="grid gap-4">
              <Facts
                rows={[
                  { name: "Stone", value: <Link to={`/lab/${params.labSlug}/stones/${report.stoneCode}`} className="font-mono text-tint">{formatStoneCode(report.stoneCode)}</Link> },
                  { name: "As received", value: report.description },
                  { name: "Report date", value: report.reportOn ? formatCalendarDate(report.reportOn) : null },
                  { name: "Authorised", value: report.authorisedAt ? `${report.authorisedByName}, ${formatInstant(report.authorisedAt, timeZone)}` : null },
                  { name: "Issued", value: report.issuedAt ? formatInstant(report.issuedAt, timeZone) : "Not yet" },
                  { name: "Replaces", value: report.supersedesNumber ? <Link to={`${base}/${report.supersedesNumber}`} className="font-mono text-tint">{report.supersedesNumber}</Link> : null },
                  { name: "Replaced by", value: report.supersededByNumber ? <Link to={`${base}/${report.supersededByNumber}`} className="font-mono text-tint">{report.supersededByNumber}</Link> : null },
                  { name: "Withdrawn", value: report.withdrawnAt ? `${formatInstant(report.withdrawnAt, timeZone)}, because of ${withdrawalReasonNames[report.withdrawalReason ?? "other"]}` : null },
                  { name: "Note", value: report.withdrawalNote },
                  { name: "Code", value: report.shownCode, isMono: true },
                ]}
              />
              {report.state !== "authorised" && report.verificationUrl ? (
                <p>
                  <a href={report.verificationUrl} className="text-tint">
                    Its page in the public register
                  </a>
                </p>
              ) : null}
              {report.state === "authorised" && canIssue ? (
                <Form method="post">
                  <Button name="intent" value="issue" disabled={report.pdfState !== "ready"}>
                    Issue the report
                  </Button>
                  <p className="mt-1 text-[13px] text-ink-3">
                    {report.clientTerms === "account" ? "The client has account terms: it goes out at once." : "It goes out by itself as soon as the fee is paid."}
                  </p>
                </Form>
              ) : null}
            </CardBody>
          </Card>
          {canWithdraw && (report.state === "issued" || report.state === "superseded") ? (
            <Card title="Amend or withdraw" note="an issued PDF is never changed">
              <CardBody className="grid gap-4">
                {report.state === "issued" && report.stoneState === "issued" ? (
                  <Confirm summary="Amend" tone="quiet">
                    <Form method="post" className="grid gap-3">
                      <TextAreaField id="amend-note" name="note" label="What has to change, and why" maxLength={500} errors={form.value?.intent === "amend" ? fields.note.errors : undefined} />
                      <Button look="quiet" name="intent" value="amend" className="justify-self-start">
                        Put the stone back on the bench
                      </Button>
                    </Form>
                  </Confirm>
                ) : null}
                <Confirm summary="Withdraw">
                  <Form method="post" className="grid gap-3">
                    <SelectField
                      id="withdraw-reason"
                      name="reason"
                      label="Class of reason, shown in the register"
                      emptyLabel="Choose"
                      defaultValue=""
                      options={withdrawalReasons.map((value) => ({ value, label: withdrawalReasonNames[value] }))}
                      errors={form.value?.intent === "withdraw" ? fields.reason.errors : undefined}
                    />
                    <TextAreaField id="withdraw-note" name="note" label="Note for the laboratory" maxLength={1000} errors={form.value?.intent === "withdraw" ? fields.note.errors : undefined} />
                    <Button look="danger" name="intent" value="withdraw" className="justify-self-start">
                      Withdraw for good
                    </Button>
                  </Form>
                </Confirm>
              </CardBody>
            </Card>
          ) : null}
        </div>
      </div>
    </>
  );
}
