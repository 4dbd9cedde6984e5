import { Form, Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { StateWord, type Tone } from "#app/components/ui/chip.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { inputLook } from "#app/components/ui/field-frame.tsx";
import { FilterSelect } from "#app/components/ui/filter-select.tsx";
import { Pager } from "#app/components/ui/pager.tsx";
import { Cell, HeaderCell, RowHeaderCell, SortHeaderCell, Table } from "#app/components/ui/table.tsx";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import type { goodsStateNames} from "#app/domain/stone-state.ts";
import { examinationStateNames, type ExaminationState } from "#app/domain/stone-state.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import { effectiveSort, listStones } from "#app/features/stones/list-stones.server.ts";
import { dueFilterNames, dueFilters, stoneStateFilterNames, stoneStateFilters } from "#app/features/stones/stone-filter.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import { writeRefCursor } from "#app/web/ref-cursor.ts";
import { readStoneQuery } from "#app/web/stone-query.ts";
import type { Route } from "./+types/list";

const tones: Record<ExaminationState, Tone> = {
  received: "plain",
  examining: "tint",
  concluded: "straw",
  checked: "straw",
  authorised: "straw",
  issued: "green",
  returned: "red",
  referred: "plain",
  declined: "red",
  cancelled: "red",
};

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const query = readStoneQuery(url.searchParams);
  const page = await orResponse(listStones(ctx, query));
  return {
    stones: page.stones,
    members: page.members,
    clientName: page.clientName,
    before: page.earlier && writeRefCursor(page.earlier),
    after: page.later && writeRefCursor(page.later),
    isFiltered: Boolean(query.state || query.due || query.clientId || query.holderId || query.search),
    filters: { state: query.state ?? "", due: query.due ?? "", with: url.searchParams.get("with") ?? "", client: url.searchParams.get("client") ?? "", q: query.search },
    order: effectiveSort(query),
    canTakeIn: isAllowed(ctx.roles, "takeIn.create"),
    canReadParcels: isAllowed(ctx.roles, "readings.read"),
    year: calendarDateIn(ctx.now, ctx.laboratory.timeZone).slice(0, 4),
  };
}

export const meta: Route.MetaFunction = () => [{ title: "Logbook · Isogyre" }];

export default function LogbookRoute({ loaderData, params }: Route.ComponentProps) {
  const { stones, members, clientName, before, after, isFiltered, filters, order, canTakeIn, canReadParcels, year } = loaderData;
  const base = `/lab/${params.labSlug}`;
  const kept = new URLSearchParams(Object.entries(filters).filter(([, value]) => value !== ""));
  return (
    <>
      <PageHeader
        title="Logbook"
        note={filters.q ? `Stones that “${filters.q}” finds, latest first.` : order === "due" ? "What is due first comes first." : "Latest first."}
        actions={
          <>
            <a href={`${base}/stones.csv${kept.size > 0 ? `?${kept}` : ""}`} className="px-1 text-tint">
              Export CSV
            </a>
            {canReadParcels ? <LinkButton to={`${base}/parcels`}>Parcels</LinkButton> : null}
            {canTakeIn ? (
              <LinkButton look="primary" to={`${base}/take-ins/new`}>
                Take in a stone
              </LinkButton>
            ) : null}
          </>
        }
      />
      <Form className="no-print mb-3 flex flex-wrap items-end gap-2.5" role="search" aria-label="Filters of the logbook" key={kept.toString()}>
        <FilterSelect name="state" label="State" value={filters.state} options={stoneStateFilters.map((value) => [value, stoneStateFilterNames[value]])} />
        <FilterSelect name="with" label="With" value={filters.with} options={members.map(({ ref, name }) => [ref, name])} />
        <FilterSelect name="due" label="Due" value={filters.due} options={dueFilters.map((value) => [value, dueFilterNames[value]])} />
        <div className="w-44">
          <label htmlFor="logbook-q" className="mb-1 block text-[12.5px] font-semibold text-ink-2">
            Words or code
          </label>
          <input id="logbook-q" type="search" name="q" defaultValue={filters.q} maxLength={100} className={inputLook} />
        </div>
        {filters.client ? <input type="hidden" name="client" value={filters.client} /> : null}
        <Button look="quiet">Show</Button>
        {isFiltered ? (
          <Link to={`${base}/stones`} className="self-center px-1 text-ink-2">
            Clear
          </Link>
        ) : null}
      </Form>
      {filters.client && clientName ? <p className="mb-3 text-ink-2">Only stones of {clientName}.</p> : null}
      <Card>
        {stones.length === 0 ? (
          isFiltered ? (
            <EmptyState title="Nothing here" action={<LinkButton to={`${base}/stones`}>Show all stones</LinkButton>}>
              No stone fits what is asked for. Ask for less, or for a shorter beginning of a word.
            </EmptyState>
          ) : (
            <EmptyState title="The logbook is empty" action={canTakeIn ? <LinkButton look="primary" to={`${base}/take-ins/new`}>Take in a stone</LinkButton> : undefined}>
              Every stone that is handed over gets a line here. The first one starts with a take-in.
            </EmptyState>
          )
        ) : (
          <Table caption="Stones">
            <thead>
              <tr>
                <HeaderCell>
                  <span className="sr-only">Photograph</span>
                </HeaderCell>
                <SortHeaderCell sortKey="received">Stone</SortHeaderCell>
                <HeaderCell>As received</HeaderCell>
                <HeaderCell isNumber>Weight, ct</HeaderCell>
                <HeaderCell>Client</HeaderCell>
                <HeaderCell>State</HeaderCell>
                <HeaderCell>Where</HeaderCell>
                <SortHeaderCell sortKey="due" defaultDirection="asc">
                  Due
                </SortHeaderCell>
              </tr>
            </thead>
            <tbody>
              {stones.map((stone) => (
                <tr key={stone.id} className="[&>*]:align-middle">
                  <Cell className="w-14 !pr-0">
                    {stone.photoRef ? (
                      <img src={`${base}/photos/${stone.photoRef}/thumbnail`} alt="" width={34} height={34} loading="lazy" className="size-[34px] rounded-md border border-rule object-cover" />
                    ) : (
                      <span aria-hidden="true" className="block size-[34px] rounded-md border border-dashed border-rule-2" />
                    )}
                  </Cell>
                  <RowHeaderCell isMono to={`${base}/stones/${stone.code}`}>
                    {formatStoneCode(stone.code)}
                  </RowHeaderCell>
                  <Cell className="min-w-44 font-serif text-[15px]">{stone.description}</Cell>
                  <Cell isNumber>{stone.weightText}</Cell>
                  <Cell>
                    <Link to={`${base}/clients/${stone.clientRef}`} className="text-ink no-underline hover:underline">
                      {stone.client}
                    </Link>
                  </Cell>
                  <Cell>
                    <StateWord tone={tones[stone.examinationState]}>{examinationStateNames[stone.examinationState]}</StateWord>
                  </Cell>
                  <Cell className="text-ink-2">{whereIs(stone)}</Cell>
                  <Cell className={`whitespace-nowrap ${stone.isOverdue ? "font-semibold text-red" : ""}`}>
                    {formatWeekdayDate(stone.dueOn, { withYear: stone.dueOn.slice(0, 4) !== year })}
                    {stone.isOverdue ? <span className="block text-[12px] font-normal">overdue</span> : null}
                  </Cell>
                </tr>
              ))}
            </tbody>
          </Table>
        )}
      </Card>
      <Pager before={before} after={after} />
    </>
  );
}

function whereIs({ goodsState, place, holder }: { goodsState: keyof typeof goodsStateNames; place: string; holder: string | null }): string {
  if (goodsState === "released") return "Released";
  if (goodsState === "away") return `Away: ${place}`;
  return [holder, place].filter(Boolean).join(", ");
}
