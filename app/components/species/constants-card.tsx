import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import type { SpeciesConstants } from "#app/features/species/species-constants.ts";

/** Each constant with what it was compared with; what no source names is said to be from memory. */
export function ConstantsCard({ constants: { lines, sources }, title }: { constants: SpeciesConstants; title: string }) {
  return (
    <Card title={title} note="sodium light, 589.3 nm; density relative to water at 4 °C">
      <Table caption={`${title}, each with its sources`}>
        <thead>
          <tr>
            <HeaderCell>Constant</HeaderCell>
            <HeaderCell isNumber>Range</HeaderCell>
            <HeaderCell isNumber>Usual</HeaderCell>
            <HeaderCell>Compared with</HeaderCell>
          </tr>
        </thead>
        <tbody>
          {lines.map(({ label, value, usual, note, sources: numbers }) => (
            <tr key={label}>
              <th scope="row" className="border-t border-rule px-3 py-2 text-left align-top font-normal text-ink-2 first:pl-4.5">
                {label}
                {note ? <span className="block max-w-72 text-xs text-ink-3">{note}</span> : null}
              </th>
              <Cell isNumber>{/\d/.test(value) ? value : <span className="font-sans whitespace-normal">{value}</span>}</Cell>
              <Cell isNumber>{usual}</Cell>
              <Cell className="text-ink-3">
                {numbers.length > 0 ? (
                  <span className="inline-flex flex-wrap gap-x-1.5 font-mono text-sm">
                    <span className="sr-only">Sources </span>
                    {numbers.map((number) => (
                      <a key={number} href={`#source-${number}`} className="text-link inline-flex min-h-6 min-w-6 items-center justify-center">
                        {number}
                      </a>
                    ))}
                  </span>
                ) : /\d/.test(value) ? (
                  "from memory"
                ) : null}
              </Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      <CardBody className="border-t border-rule">
        <p className="text-sm text-ink-2">The ranges are those of gem material in ordinary use, compiled from memory and compared with published values; a reading’s own uncertainty comes on top.</p>
        {sources.length > 0 ? (
          <ol className="mt-2 grid gap-1 text-xs text-ink-3">
            {sources.map((source, at) => (
              <li key={`${at}-${source}`} id={`source-${at + 1}`} className="grid grid-cols-[1.75rem_1fr] target:text-ink">
                <span className="font-mono">{at + 1}</span>
                <span className="min-w-0 break-words">{source}</span>
              </li>
            ))}
          </ol>
        ) : null}
      </CardBody>
    </Card>
  );
}
