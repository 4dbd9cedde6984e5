import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { StateWord } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { Pager } from "#app/components/ui/pager.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { reportStateNames, reportStates } from "#app/domain/report-state.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { listReports } from "#app/features/reports/list-reports.server.ts";
import { reportTones } from "#app/features/reports/report-tone.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { readCursor, writeCursor } from "#app/web/cursor.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list";

export async function loader({ context, url }: Route.LoaderArgs) {
  const state = reportStates.find((known) => known === url.searchParams.get("state"));
  const page = await orResponse(listReports(context.get(labContext), { state, after: readCursor<"report">(url.searchParams.get("after")) }));
  return { reports: page.reports, after: page.nextCursor ? writeCursor(page.nextCursor) : null, state: state ?? null, isFirst: !url.searchParams.has("after") };
}

export const meta: Route.MetaFunction = () => [{ title: "Reports · Isogyre" }];

const shownStates = reportStates.filter((state) => state !== "draft");

export default function ReportsRoute({ loaderData, params }: Route.ComponentProps) {
  const { reports, state, after, isFirst } = loaderData;
  const base = `/lab/${params.labSlug}/reports`;
  return (
    <>
      <PageHeader
        title="Reports"
        note="Newest first. A report is authorised on its stone’s page."
        actions={
          <a href={`${base}.csv${state ? `?state=${state}` : ""}`} className="text-tint">
            Export CSV
          </a>
        }
      />
      <nav aria-label="State" className="no-print mb-3 flex flex-wrap gap-2">
        {[null, ...shownStates].map((choice) => (
          <Link
            key={choice ?? "all"}
            to={choice ? `${base}?state=${choice}` : base}
            aria-current={choice === state ? "page" : undefined}
            className={`rounded-md border px-3 py-1.5 no-underline ${choice === state ? "border-tint bg-tint-bg font-semibold text-tint" : "border-rule-2 bg-sheet text-ink-2"}`}
          >
            {choice ? reportStateNames[choice] : "All"}
          </Link>
        ))}
      </nav>
      <Card>
        {reports.length === 0 ? (
          <EmptyState title={state ? `No ${reportStateNames[state].toLowerCase()} reports` : "No reports yet"}>{state ? "Choose another state above." : "When a stone’s conclusion has been checked, authorise its report on the stone’s page."}</EmptyState>
        ) : (
          <Table caption="Reports, newest first">
            <thead>
              <tr>
                <HeaderCell>Report</HeaderCell>
                <HeaderCell>Date</HeaderCell>
                <HeaderCell>Stone</HeaderCell>
                <HeaderCell>As received</HeaderCell>
                <HeaderCell>Client</HeaderCell>
                <HeaderCell>State</HeaderCell>
              </tr>
            </thead>
            <tbody>
              {reports.map((report) => (
                <tr key={report.number}>
                  <RowHeaderCell isMono to={`${base}/${report.number}`}>
                    {report.number}
                  </RowHeaderCell>
                  <Cell className="whitespace-nowrap">{report.reportOn ? formatCalendarDate(report.reportOn) : ""}</Cell>
                  <Cell className="font-mono whitespace-nowrap">{formatStoneCode(report.stoneCode)}</Cell>
                  <Cell className="font-serif">{report.description}</Cell>
                  <Cell>{report.clientName}</Cell>
                  <Cell>
                    <StateWord tone={report.pdfState === "failed" ? "red" : reportTones[report.state]}>
                      {report.pdfState === "failed" ? "PDF failed" : reportStateNames[report.state]}
                    </StateWord>
                    {report.isRecalled ? <span className="block text-xs font-medium text-red">a reading is called back</span> : null}
                    {report.version > 1 ? <span className="ml-2 text-[13px] text-ink-3">version {report.version}</span> : null}
                  </Cell>
                </tr>
              ))}
            </tbody>
          </Table>
        )}
      </Card>
      <Pager before={isFirst ? null : ""} after={after} />
    </>
  );
}
