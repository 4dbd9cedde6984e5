import { data, Form, redirect, useRouteLoaderData } from "react-router";
import { PublicShell } from "#app/components/layout/public-shell.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Chip, type Tone } from "#app/components/ui/chip.tsx";
import { ErrorPage } from "#app/components/layout/error-page.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { AppError } from "#app/domain/app-error.ts";
import { formatCalendarDate, formatInstant } from "#app/domain/calendar-date.ts";
import { invoiceStateNames, type InvoiceState } from "#app/domain/invoice-state.ts";
import { getPayPage } from "#app/features/payments/get-pay-page.server.ts";
import { consume } from "#app/features/rate-limits/consume.server.ts";
import { startCheckout } from "#app/features/payments/start-checkout.server.ts";
import type { loader as rootLoader } from "#app/root.tsx";
import { appContext } from "#app/web/contexts.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/invoice";

const tones: Record<InvoiceState, Tone> = { open: "straw", paid: "green", refunded: "plain", void: "plain" };

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const app = context.get(appContext);
  await orResponse(consume(app, { door: "pay", key: app.clientAddress }));
  const invoice = await orResponse(getPayPage(app, { payToken: params.payToken }));
  return { invoice, returned: url.searchParams.get("returned") };
}

export async function action({ context, params }: Route.ActionArgs) {
  const app = context.get(appContext);
  try {
    await consume(app, { door: "pay", key: app.clientAddress });
    return redirect(await startCheckout(app, { payToken: params.payToken }), 303);
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    return data({ userMessage: error.userMessage }, { status: error.status, headers: error.retryAfterS ? { "Retry-After": String(error.retryAfterS) } : {} });
  }
}

export const meta: Route.MetaFunction = ({ loaderData }) => [{ title: `Invoice ${loaderData?.invoice.number ?? ""} · Isogyre` }, { name: "robots", content: "noindex" }];

export function headers() {
  return { "Cache-Control": "private, no-store" };
}

export default function PayRoute({ loaderData, actionData }: Route.ComponentProps) {
  const root = useRouteLoaderData<typeof rootLoader>("root");
  const { invoice, returned } = loaderData;
  return (
    <PublicShell room={root?.room ?? "system"}>
      <div className="mx-auto max-w-xl pt-8">
        <p className="text-ink-2">{invoice.laboratoryName}</p>
        <p className="text-[13px] text-ink-3">{invoice.laboratoryAddress.join(", ")}</p>
        <div className="mt-4 flex flex-wrap items-center gap-3">
          <h1 className="text-[27px]">
            Invoice <span className="font-mono text-[22px]">{invoice.number}</span>
          </h1>
          <Chip tone={tones[invoice.state]}>{invoiceStateNames[invoice.state]}</Chip>
        </div>
        <p className="text-ink-2">
          For {invoice.clientName}, {formatCalendarDate(invoice.issuedOn)}
        </p>
        <FormAlert errors={actionData ? [actionData.userMessage] : null} />
        {invoice.state === "open" && returned === "not-paid" ? <FormAlert errors={["The payment was not completed. Nothing was charged; you can try again."]} /> : null}
        {invoice.state === "open" && returned === "paid" ? (
          <p role="status" className="mt-3 rounded-md bg-straw-bg px-3.5 py-2.5 text-straw">
            The payment service says that you have paid; its confirmation is on the way. Look at this page again in a minute.
          </p>
        ) : null}
        <Card className="mt-4">
          <CardBody className="pt-3">
            <table className="w-full">
              <caption className="sr-only">What the invoice is for</caption>
              <tbody>
                {invoice.lines.map((line) => (
                  <tr key={line.label}>
                    <th scope="row" className="py-1.5 text-left font-normal">
                      {line.label}
                      {line.quantity > 1 ? ` × ${line.quantity}` : ""}
                    </th>
                    <td className="py-1.5 text-right font-mono">{line.net}</td>
                  </tr>
                ))}
                <tr>
                  <th scope="row" className="border-t border-rule py-1.5 text-left font-normal text-ink-2">
                    {invoice.taxLabel}
                  </th>
                  <td className="border-t border-rule py-1.5 text-right font-mono">{invoice.tax}</td>
                </tr>
                <tr className="font-semibold">
                  <th scope="row" className="border-t border-rule py-1.5 text-left">
                    {invoice.state === "open" ? "To pay" : "Total"}
                  </th>
                  <td className="border-t border-rule py-1.5 text-right font-mono">{invoice.total}</td>
                </tr>
              </tbody>
            </table>
          </CardBody>
        </Card>
        {invoice.state === "open" ? (
          <Form method="post" reloadDocument className="mt-5">
            <Button className="w-full">Pay {invoice.total}</Button>
            <p className="mt-2 text-[13px] text-ink-3">You pay on the page of the payment service; we never see the card. The fee does not depend on what the stone turns out to be.</p>
          </Form>
        ) : null}
        {invoice.state === "paid" && invoice.paidAt ? <p className="mt-4 rounded-md bg-green-bg px-3.5 py-2.5 text-green">Paid on {formatInstant(invoice.paidAt, invoice.timeZone)}. Thank you; nothing more is due.</p> : null}
      </div>
    </PublicShell>
  );
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} />;
}
