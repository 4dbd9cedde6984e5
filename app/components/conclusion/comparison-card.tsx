import { Card, CardBody } from "#app/components/ui/card.tsx";
import { StateWord } from "#app/components/ui/chip.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { natureNames, type Nature } from "#app/domain/conclusion.ts";
import type { ComparedRow } from "#app/features/second-checks/compare-readings.ts";

type Found = { speciesName: string; variety: string; nature: Nature } | null;
type ComparisonCardProps = { rows: readonly ComparedRow[]; found: Found; examiner: string; own: { species: string; nature: Nature } | null; checker: string };

/** What two people found of one stone without knowing of each other, side by side, with how far they may differ. */
export function ComparisonCard({ rows, found, examiner, own, checker }: ComparisonCardProps) {
  const same = (a: string, b: string) => a.trim().toLowerCase() === b.trim().toLowerCase();
  return (
    <Card title="Comparison" note="readings that stand, the best of each test">
      <Table caption="Comparison of the two examinations">
        <thead>
          <tr>
            <HeaderCell>What</HeaderCell>
            <HeaderCell isNumber>{examiner}</HeaderCell>
            <HeaderCell isNumber>{checker}</HeaderCell>
            <HeaderCell isNumber>Difference</HeaderCell>
            <HeaderCell isNumber>May differ by</HeaderCell>
            <HeaderCell>Verdict</HeaderCell>
          </tr>
        </thead>
        <tbody>
          {found && own ? (
            <>
              <SaidRow what="Species" first={found.speciesName} second={own.species} isSame={same(found.speciesName, own.species) || same(found.variety, own.species)} />
              <SaidRow what="Nature" first={natureNames[found.nature]} second={natureNames[own.nature]} isSame={found.nature === own.nature} />
            </>
          ) : null}
          {rows.map((row) => (
            <tr key={row.what}>
              <Cell>{row.what}{row.unit ? `, ${row.unit}` : ""}</Cell>
              <Cell isNumber>{row.first}</Cell>
              <Cell isNumber>{row.second}</Cell>
              <Cell isNumber>{row.difference}</Cell>
              <Cell isNumber>{row.allowed}</Cell>
              <Cell>
                <StateWord tone={row.isWithin ? "green" : "red"}>{row.isWithin ? "within" : "apart"}</StateWord>
              </Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      {rows.length === 0 ? (
        <CardBody>
          <p className="text-ink-2">No quantity was measured by both, so the readings cannot be compared one by one.</p>
        </CardBody>
      ) : null}
    </Card>
  );
}

function SaidRow({ what, first, second, isSame }: { what: string; first: string; second: string; isSame: boolean }) {
  return (
    <tr>
      <Cell>{what}</Cell>
      <Cell className="text-right">{first}</Cell>
      <Cell className="text-right">{second}</Cell>
      <Cell />
      <Cell />
      <Cell>
        <StateWord tone={isSame ? "green" : "straw"}>{isSame ? "the same" : "other words"}</StateWord>
      </Cell>
    </tr>
  );
}
