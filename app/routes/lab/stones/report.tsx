import { parseWithZod } from "@conform-to/zod/v4";
import { useForm } from "@conform-to/react";
import { Form, Link, redirect } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { isAllowed } from "#app/domain/permissions.ts";
import { examinationStateNames } from "#app/domain/stone-state.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { authoriseReport } from "#app/features/reports/authorise-report.server.ts";
import { authoriseForm } from "#app/features/reports/report-forms.server.ts";
import { previewReport } from "#app/features/reports/preview-report.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/report";

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const { stone, view } = await orResponse(previewReport(ctx, { stoneCode: params.stoneCode }));
  const { id: _, ...shown } = stone;
  return {
    stone: shown,
    draft: view ? { title: view.conclusion.title, statements: view.conclusion.statements, limits: view.limits, signatures: view.signatures } : null,
    mayAuthorise: isAllowed(ctx.roles, stone.isValuationOrdered ? "reports.authoriseValuation" : "reports.authoriseIdentification"),
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const submission = parseWithZod(await request.formData(), { schema: authoriseForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    const number = await authoriseReport(context.get(labContext), { stoneCode: params.stoneCode });
    return redirect(`/lab/${params.labSlug}/reports/${number}`, { headers: { "Set-Cookie": await noticeHeader(`Report ${number} is authorised. Its PDF is being made.`) } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Report of ${params.stoneCode} · Isogyre` }];

export default function StoneReportRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, draft, mayAuthorise } = loaderData;
  const [form, fields] = useForm<{ isRead: string }>({ lastResult: actionData?.result as never });
  const base = `/lab/${params.labSlug}/stones/${stone.code}`;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={base} className="text-ink-3">
            {formatStoneCode(stone.code)}
          </Link>
        }
        title="Report"
        note={stone.description}
      />
      <FormAlert errors={form.errors} id={form.errorId} />
      {!draft ? (
        <Card title={stone.reportNumber ? "The report is made" : "Not yet"}>
          <CardBody>
            {stone.reportNumber && stone.state !== "examining" ? (
              <p>
                <Link to={`/lab/${params.labSlug}/reports/${stone.reportNumber}`} className="font-mono text-tint">
                  {stone.reportNumber}
                </Link>
              </p>
            ) : (
              <p className="text-ink-2">
                A report is authorised when the conclusion has been checked. This stone stands at “{examinationStateNames[stone.state]}”.{" "}
                <Link to={base} className="text-tint">
                  Back to the stone
                </Link>
              </p>
            )}
          </CardBody>
        </Card>
      ) : (
        <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_24rem]">
          <Card title="Draft" note="as it would be printed now">
            <CardBody>
              <iframe src={`${base}/report/draft.pdf`} className="h-[70vh] w-full rounded-md border border-rule" title="Draft of the report" />
              <p className="mt-3">
                <a href={`${base}/report/draft.pdf`} className="text-tint">
                  Open the draft by itself
                </a>
              </p>
            </CardBody>
          </Card>
          <div className="grid content-start gap-5">
            <Card title={draft.title}>
              <CardBody className="grid gap-3">
                {draft.statements.map((statement) => (
                  <p key={statement}>{statement}</p>
                ))}
                <Facts
                  rows={[
                    ...draft.signatures.map(({ name, statement, onDate }) => ({ name, value: `${statement}, ${onDate}` })),
                    { name: "Limits", value: draft.limits.join(" ") },
                    { name: "Fee", value: stone.invoiceState === "paid" ? "Paid" : "Not paid yet: the report can be authorised, and is issued when it is" },
                    { name: "Valuation", value: stone.isValuationOrdered ? (stone.valuationState === "signed" ? "Signed" : "Ordered and not signed yet") : null },
                  ]}
                />
              </CardBody>
            </Card>
            <Card title="Authorise">
              <CardBody>
                {mayAuthorise ? (
                  <Form method="post" className="grid gap-3">
                    <CheckboxField id="isRead" name="isRead" label="I have read the draft and stand by what it says." errors={fields.isRead.errors} />
                    <Button className="justify-self-start">Authorise and freeze</Button>
                    <p className="text-[13px] text-ink-3">It gets its number and its code, and is never changed after this. An error later means a new report that replaces it.</p>
                  </Form>
                ) : (
                  <p className="text-ink-2">{stone.isValuationOrdered ? "An appraiser authorises a report with a valuation." : "A gemmologist authorises it."}</p>
                )}
              </CardBody>
            </Card>
          </div>
        </div>
      )}
    </>
  );
}
