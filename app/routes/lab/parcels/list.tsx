import { Link } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { EmptyState } from "#app/components/ui/empty-state.tsx";
import { Pager } from "#app/components/ui/pager.tsx";
import { Cell, HeaderCell, RowHeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { listParcels } from "#app/features/parcels/list-parcels.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { readCursor, writeCursor } from "#app/web/cursor.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/list";

export async function loader({ context, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const itemNumber = url.searchParams.get("item")?.slice(0, 24) || undefined;
  const page = await orResponse(listParcels(ctx, { itemNumber, after: readCursor<"parcel">(url.searchParams.get("after")) }));
  return { parcels: page.parcels, after: page.nextCursor ? writeCursor(page.nextCursor) : null, itemNumber: itemNumber ?? null, isFirst: !url.searchParams.has("after"), timeZone: ctx.laboratory.timeZone, canSave: isAllowed(ctx.roles, "readings.record") };
}

export const meta: Route.MetaFunction = () => [{ title: "Parcels · Isogyre" }];

export default function ParcelsRoute({ loaderData, params }: Route.ComponentProps) {
  const { parcels, after, itemNumber, isFirst, timeZone, canSave } = loaderData;
  const base = `/lab/${params.labSlug}/parcels`;
  const query = itemNumber ? `item=${encodeURIComponent(itemNumber)}` : "";
  const open = canSave ? (
    <LinkButton look="primary" to={`${base}/new${query ? `?${query}` : ""}`}>
      Enter a parcel
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`/lab/${params.labSlug}/stones`} className="text-ink-3">
            Logbook
          </Link>
        }
        title="Parcels"
        note={itemNumber ? `Of item ${itemNumber}, latest first.` : "Tables of many small stones, latest first."}
        actions={
          <>
            <a href={`${base}.csv${query ? `?${query}` : ""}`} className="text-tint">
              Export CSV
            </a>
            {open}
          </>
        }
      />
      <Card>
        {parcels.length === 0 ? (
          <EmptyState title="No parcels yet" action={open}>
            Paste a table with a row for each stone: they are ranked together, and those that do not belong stand out.
          </EmptyState>
        ) : (
          <Table caption="Parcels, latest first">
            <thead>
              <tr>
                <HeaderCell>Parcel</HeaderCell>
                <HeaderCell>Item</HeaderCell>
                <HeaderCell isNumber>Stones</HeaderCell>
                <HeaderCell>Mostly</HeaderCell>
                <HeaderCell isNumber>Apart</HeaderCell>
                <HeaderCell hideBelow="sm">Saved</HeaderCell>
              </tr>
            </thead>
            <tbody>
              {parcels.map((parcel) => (
                <tr key={parcel.ref}>
                  <RowHeaderCell to={`${base}/${parcel.ref}`}>{parcel.name}</RowHeaderCell>
                  <Cell className="font-mono">{parcel.itemNumber ?? ""}</Cell>
                  <Cell isNumber>{parcel.rowCount}</Cell>
                  <Cell>{parcel.mainName || "not said"}</Cell>
                  <Cell isNumber className={parcel.oddCount > 0 ? "font-semibold text-straw" : ""}>
                    {parcel.oddCount}
                  </Cell>
                  <Cell hideBelow="sm">
                    {formatInstant(parcel.savedAt, timeZone)}, {parcel.savedBy}
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
