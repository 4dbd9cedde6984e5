import { Form } from "react-router";
import { LinkButton, Button } from "#app/components/ui/button.tsx";
import { PrintButton } from "#app/components/take-in/print-button.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { inputLook } from "#app/components/ui/field-frame.tsx";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { getTakeIn } from "#app/features/take-ins/get-take-in.server.ts";
import { stoneLabels } from "#app/features/take-ins/stone-labels.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/labels";

const columns = 3;
const perSheet = 24;

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const takeIn = await orResponse(getTakeIn(ctx, params.number));
  const start = Math.min(perSheet, Math.max(1, Math.trunc(Number(url.searchParams.get("start") ?? 1)) || 1));
  return {
    start,
    labels: stoneLabels(ctx, takeIn),
    number: takeIn.number,
  };
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Labels ${params.number}` }];

/** Labels for envelopes, 70 × 37 mm, 24 on an A4 sheet: a code and nothing about whose it is, what it is or what it is worth. */
export default function LabelsRoute({ loaderData, params }: Route.ComponentProps) {
  const { labels, number, start } = loaderData;
  const cells = [...Array.from({ length: start - 1 }, () => null), ...labels];
  const sheets = Array.from({ length: Math.ceil(cells.length / perSheet) }, (_, at) => cells.slice(at * perSheet, (at + 1) * perSheet));
  return (
    <>
      <div className="no-print">
      <PageHeader
        title="Labels"
        note="70 × 37 mm, 24 on an A4 sheet. Print at 100 %, without margins."
        actions={
          <>
            <LinkButton to={`/lab/${params.labSlug}/take-ins/${params.number}`}>Back to the take-in</LinkButton>
            <PrintButton />
          </>
        }
      />
      </div>
      <Form className="no-print mb-4 flex items-end gap-2.5">
        <div className="w-40">
          <label htmlFor="start" className="mb-1 block text-[12.5px] font-semibold text-ink-2">
            First free label
          </label>
          <input id="start" name="start" type="number" min={1} max={perSheet} defaultValue={start} className={inputLook} />
        </div>
        <Button look="quiet">Place them</Button>
      </Form>
      <div className="label-sheets overflow-x-auto print:overflow-visible">
        {sheets.map((sheet, at) => (
          <ul key={at} aria-label={`Sheet ${at + 1}`} className="mb-6 grid w-[210mm] break-after-page content-start border border-rule bg-sheet print:absolute print:left-0 print:mb-0 print:border-0" style={{ gridTemplateColumns: `repeat(${columns}, 70mm)`, gridAutoRows: "37mm", top: `${at * 297}mm` }}>
            {sheet.map((label, index) => {
              if (label === null) return <li key={index} aria-hidden="true" />;
              const [itemPart, stonePart] = formatStoneCode(label.code).split(" · ");
              return (
                <li key={index} className="flex items-center gap-[3mm] overflow-hidden p-[4mm]">
                  <svg viewBox={`-4 -4 ${label.qr.size + 8} ${label.qr.size + 8}`} role="img" aria-label={`QR code of ${label.code}`} style={{ width: "29mm", height: "29mm", flexShrink: 0, background: "#fff" }} shapeRendering="crispEdges">
                    <path d={label.qr.path} fill="#000" />
                  </svg>
                  <div className="min-w-0">
                    <p className="font-mono text-[10pt] leading-tight font-medium whitespace-nowrap">{itemPart}</p>
                    <p className="font-mono text-[12pt] leading-tight font-medium">· {stonePart}</p>
                    <p className="mt-[1.5mm] font-mono text-[7.5pt] whitespace-nowrap text-ink-2">{number}</p>
                  </div>
                </li>
              );
            })}
          </ul>
        ))}
      </div>
    </>
  );
}
