import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { Chip, StateWord, type Tone } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { invoiceStateNames } from "#app/domain/invoice-state.ts";
import { reportStateNames } from "#app/domain/report-state.ts";
import { goodsStateNames, type ExaminationState } from "#app/domain/stone-state.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { getClientArea } from "#app/features/client-area/get-client-area.server.ts";
import { reportTones } from "#app/features/reports/report-tone.ts";
import { appContext, signedInContext } from "#app/web/contexts.server.ts";
import type { Route } from "./+types/home";

export async function loader({ context }: Route.LoaderArgs) {
  return getClientArea(context.get(appContext), { userId: context.get(signedInContext).userId });
}

export const meta: Route.MetaFunction = () => [{ title: "Your items and reports · Isogyre" }];

/** Plain words for the owner of a stone: what the bench says to itself stays there. */
function progressOf(state: ExaminationState): { word: string; tone: Tone } {
  switch (state) {
    case "received":
      return { word: "Waiting for examination", tone: "plain" };
    case "examining":
    case "returned":
      return { word: "Being examined", tone: "tint" };
    case "concluded":
    case "checked":
      return { word: "Being checked", tone: "tint" };
    case "authorised":
      return { word: "Report ready, waiting for payment", tone: "straw" };
    case "issued":
      return { word: "Report issued", tone: "green" };
    case "referred":
      return { word: "At an outside laboratory", tone: "tint" };
    case "declined":
      return { word: "Declined", tone: "plain" };
    case "cancelled":
      return { word: "Cancelled", tone: "plain" };
  }
}

export default function MyHomeRoute({ loaderData }: Route.ComponentProps) {
  const { stones, invoices, reports } = loaderData;
  const open = invoices.filter((invoice) => invoice.state === "open");
  return (
    <>
      <PageHeader title="Your items and reports" note="What you handed over, how far it has come, and what is yours to fetch." />
      <div className="grid gap-5">
        {open.length > 0 ? (
          <Card title="To pay">
            <ul>
              {open.map((invoice) => (
                <li key={invoice.payToken} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-t border-rule px-4.5 py-3">
                  <span className="font-mono">{invoice.number}</span>
                  <span className="text-ink-2">{invoice.laboratoryName}</span>
                  <span className="ml-auto font-mono">{invoice.total}</span>
                  <a href={`/pay/${invoice.payToken}`} className="inline-flex min-h-9 items-center rounded-md bg-tint px-3.5 font-semibold text-on-tint no-underline">
                    See and pay
                  </a>
                </li>
              ))}
            </ul>
          </Card>
        ) : null}
        <Card title="Reports">
          {reports.length === 0 ? (
            <EmptyState title="No reports yet">Your report appears here as soon as it is issued, and we write to you.</EmptyState>
          ) : (
            <ul>
              {reports.map((report) => (
                <li key={report.code} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-t border-rule px-4.5 py-3">
                  <div className="min-w-0 grow">
                    <p className="font-serif text-[16px]">{report.description}</p>
                    <p className="text-[13px] text-ink-3">
                      <span className="font-mono">{report.number}</span>, {report.reportOn ? formatCalendarDate(report.reportOn) : ""}, {report.laboratoryName}
                    </p>
                  </div>
                  <Chip tone={reportTones[report.state]}>{reportStateNames[report.state]}</Chip>
                  <a href={`/my/reports/${report.code}/${report.number}.pdf`} className="text-tint">
                    Download the PDF
                  </a>
                  <a href={`/v/${report.code}`} className="text-tint">
                    Register page
                  </a>
                </li>
              ))}
            </ul>
          )}
        </Card>
        <Card title="Items">
          {stones.length === 0 ? (
            <EmptyState title="Nothing here yet">Goods that you hand over to a laboratory appear here.</EmptyState>
          ) : (
            <ul>
              {stones.map((stone) => {
                const { word, tone } = progressOf(stone.state);
                return (
                  <li key={`${stone.laboratoryName}-${stone.code}`} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-t border-rule px-4.5 py-3">
                    <div className="min-w-0 grow">
                      <p className="font-serif text-[16px]">{stone.description}</p>
                      <p className="text-[13px] text-ink-3">
                        <span className="font-mono">{formatStoneCode(stone.code)}</span>, {stone.laboratoryName}
                        {stone.goodsState === "released" ? ", given back" : `, ${goodsStateNames[stone.goodsState].toLowerCase()}, expected by ${formatCalendarDate(stone.dueOn)}`}
                      </p>
                    </div>
                    <StateWord tone={tone}>{word}</StateWord>
                  </li>
                );
              })}
            </ul>
          )}
        </Card>
        {invoices.length > open.length ? (
          <Card title="Earlier invoices">
            <ul>
              {invoices
                .filter((invoice) => invoice.state !== "open")
                .map((invoice) => (
                  <li key={invoice.payToken} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-t border-rule px-4.5 py-2.5">
                    <a href={`/pay/${invoice.payToken}`} className="font-mono text-tint">
                      {invoice.number}
                    </a>
                    <span className="text-ink-2">{invoice.laboratoryName}</span>
                    <span className="ml-auto">{invoiceStateNames[invoice.state]}</span>
                    <span className="font-mono">{invoice.total}</span>
                  </li>
                ))}
            </ul>
          </Card>
        ) : null}
      </div>
    </>
  );
}
