import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, redirect } from "react-router";
import { SettingsNav } from "#app/components/accounts/settings-nav.tsx";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { RadioGroupField } from "#app/components/ui/choice-field.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import { formatAmount } from "#app/domain/money/format-money.ts";
import { getLaboratorySettings } from "#app/features/laboratories/get-laboratory-settings.server.ts";
import { laboratorySettingsForm } from "#app/features/laboratories/laboratory-forms.server.ts";
import { updateLaboratory } from "#app/features/laboratories/update-laboratory.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { laboratoryChoices } from "#app/web/laboratory-choices.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/laboratory";

export async function loader({ context }: Route.LoaderArgs) {
  const settings = await orResponse(getLaboratorySettings(context.get(labContext)));
  const { addressLines, isSolePractice, taxShareE4, custodyLimitMinor, currency, ...rest } = settings;
  return {
    currency,
    typed: {
      ...rest,
      address: addressLines.join("\n"),
      practice: isSolePractice ? "sole" : "laboratory",
      taxPercent: String(taxShareE4 / 100),
      usualDays: String(rest.usualDays),
      selfCheckDelayHours: String(rest.selfCheckDelayHours),
      custodyLimit: custodyLimitMinor === null ? "" : formatAmount({ amountMinor: custodyLimitMinor, currency }),
      version: String(rest.version),
    },
    timeZones: laboratoryChoices.timeZones,
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "laboratory.manage");
  const submission = parseWithZod(await request.formData(), { schema: laboratorySettingsForm(ctx.laboratory.currency) });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await updateLaboratory(ctx, submission.value);
    return redirect(`/lab/${params.labSlug}/settings`, { headers: { "Set-Cookie": await noticeHeader("The settings are saved.") } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = () => [{ title: "Laboratory · Isogyre" }];

type Typed = Route.ComponentProps["loaderData"]["typed"];

export default function LaboratorySettingsRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { typed, timeZones, currency } = loaderData;
  const [form, fields] = useForm<Typed>({ id: `settings-${typed.version}`, lastResult: actionData?.result, defaultValue: typed });
  return (
    <>
      <PageHeader title="Laboratory" />
      <SettingsNav labSlug={params.labSlug} />
      <Form method="post" {...getFormProps(form)} className="grid max-w-5xl gap-5 lg:grid-cols-2">
        <div className="lg:col-span-2 empty:hidden">
          <FormAlert errors={form.errors} id={form.errorId} />
        </div>
        <input type="hidden" name={fields.version.name} defaultValue={fields.version.initialValue} key={fields.version.key} />
        <Card title="Letterhead" note="Printed on reports, receipts and invoices" className="self-start">
          <CardBody className="grid gap-4">
            <TextField key={fields.name.key} {...fieldProps(fields.name)} label="Name" autoComplete="organization" maxLength={120} />
            <TextAreaField key={fields.address.key} {...fieldProps(fields.address)} label="Address" hint="At most six lines." rows={4} autoComplete="street-address" />
            <TextField key={fields.phone.key} {...fieldProps(fields.phone)} label="Telephone" isRequired={false} type="tel" autoComplete="tel" maxLength={40} />
            <TextField key={fields.email.key} {...fieldProps(fields.email)} label="E-mail address" isRequired={false} type="email" autoComplete="email" maxLength={254} />
            <Facts
              rows={[
                { name: "Address here", value: `/lab/${typed.slug}`, isMono: true },
                { name: "Numbers", value: `${typed.prefix}-R-26-00001`, isMono: true },
                { name: "Currency", value: currency, isMono: true },
              ]}
            />
          </CardBody>
        </Card>
        <div className="grid content-start gap-5">
          <Card title="Time and work">
            <CardBody className="grid gap-4">
              <SelectField key={fields.timeZone.key} {...fieldProps(fields.timeZone)} label="Time zone" options={timeZones.map((zone) => ({ value: zone, label: zone.replaceAll("_", " ") }))} />
              <TextField key={fields.usualDays.key} {...fieldProps(fields.usualDays)} label="Usual time from take-in to report" unit="days" inputMode="numeric" isMono maxLength={3} />
              <RadioGroupField
                key={fields.practice.key}
                {...fieldProps(fields.practice)}
                label="Who works here"
                options={[
                  { value: "laboratory", label: "Several people", hint: "A second person checks every conclusion." },
                  { value: "sole", label: "One person alone", hint: "A delayed self-check, labelled as such." },
                ]}
              />
              <TextField key={fields.selfCheckDelayHours.key} {...fieldProps(fields.selfCheckDelayHours)} label="A self-check is made no sooner than after" unit="hours" inputMode="numeric" isMono hint="For a person alone; at least 24." maxLength={3} />
            </CardBody>
          </Card>
          <Card title="Money and custody">
            <CardBody className="grid gap-4">
              <div className="grid gap-4 sm:grid-cols-2">
                <TextField key={fields.taxLabel.key} {...fieldProps(fields.taxLabel)} label="Name of the tax on fees" maxLength={40} />
                <TextField key={fields.taxPercent.key} {...fieldProps(fields.taxPercent)} label="Its rate" unit="%" inputMode="decimal" isMono maxLength={6} />
              </div>
              <TextField
                key={fields.custodyLimit.key}
                {...fieldProps(fields.custodyLimit)}
                label="Most that may lie in custody at once"
                unit={currency}
                hint="What the insurer covers, by declared values. Empty where there is no limit."
                isRequired={false}
                inputMode="decimal"
                isMono
                maxLength={20}
              />
            </CardBody>
          </Card>
        </div>
        <div className="lg:col-span-2">
          <Button>Save the settings</Button>
        </div>
      </Form>
    </>
  );
}
