import { PageHeader } from "#app/components/layout/page-header.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { StateWord } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { calendarDateIn, formatInstant } from "#app/domain/calendar-date.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import { instrumentKindNames, instrumentStatusNames } from "#app/features/instruments/instrument-kinds.ts";
import { listInstruments } from "#app/features/instruments/list-instruments.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list";

export async function loader({ context }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const instruments = await orResponse(listInstruments(ctx));
  return { instruments, timeZone: ctx.laboratory.timeZone, today: calendarDateIn(ctx.now, ctx.laboratory.timeZone), canManage: isAllowed(ctx.roles, "instruments.manage") };
}

export const meta: Route.MetaFunction = () => [{ title: "Instruments · Isogyre" }];

export default function InstrumentsRoute({ loaderData, params }: Route.ComponentProps) {
  const { instruments, timeZone, today, canManage } = loaderData;
  const base = `/lab/${params.labSlug}/instruments`;
  const register = canManage ? (
    <LinkButton look="primary" to={`${base}/new`}>
      Register an instrument
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader title="Instruments" note="What readings are taken with, and when each was last checked." actions={register} />
      <Card>
        {instruments.length === 0 ? (
          <EmptyState title="No instruments yet" action={register}>
            Readings and weights name the instrument they were taken with. Start with the balance at the desk.
          </EmptyState>
        ) : (
          <Table caption="Instruments by name">
            <thead>
              <tr>
                <HeaderCell>Name</HeaderCell>
                <HeaderCell>Kind</HeaderCell>
                <HeaderCell>Where</HeaderCell>
                <HeaderCell>State</HeaderCell>
                <HeaderCell>Last check</HeaderCell>
                <HeaderCell>Next check</HeaderCell>
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
                    <Cell>{instrument.location}</Cell>
                    <Cell>
                      <StateWord tone={instrument.status === "inService" ? "green" : instrument.status === "restricted" ? "straw" : "red"}>{instrumentStatusNames[instrument.status]}</StateWord>
                      {instrument.statusReason ? <span className="block text-[12.5px] text-ink-3">{instrument.statusReason}</span> : null}
                    </Cell>
                    <Cell className="whitespace-nowrap">{instrument.lastCheckedAt ? `${instrument.isLastCheckPassed ? "Passed" : "Failed"}, ${formatInstant(instrument.lastCheckedAt, timeZone)}` : "Never"}</Cell>
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
