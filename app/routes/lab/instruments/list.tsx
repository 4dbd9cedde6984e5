import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { StateWord } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { FilterNav } from "#app/components/ui/filter-nav.tsx";
import { Cell, HeaderCell, RowHeaderCell, SortHeaderCell, Table } from "#app/components/ui/table.tsx";
import { calendarDateIn, formatInstant } from "#app/domain/calendar-date.ts";
import { instrumentKindNames } from "#app/domain/instrument-kind.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import { instrumentFilterNames, instrumentFilters } from "#app/features/instruments/instrument-filter.ts";
import { instrumentStatusNames } from "#app/features/instruments/instrument-kinds.ts";
import { listInstruments } from "#app/features/instruments/list-instruments.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { readInstrumentQuery } from "#app/web/instrument-query.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const all = await orResponse(listInstruments(ctx));
  const today = calendarDateIn(ctx.now, ctx.laboratory.timeZone);
  const { filter, choose } = readInstrumentQuery(url);
  return {
    instruments: choose(all, today),
    hasAny: all.length > 0,
    filter,
    search: url.search,
    recalling: isAllowed(ctx.roles, "readings.read") ? all.filter(({ isRecalling }) => isRecalling).map(({ name }) => name) : [],
    timeZone: ctx.laboratory.timeZone,
    today,
    canManage: isAllowed(ctx.roles, "instruments.manage"),
    canReadRecall: isAllowed(ctx.roles, "readings.read"),
  };
}

export const meta: Route.MetaFunction = () => [{ title: "Instruments · Isogyre" }];

export default function InstrumentsRoute({ loaderData, params }: Route.ComponentProps) {
  const { instruments, hasAny, filter, search, recalling, timeZone, today, canManage, canReadRecall } = loaderData;
  const base = `/lab/${params.labSlug}/instruments`;
  const register = canManage ? (
    <LinkButton look="primary" to={`${base}/new`}>
      Register an instrument
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader
        title="Instruments"
        note="What readings are taken with, and when each was last checked."
        actions={
          <>
            <a href={`${base}.csv${search}`} className="text-tint">
              Export CSV
            </a>
            {canReadRecall ? <LinkButton to={`${base}/recall`}>Recall list</LinkButton> : null}
            <LinkButton to={`${base}/references`}>References</LinkButton>
            {register}
          </>
        }
      />
      {recalling.length > 0 ? (
        <Caution className="mb-4">
          {recalling.join(" and ")} failed a check: readings made before it, and reports that rely on them, wait on the{" "}
          <Link to={`${base}/recall`} className="underline">
            recall list
          </Link>{" "}
          until somebody has answered for each.
        </Caution>
      ) : null}
      {hasAny ? <FilterNav label="Instruments" base={base} name="show" current={filter} choices={[{ value: null, label: "All" }, ...instrumentFilters.map((value) => ({ value, label: instrumentFilterNames[value] }))]} /> : null}
      <Card>
        {instruments.length === 0 ? (
          hasAny ? (
            <EmptyState title="None of them">Choose another group above.</EmptyState>
          ) : (
            <EmptyState title="No instruments yet" action={register}>
              Readings and weights name the instrument they were taken with. Start with the balance at the desk.
            </EmptyState>
          )
        ) : (
          <Table caption="Instruments">
            <thead>
              <tr>
                <SortHeaderCell sortKey="name" defaultDirection="asc">
                  Name
                </SortHeaderCell>
                <HeaderCell>Kind</HeaderCell>
                <HeaderCell hideBelow="md">Where</HeaderCell>
                <HeaderCell>State</HeaderCell>
                <HeaderCell hideBelow="sm">Last check</HeaderCell>
                <SortHeaderCell sortKey="due" defaultDirection="asc">
                  Next check
                </SortHeaderCell>
              </tr>
            </thead>
            <tbody>
              {instruments.map((instrument) => {
                const isDue = instrument.nextDueOn !== null && instrument.nextDueOn <= today;
                return (
                  <tr key={instrument.id}>
                    <RowHeaderCell isMono to={`${base}/${instrument.ref}`}>
                      {instrument.name}
                    </RowHeaderCell>
                    <Cell>
                      {instrumentKindNames[instrument.kind]}
                      {instrument.description ? <span className="block text-[12.5px] text-ink-3">{instrument.description}</span> : null}
                    </Cell>
                    <Cell hideBelow="md">{instrument.location}</Cell>
                    <Cell>
                      <StateWord tone={instrument.status === "inService" ? "green" : instrument.status === "restricted" ? "straw" : "red"}>{instrumentStatusNames[instrument.status]}</StateWord>
                      {instrument.statusReason ? <span className="block text-[12.5px] text-ink-3">{instrument.statusReason}</span> : null}
                      {instrument.outOfCheck && instrument.status !== "outOfService" ? <span className="block text-[12.5px] font-medium text-red">{instrument.outOfCheck}</span> : null}
                      {instrument.isCorrected ? <span className="block text-[12.5px] text-ink-3">its readings are corrected</span> : null}
                      {instrument.isRecalling && canReadRecall ? <span className="block text-[12.5px] font-medium text-red">readings called back</span> : null}
                    </Cell>
                    <Cell hideBelow="sm" className="whitespace-nowrap">
                      {instrument.lastCheckedAt ? `${instrument.isLastCheckPassed ? "Passed" : "Failed"}, ${formatInstant(instrument.lastCheckedAt, timeZone)}` : "Never"}
                    </Cell>
                    <Cell className={`whitespace-nowrap ${isDue ? "font-semibold text-red" : ""}`}>{instrument.nextDueOn ? `${formatWeekdayDate(instrument.nextDueOn)}${isDue ? ", due" : ""}` : ""}</Cell>
                  </tr>
                );
              })}
            </tbody>
          </Table>
        )}
      </Card>
    </>
  );
}
