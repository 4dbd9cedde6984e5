import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Chip, type Tone } from "#app/components/ui/chip.tsx";
import { RadioGroupField } from "#app/components/ui/choice-field.tsx";
import { Confirm } from "#app/components/ui/confirm.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { formatCalendarDate, formatInstant } from "#app/domain/calendar-date.ts";
import { invoiceStateNames, type InvoiceState } from "#app/domain/invoice-state.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { getInvoice } from "#app/features/invoices/get-invoice.server.ts";
import { invoiceAction } from "#app/features/invoices/invoice-forms.server.ts";
import { recordDeskPayment } from "#app/features/invoices/record-desk-payment.server.ts";
import { refundInvoice } from "#app/features/invoices/refund-invoice.server.ts";
import { sendInvoice } from "#app/features/invoices/send-invoice.server.ts";
import { voidInvoice } from "#app/features/invoices/void-invoice.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/detail";

const tones: Record<InvoiceState, Tone> = { open: "straw", paid: "green", refunded: "plain", void: "plain" };

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const invoice = await orResponse(getInvoice(ctx, { number: params.number }));
  return { invoice, timeZone: ctx.laboratory.timeZone, taxLabel: ctx.laboratory.taxLabel, canManage: isAllowed(ctx.roles, "invoices.manage") };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "invoices.manage");
  const submission = parseWithZod(await request.formData(), { schema: invoiceAction });
  if (submission.status !== "success") return formInvalid(submission);
  const { number } = params;
  const input = submission.value;
  try {
    let notice: string;
    if (input.intent === "send") notice = `The pay link is on its way to ${(await sendInvoice(ctx, { number })).to}.`;
    else if (input.intent === "take") {
      await recordDeskPayment(ctx, { number, method: input.method, reference: input.reference });
      notice = `Invoice ${number} is paid.`;
    } else if (input.intent === "void") {
      await voidInvoice(ctx, { number, reason: input.reason });
      notice = `Invoice ${number} is void.`;
    } else {
      await refundInvoice(ctx, { number, reason: input.reason });
      notice = `What was received for invoice ${number} is given back.`;
    }
    return redirect(`/lab/${params.labSlug}/invoices/${number}`, { headers: { "Set-Cookie": await noticeHeader(notice) } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `${params.number} · Isogyre` }];

export default function InvoiceRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { invoice, timeZone, taxLabel, canManage } = loaderData;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`/lab/${params.labSlug}/invoices`} className="text-ink-3">
            Invoices
          </Link>
        }
        title={<span className="font-mono text-[24px]">{invoice.number}</span>}
        note={`${invoice.clientName}, ${formatCalendarDate(invoice.issuedOn)}`}
        actions={<Chip tone={tones[invoice.state]}>{invoiceStateNames[invoice.state]}</Chip>}
      />
      <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="grid content-start gap-5">
          <Card title="Fee" note="agreed when the goods were taken in">
            <Table caption="Lines of the invoice">
              <thead>
                <tr>
                  <HeaderCell>Service</HeaderCell>
                  <HeaderCell isNumber>Stones</HeaderCell>
                  <HeaderCell isNumber>Each</HeaderCell>
                  <HeaderCell isNumber>Net</HeaderCell>
                </tr>
              </thead>
              <tbody>
                {invoice.lines.map((line) => (
                  <tr key={line.label}>
                    <Cell>{line.label}</Cell>
                    <Cell isNumber>{line.quantity}</Cell>
                    <Cell isNumber>{line.unit}</Cell>
                    <Cell isNumber>{line.net}</Cell>
                  </tr>
                ))}
                <tr>
                  <Cell className="text-ink-2">{taxLabel}</Cell>
                  <Cell />
                  <Cell />
                  <Cell isNumber>{invoice.tax}</Cell>
                </tr>
                <tr className="font-semibold">
                  <Cell>Total</Cell>
                  <Cell />
                  <Cell />
                  <Cell isNumber>{invoice.total}</Cell>
                </tr>
              </tbody>
            </Table>
          </Card>
          {invoice.movements.length > 0 ? (
            <Card title="Money received and given back">
              <Table caption="Payments and refunds">
                <thead>
                  <tr>
                    <HeaderCell>When</HeaderCell>
                    <HeaderCell>What</HeaderCell>
                    <HeaderCell isNumber>Amount</HeaderCell>
                  </tr>
                </thead>
                <tbody>
                  {invoice.movements.map((movement, index) => (
                    <tr key={index}>
                      <Cell>{formatInstant(movement.receivedAt, timeZone)}</Cell>
                      <Cell>{movement.kind === "payment" ? `Received, ${movement.method}` : `Given back, ${movement.method}`}</Cell>
                      <Cell isNumber>{movement.amount}</Cell>
                    </tr>
                  ))}
                </tbody>
              </Table>
            </Card>
          ) : null}
        </div>
        <div className="grid content-start gap-5">
          <Card title="Where it stands">
            <CardBody>
              <Facts
                rows={[
                  { name: "Receipt", value: <Link to={`/lab/${params.labSlug}/take-ins/${invoice.takeInNumber}`} className="font-mono text-tint">{invoice.takeInNumber}</Link> },
                  { name: "Sent", value: invoice.sentAt ? formatInstant(invoice.sentAt, timeZone) : "Not yet" },
                  { name: "Paid", value: invoice.paidAt ? formatInstant(invoice.paidAt, timeZone) : null },
                  { name: "Void because", value: invoice.voidReason },
                  { name: "Terms", value: invoice.hasAccountTerms ? "Account: reports are issued before payment" : "Reports are issued when it is paid" },
                ]}
              />
              {invoice.state === "open" ? (
                <p className="mt-3 text-[13px] break-all text-ink-3">
                  Pay link: <a href={invoice.payUrl}>{invoice.payUrl}</a>
                </p>
              ) : null}
            </CardBody>
          </Card>
          {canManage ? <InvoiceActions state={invoice.state} email={invoice.clientEmail} lastResult={actionData?.result} /> : null}
        </div>
      </div>
    </>
  );
}

function InvoiceActions({ state, email, lastResult }: { state: InvoiceState; email: string; lastResult: Parameters<typeof useForm>[0]["lastResult"] }) {
  const [form, fields] = useForm<{ intent: string; method: string; reference: string; reason: string }>({ lastResult: lastResult as never });
  const intent = form.value?.intent;
  const errorsOf = (name: string, field: { errors?: string[] }) => (intent === name ? field.errors : undefined);
  if (state === "refunded" || state === "void") return null;
  return (
    <Card title="What next">
      <CardBody className="grid gap-4">
        <FormAlert errors={form.errors} id={form.errorId} />
        {state === "open" ? (
          <>
            <Form method="post">
              <Button name="intent" value="send" disabled={!email}>
                Send the pay link
              </Button>
              <p className="mt-1 text-[13px] text-ink-3">{email ? `To ${email}.` : "The client has no e-mail address yet."}</p>
            </Form>
            <Confirm summary="Paid at the desk" tone="quiet">
              <Form method="post" {...getFormProps(form)} id="take" className="grid gap-3">
                <RadioGroupField id="method" name="method" label="How" isInline defaultValue="cash" options={[{ value: "cash", label: "Cash" }, { value: "transfer", label: "Bank transfer" }]} errors={errorsOf("take", fields.method)} />
                <TextField id="reference" name="reference" label="Reference" hint="The till's slip, or the bank's reference." maxLength={100} errors={errorsOf("take", fields.reference)} />
                <Button name="intent" value="take" className="justify-self-start">
                  Record the payment
                </Button>
              </Form>
            </Confirm>
            <Confirm summary="Make it void">
              <Form method="post" className="grid gap-3">
                <TextField id="void-reason" name="reason" label="Why" maxLength={300} errors={errorsOf("void", fields.reason)} />
                <Button look="danger" name="intent" value="void" className="justify-self-start">
                  Make it void
                </Button>
              </Form>
            </Confirm>
          </>
        ) : (
          <Confirm summary="Give it back">
            <Form method="post" className="grid gap-3">
              <TextField id="refund-reason" name="reason" label="Why" maxLength={300} hint="A card gets it back through the payment service; cash and transfers you give back yourself." errors={errorsOf("refund", fields.reason)} />
              <Button look="danger" name="intent" value="refund" className="justify-self-start">
                Give everything back
              </Button>
            </Form>
          </Confirm>
        )}
      </CardBody>
    </Card>
  );
}
