import { LinkButton } from "#app/components/ui/button.tsx";
import { PrintButton } from "#app/components/take-in/print-button.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import { consentQuestions } from "#app/domain/consent.ts";
import { formatMoney } from "#app/domain/money/format-money.ts";
import { money } from "#app/domain/money/money.ts";
import { capacityNames, serviceNames } from "#app/domain/take-in.ts";
import { formatWeekdayDate } from "#app/domain/working-days.ts";
import { getLetterhead } from "#app/features/take-ins/get-letterhead.server.ts";
import { getTakeIn } from "#app/features/take-ins/get-take-in.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/receipt";

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const [takeIn, letterhead] = await orResponse(Promise.all([getTakeIn(ctx, params.number), getLetterhead(ctx)]));
  return { takeIn, letterhead, timeZone: ctx.laboratory.timeZone, taxLabel: ctx.laboratory.taxLabel };
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Receipt ${params.number}` }];

/** What the client takes home: what was handed over and agreed. No species, no fineness, no origin, no opinion of value. */
export default function ReceiptRoute({ loaderData, params }: Route.ComponentProps) {
  const { takeIn, letterhead, timeZone, taxLabel } = loaderData;
  return (
    <>
      <div className="no-print">
      <PageHeader
        title="Receipt"
        actions={
          <>
            <LinkButton to={`/lab/${params.labSlug}/take-ins/${params.number}`}>Back to the take-in</LinkButton>
            <PrintButton />
          </>
        }
      />
      </div>
      <article className="mx-auto max-w-[52rem] rounded-[10px] border border-rule bg-sheet p-8 print:max-w-none print:border-0 print:p-0">
        <div className="ramp mb-5 h-1" aria-hidden="true" />
        <header className="flex flex-wrap justify-between gap-6">
          <div>
            <p className="font-serif text-[20px] font-medium">{letterhead.name}</p>
            {letterhead.addressLines.map((line, index) => (
              <p key={index} className="text-ink-2">
                {line}
              </p>
            ))}
            <p className="text-ink-2">{[letterhead.phone, letterhead.email].filter(Boolean).join(" · ")}</p>
          </div>
          <div className="text-right">
            <p className="text-ink-2">Receipt for goods</p>
            <p className="font-mono text-[18px]">{takeIn.number}</p>
            <p className="text-ink-2">
              {formatInstant(takeIn.receivedAt, timeZone)} ({timeZone.replaceAll("_", " ")})
            </p>
          </div>
        </header>
        <section className="mt-6 grid gap-6 sm:grid-cols-2 print:grid-cols-2">
          <Block title="Received from">
            <p>{takeIn.client.name}</p>
            {takeIn.client.addressLines.map((line, index) => (
              <p key={index}>{line}</p>
            ))}
            <p className="mt-1 text-ink-2">
              Handed over by {takeIn.handedOverBy}, {capacityNames[takeIn.capacity].toLowerCase()}
            </p>
          </Block>
          <Block title="Received by">
            <p>{takeIn.receivedBy}</p>
            <p className="mt-1 text-ink-2">Due {formatWeekdayDate(takeIn.dueOn)}</p>
            <p className="text-ink-2">{takeIn.returnMethod === "collect" ? "To be collected here" : "To be sent by insured courier"}</p>
          </Block>
        </section>
        {takeIn.items.map((item, index) => (
          <section key={item.number} className="mt-6 break-inside-avoid border-t border-rule-2 pt-4">
            <h2 className="text-[17px]">
              {index + 1}. {item.description}
            </h2>
            <div className="mt-2 flex flex-wrap gap-5">
              <dl className="grid min-w-0 flex-1 grid-cols-[9rem_1fr] gap-x-4 gap-y-1">
                <Row name="Item">
                  <span className="font-mono">{item.number}</span>
                </Row>
                <Row name="Counted">
                  {item.stoneCount === 1 ? "1 stone" : `${item.stoneCount} stones`}, {item.mount}
                </Row>
                <Row name="Weight">
                  <span className="font-mono">
                    {item.massText} {item.massUnit}
                  </span>
                  , balance {item.balance}
                </Row>
                <Row name="Condition">{item.condition}</Row>
                {item.custody[0]?.seal ? (
                  <Row name="Seal or bag">
                    <span className="font-mono">{item.custody[0].seal}</span>
                  </Row>
                ) : null}
                {item.declaredValueMinor === null ? null : (
                  <Row name="Declared value">
                    <span className="font-mono">{formatMoney(money(item.declaredValueMinor, item.declaredCurrency!))}</span> (client's figure, for custody only; not an appraisal)
                  </Row>
                )}
                <Row name="Agreed to">{consentQuestions.filter(({ code }) => item.consents.includes(code)).map(({ label }) => label).join("; ") || "nothing beyond looking"}</Row>
                <Row name="Not agreed to">{consentQuestions.filter(({ code }) => !item.consents.includes(code)).map(({ label }) => label).join("; ") || "nothing"}</Row>
              </dl>
              {item.photos.slice(0, 2).map((photo, at) => (
                <img key={photo} src={`/lab/${params.labSlug}/photos/${photo}/thumbnail`} alt={`Photograph ${at + 1} of ${item.number}`} width={110} height={110} className="size-28 rounded-md border border-rule-2 object-cover" />
              ))}
            </div>
          </section>
        ))}
        {takeIn.clientStatements ? (
          <section className="mt-6 break-inside-avoid border-t border-rule-2 pt-4">
            <h2 className="text-[15px]">As stated by the client, not examined</h2>
            <p className="mt-1 whitespace-pre-wrap">{takeIn.clientStatements}</p>
          </section>
        ) : null}
        <section className="mt-6 break-inside-avoid border-t border-rule-2 pt-4">
          <h2 className="text-[15px]">Services and fee</h2>
          <p className="mt-1">{takeIn.services.map((service) => serviceNames[service]).join(", ")}. Fixed prices, agreed {formatInstant(takeIn.feeAgreedAt, timeZone)}, before anything was examined.</p>
          {takeIn.invoice ? (
            <p className="mt-1 font-mono">
              {formatMoney(money(takeIn.invoice.netMinor, takeIn.invoice.currency))} + {taxLabel} {formatMoney(money(takeIn.invoice.taxMinor, takeIn.invoice.currency))} = {formatMoney(money(takeIn.invoice.totalMinor, takeIn.invoice.currency))}
              <span className="font-sans">, invoice {takeIn.invoice.number}</span>
            </p>
          ) : null}
        </section>
        <section className="mt-6 break-inside-avoid border-t border-rule-2 pt-4 text-[12.5px] text-ink-2">
          <p>
            The descriptions say what was seen and nothing more: they are no opinion of what the goods are, what they are made of, where they come from or what they are worth. Our terms of business, which were handed over or shown, say what
            we answer for, how goods are insured here and on their way, what happens to goods that are not collected, and how we keep personal data. Please bring this receipt when you collect; whoever collects is asked who they are.
          </p>
        </section>
        <footer className="mt-10 grid grid-cols-2 gap-10">
          <p className="border-t border-ink pt-1 text-ink-2">Client, or for the client</p>
          <p className="border-t border-ink pt-1 text-ink-2">For {letterhead.name}</p>
        </footer>
      </article>
    </>
  );
}

function Block({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <div>
      <h2 className="mb-0.5 font-sans text-[12.5px] font-semibold text-ink-2">{title}</h2>
      {children}
    </div>
  );
}

function Row({ name, children }: { name: string; children: React.ReactNode }) {
  return (
    <>
      <dt className="text-ink-2">{name}</dt>
      <dd className="min-w-0 break-words">{children}</dd>
    </>
  );
}
