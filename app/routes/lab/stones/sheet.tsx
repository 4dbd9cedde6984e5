import { ReadingsTable } from "#app/components/bench/readings-table.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { PrintButton } from "#app/components/take-in/print-button.tsx";
import { LinkButton } from "#app/components/ui/button.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import { presentReadings } from "#app/features/readings/present-readings.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/sheet";

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const { stone, readings, conclusion } = await orResponse(getBench(ctx, params));
  const { timeZone, name } = ctx.laboratory;
  return {
    stone,
    laboratoryName: name,
    printed: formatInstant(ctx.now, timeZone),
    timeZone,
    concluded: conclusion?.found ? `${conclusion.found.speciesName}${conclusion.found.variety ? `, ${conclusion.found.variety}` : ""}, by ${conclusion.by}` : null,
    readings: readings ? presentReadings(readings, timeZone) : null,
  };
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Bench sheet of ${params.stoneCode} · Isogyre` }];

/** Everything that was read of a stone, struck readings too, on paper. */
export default function SheetRoute({ loaderData, params }: Route.ComponentProps) {
  const { stone, laboratoryName, printed, timeZone, concluded, readings } = loaderData;
  return (
    <>
      <div className="no-print">
        <PageHeader
          title="Bench sheet"
          actions={
            <>
              <LinkButton to={`/lab/${params.labSlug}/stones/${stone.code}`}>Back to the bench</LinkButton>
              <PrintButton />
            </>
          }
        />
      </div>
      <article className="rounded-lg border border-rule bg-sheet p-6 print:border-0 print:p-0">
        <p className="text-sm text-ink-2">{laboratoryName}</p>
        <h2 className="mt-1 text-xl">
          <span className="font-mono text-lg">{formatStoneCode(stone.code)}</span> {stone.description}
        </h2>
        <div className="mt-3 grid gap-x-8 sm:grid-cols-2">
          <Facts
            rows={[
              { name: "Client", value: stone.client },
              { name: "Take-in", value: stone.takeInNumber, isMono: true },
              { name: "Weight", value: stone.weightText ? `${stone.weightText} ct` : null },
            ]}
          />
          <Facts
            rows={[
              { name: "Due", value: formatWeekdayDate(stone.dueOn, { withYear: true }) },
              { name: "Concluded", value: concluded },
              { name: "Printed", value: `${printed} (${timeZone})` },
            ]}
          />
        </div>
        <div className="mt-4">{readings ? <ReadingsTable readings={readings} strikeHref={null} canStrike={() => false} /> : <p className="text-ink-2">Readings are for those who examine and value.</p>}</div>
        <p className="mt-4 text-xs text-ink-3">A struck reading stays legible, with who struck it, when and why. This sheet is a record of the bench, not a report.</p>
      </article>
    </>
  );
}
