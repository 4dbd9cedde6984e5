import { Link } from "react-router";
import { Card } from "#app/components/ui/card.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { formatInterval } from "#app/domain/format-interval.ts";
import type { SpeciesSheet } from "#app/features/species/get-species.server.ts";
import { kindNames } from "#app/features/species/species-filter.ts";

/** The forms that are told apart under a species; one of them is shown in full. */
export function FormsCard({ forms, shownId, base }: { forms: SpeciesSheet["forms"]; shownId: string; base: string }) {
  return (
    <Card title="Forms" note="told apart under the species by their own evidence, not by constants alone">
      <Table caption="Forms of the species">
        <thead>
          <tr>
            <HeaderCell>Form</HeaderCell>
            <HeaderCell isNumber>Index</HeaderCell>
            <HeaderCell isNumber>Birefringence</HeaderCell>
            <HeaderCell isNumber>Density</HeaderCell>
            <HeaderCell>Nature</HeaderCell>
          </tr>
        </thead>
        <tbody>
          {forms.map(({ id, name, kind, span }) => (
            <tr key={id} className={id === shownId ? "bg-tint-bg" : ""}>
              <th scope="row" className="border-t border-rule px-3 py-2 align-top font-normal first:pl-4.5">
                <Link to={`${base}?form=${id}`} preventScrollReset aria-current={id === shownId ? "true" : undefined} className={`text-ink decoration-rule-2 hover:text-tint hover:decoration-tint ${id === shownId ? "font-semibold no-underline" : "underline"}`}>
                  {name}
                </Link>
              </th>
              <Cell isNumber>{span.index ? formatInterval(span.index, 3) : "–"}</Cell>
              <Cell isNumber>{span.birefringence ? (span.birefringence[1] === 0 ? "none" : formatInterval(span.birefringence, 3)) : "–"}</Cell>
              <Cell isNumber>{span.sg ? formatInterval(span.sg, 2) : "–"}</Cell>
              <Cell className="text-ink-2">{kindNames[kind]}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
    </Card>
  );
}
