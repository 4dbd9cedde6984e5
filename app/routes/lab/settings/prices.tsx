import { getFormProps, useForm, type FieldMetadata, type SubmissionResult } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect } from "react-router";
import { SettingsNav } from "#app/components/accounts/settings-nav.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { checkboxProps, fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { formatAmount } from "#app/domain/money/format-money.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { serviceCodes, serviceNames } from "#app/domain/take-in.ts";
import { pricesForm } from "#app/features/laboratories/laboratory-forms.server.ts";
import { listPrices } from "#app/features/laboratories/list-prices.server.ts";
import { priceListMark } from "#app/features/laboratories/price-list-mark.ts";
import { updatePrices } from "#app/features/laboratories/update-prices.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/prices";

export async function loader({ context }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const { currency } = ctx.laboratory;
  const list = await orResponse(listPrices(ctx));
  const before = priceListMark(list);
  const typed = Object.fromEntries(
    serviceCodes.flatMap((service) => {
      const price = list.find((row) => row.service === service);
      return [
        [`${service}-label`, price?.label ?? serviceNames[service]],
        [`${service}-amount`, price ? formatAmount({ amountMinor: price.amountMinor, currency }) : ""],
        [`${service}-active`, price?.isActive ? "on" : ""],
      ];
    }),
  );
  return { typed: { ...typed, before } as Record<string, string>, currency, canManage: isAllowed(ctx.roles, "prices.manage") };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "prices.manage");
  const submission = parseWithZod(await request.formData(), { schema: pricesForm(ctx.laboratory.currency) });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await updatePrices(ctx, submission.value);
    return redirect(`/lab/${params.labSlug}/settings/prices`, { headers: { "Set-Cookie": await noticeHeader("The fees are saved. What was agreed before keeps its fee.") } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Fees · Isogyre" }];

export default function PricesRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  return (
    <>
      <PageHeader title="Laboratory" />
      {loaderData.canManage ? <SettingsNav labSlug={params.labSlug} /> : null}
      <PricesForm key={loaderData.typed.before} {...loaderData} lastResult={actionData?.result} />
    </>
  );
}

function PricesForm({ typed, currency, canManage, lastResult }: Route.ComponentProps["loaderData"] & { lastResult: SubmissionResult<string[]> | undefined }) {
  const [form, fields] = useForm<Record<string, string>>({ id: "prices", lastResult, defaultValue: typed });
  const before = fields.before as FieldMetadata<string>;
  return (
    <Form method="post" {...getFormProps(form)} className="max-w-3xl">
      <FormAlert errors={form.errors} id={form.errorId} />
      <Card title="Fees" note="Net of tax, for one stone">
        <CardBody>
          <p className="mb-4 max-w-prose text-ink-2">Fixed amounts only: a fee never depends on the value of a stone or on what is found. A fee is agreed at take-in and does not change afterwards.</p>
          <input type="hidden" name={before.name} defaultValue={before.initialValue} key={before.key} />
          <div className="grid gap-5">
            {serviceCodes.map((service) => {
              const [label, amount, active] = ["label", "amount", "active"].map((part) => fields[`${service}-${part}`] as FieldMetadata<string, Record<string, unknown>, string[]>);
              return (
                <fieldset key={service} className="min-w-0 border-t border-rule pt-3" disabled={!canManage}>
                  <legend className="float-left w-full font-serif text-lg font-medium">{serviceNames[service]}</legend>
                  <div className="clear-both grid gap-x-4 gap-y-3 pt-2 sm:grid-cols-[minmax(0,1fr)_11rem]">
                    <TextField key={label!.key} {...fieldProps(label!)} label="On invoices" maxLength={120} />
                    <TextField key={amount!.key} {...fieldProps(amount!)} label="Fee" unit={currency} inputMode="decimal" isMono maxLength={16} />
                  </div>
                  <CheckboxField key={active!.key} {...checkboxProps(active!)} label="Offered at take-in" className="mt-2" />
                </fieldset>
              );
            })}
          </div>
          {canManage ? <Button className="mt-5">Save the fees</Button> : null}
        </CardBody>
      </Card>
    </Form>
  );
}
