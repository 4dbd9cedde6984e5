import { Link } from "react-router";
import { RangeBar } from "#app/components/charts/range-bar.tsx";
import { Icon, type IconName } from "#app/components/ui/icon.tsx";
import { Table } from "#app/components/ui/table.tsx";
import type { Likeness } from "#app/features/species/compare-species.ts";
import type { Comparison } from "#app/features/species/get-comparison.server.ts";

const looks: Readonly<Record<Likeness, { word: string; icon: IconName | null; text: string; row: string }>> = {
  apart: { word: "apart", icon: "check", text: "text-green", row: "bg-green-bg" },
  someApart: { word: "some apart", icon: "check", text: "text-green", row: "" },
  overlapping: { word: "overlap", icon: null, text: "text-straw", row: "" },
  differs: { word: "differs", icon: null, text: "text-straw", row: "" },
  alike: { word: "alike", icon: null, text: "text-ink-3", row: "" },
  open: { word: "", icon: null, text: "text-ink-3", row: "" },
};

type ComparisonTableProps = Pick<Comparison, "columns" | "rows"> & { base: string; /** Where a column can be taken away. */ hrefWithout: (ref: string) => string };

/** A property a row, a species a column; how they stand to each other is said at the row's end. */
export function ComparisonTable({ columns, rows, base, hrefWithout }: ComparisonTableProps) {
  const isComparing = columns.length > 1;
  return (
    <Table caption="Properties side by side" className="table-fixed min-w-[44rem]">
      <thead>
        <tr>
          <th scope="col" className="w-36 px-3 py-2.5 pl-4.5 text-left align-bottom text-xs font-semibold text-ink-3">
            Property
          </th>
          {columns.map(({ ref, speciesId, formId, name, speciesName }) => (
            <th key={ref} scope="col" className="px-3 py-2.5 text-left align-bottom font-normal">
              <Link to={`${base}/${speciesId}${formId ? `?form=${formId}` : ""}`} className="inline-flex min-h-7 items-end font-serif text-lg leading-tight text-ink decoration-rule-2 hover:text-tint">
                {name}
              </Link>
              {speciesName ? <span className="block text-xs text-ink-3">{speciesName}</span> : null}
              <span className="no-print block">
                <Link to={hrefWithout(ref)} preventScrollReset className="inline-flex min-h-6 items-center text-xs text-ink-2 hover:text-tint" aria-label={`Take away ${name}`}>
                  Take away
                </Link>
              </span>
            </th>
          ))}
          {isComparing ? (
            <th scope="col" className="w-28 px-3 py-2.5 pr-4.5 text-left align-bottom text-xs font-semibold text-ink-3">
              Together
            </th>
          ) : null}
        </tr>
      </thead>
      <tbody>
        {rows.map(({ property, label, likeness, cells, axis }) => {
          const look = looks[likeness];
          return (
            <tr key={property} className={isComparing ? look.row : ""}>
              <th scope="row" className="border-t border-rule px-3 py-2 pl-4.5 text-left align-top font-normal text-ink-2">
                {label}
              </th>
              {cells.map(({ text, interval }, at) => (
                <td key={columns[at]!.ref} className={`border-t border-rule px-3 py-2 align-top ${isComparing && likeness === "alike" ? "text-ink-3" : ""}`}>
                  {interval && axis ? (
                    <span className="grid gap-1">
                      <span className="font-mono whitespace-nowrap">{text}</span>
                      <RangeBar low={interval[0]} high={interval[1]} axisMin={axis[0]} axisMax={axis[1]} />
                    </span>
                  ) : (
                    <Phrases text={text} />
                  )}
                </td>
              ))}
              {isComparing ? (
                <td className={`border-t border-rule px-3 py-2 pr-4.5 align-top font-medium whitespace-nowrap ${look.text}`}>
                  <span className="flex items-center gap-1">
                    {look.icon ? <Icon name={look.icon} sizePx={12} /> : null}
                    {look.word}
                  </span>
                </td>
              ) : null}
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}

const mostShown = 6;

/** What is long is cut for the eye and a press away. */
function Phrases({ text }: { text: string }) {
  const items = text.split("; ");
  if (text === "no value") return <span className="text-ink-3">no value</span>;
  if (items.length <= mostShown + 1) return items.join("; ");
  return (
    <>
      {items.slice(0, mostShown).join("; ")}
      <details>
        <summary className="text-link inline-flex min-h-6 items-center text-sm">{items.length - mostShown} more</summary>
        {items.slice(mostShown).join("; ")}
      </details>
    </>
  );
}
