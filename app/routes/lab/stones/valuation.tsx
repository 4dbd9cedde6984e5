import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { Form, Link, redirect } from "react-router";
import { PageHeader } from "#app/components/layout/page-header.tsx";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { CheckboxGroupField } from "#app/components/ui/choice-field.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import { ComparableFields, type ComparableFieldset } from "#app/components/valuation/comparable-fields.tsx";
import { SignedValuation } from "#app/components/valuation/signed-valuation.tsx";
import { calendarDateIn } from "#app/domain/calendar-date.ts";
import { conclusionStatement } from "#app/domain/conclusion-statement.ts";
import { currencyCodes } from "#app/domain/money/money.ts";
import { isAllowed } from "#app/domain/permissions.ts";
import { formatStoneCode } from "#app/domain/take-in.ts";
import { certificationPoints, certificationPointTexts, marketLevelNames, marketLevels, valueTypeNames, valueTypes } from "#app/domain/valuation.ts";
import { getValuation } from "#app/features/valuations/get-valuation.server.ts";
import { saveAndSignValuation } from "#app/features/valuations/save-and-sign-valuation.server.ts";
import { saveValuation } from "#app/features/valuations/save-valuation.server.ts";
import { valuationDefaults } from "#app/features/valuations/valuation-defaults.ts";
import { valuationForm } from "#app/features/valuations/valuation-forms.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/valuation";

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const found = await orResponse(getValuation(ctx, { stoneCode: params.stoneCode }));
  const { stone, conclusion, valuation, comparables } = found;
  const isEditable = stone.state === "checked" && stone.isValuationOrdered && valuation?.state !== "signed" && isAllowed(ctx.roles, "valuations.write");
  return {
    stone,
    identity: conclusion && stone.state !== "received" && stone.state !== "examining" ? conclusionStatement({ ...conclusion, confidence: "identified" }) : null,
    isEditable,
    defaults: valuationDefaults({ valuation, comparables, today: calendarDateIn(ctx.now, ctx.laboratory.timeZone), currency: ctx.laboratory.currency }),
    signed: valuation?.state === "signed" ? { valuation, comparables, signedByName: found.signedByName, afterSigning: found.afterSigning } : null,
    timeZone: ctx.laboratory.timeZone,
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "valuations.write");
  const formData = await request.formData();
  const submission = parseWithZod(formData, { schema: valuationForm });
  if (submission.status !== "success") return formInvalid(submission);
  const { stoneCode } = params;
  const here = `/lab/${params.labSlug}/stones/${stoneCode}/valuation`;
  try {
    if (formData.get("then") === "sign") {
      await saveAndSignValuation(ctx, { stoneCode, input: submission.value });
      return redirect(here, { headers: { "Set-Cookie": await noticeHeader("The valuation is signed.") } });
    }
    await saveValuation(ctx, { stoneCode, input: submission.value });
    return redirect(here, { headers: { "Set-Cookie": await noticeHeader("The draft is saved.") } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Valuation of ${params.stoneCode} · Isogyre` }];

export default function ValuationRoute({ loaderData, actionData, params }: Route.ComponentProps) {
  const { stone, identity, isEditable, defaults, signed, timeZone } = loaderData;
  return (
    <>
      <PageHeader
        eyebrow={
          <Link to={`/lab/${params.labSlug}/stones/${stone.code}`} className="text-ink-3">
            {formatStoneCode(stone.code)}
          </Link>
        }
        title="Valuation"
        note={stone.description}
      />
      <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <div className="grid min-w-0 content-start gap-5">
          {signed ? <SignedValuation {...signed} timeZone={timeZone} /> : null}
          {isEditable ? <ValuationDraft key={defaults.rowVersion} defaults={defaults} lastResult={actionData?.result} /> : null}
          {!signed && !isEditable ? (
            <Card title="Nothing to value yet">
              <CardBody>
                <p className="text-ink-2">
                  {stone.isValuationOrdered ? "A value is written on a checked identity only, by an appraiser. The examination is not there yet, or your role does not include it." : "The client did not order a valuation of this stone."}
                </p>
              </CardBody>
            </Card>
          ) : null}
        </div>
        <div className="grid content-start gap-5">
          <Card title={identity?.title ?? "Identity"}>
            <CardBody className="grid gap-2">
              {identity?.statements.map((statement) => <p key={statement}>{statement}</p>) ?? <p className="text-ink-2">Not concluded yet.</p>}
              <Facts rows={[{ name: "Weight", value: stone.weightText ? `${stone.weightText} ct` : null, isMono: true }]} />
              <Link to={`/lab/${params.labSlug}/stones/${stone.code}`} className="text-tint">
                Readings and conclusion
              </Link>
            </CardBody>
          </Card>
          {signed ? null : <Caution>The value declared at take-in and the fee stay hidden until you have signed: neither may be an anchor. A valuation holds for its purpose, market and date only.</Caution>}
        </div>
      </div>
    </>
  );
}

type Defaults = Route.ComponentProps["loaderData"]["defaults"];

function ValuationDraft({ defaults, lastResult }: { defaults: Defaults; lastResult: unknown }) {
  const [form, fields] = useForm<Defaults>({ lastResult: lastResult as never, defaultValue: defaults });
  const comparables = fields.comparables.getFieldList();
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <FormAlert errors={form.errors} id={form.errorId} />
      <input type="hidden" name={fields.rowVersion.name} value={defaults.rowVersion} />
      <Card title="The question" note="what is asked, for whom, as of when">
        <CardBody className="grid gap-4 sm:grid-cols-2">
          <TextField key={fields.purpose.key} {...fieldProps(fields.purpose)} label="Purpose" hint="For example: insurance scheduling." />
          <TextField key={fields.intendedUse.key} {...fieldProps(fields.intendedUse)} label="Intended use" />
          <TextField key={fields.intendedUsers.key} {...fieldProps(fields.intendedUsers)} label="Intended users" hint="Who may rely on it." />
          <SelectField key={fields.valueType.key} {...fieldProps(fields.valueType)} label="Value type" emptyLabel="Choose" options={valueTypes.map((value) => ({ value, label: valueTypeNames[value] }))} />
          <TextAreaField key={fields.valueDefinition.key} {...fieldProps(fields.valueDefinition)} label="Definition, in full" className="sm:col-span-2" />
          <TextField key={fields.valueDefinitionSource.key} {...fieldProps(fields.valueDefinitionSource)} label="Source of the definition" hint="A law, a standard, the insurer’s policy." className="sm:col-span-2" />
          <SelectField key={fields.marketLevel.key} {...fieldProps(fields.marketLevel)} label="Market level" emptyLabel="Choose" options={marketLevels.map((value) => ({ value, label: marketLevelNames[value] }))} />
          <TextField key={fields.marketPlace.key} {...fieldProps(fields.marketPlace)} label="Market place" hint="Country or town." />
          <TextField key={fields.effectiveOn.key} {...fieldProps(fields.effectiveOn)} type="date" label="Effective date" />
          <TextField key={fields.inspectedOn.key} {...fieldProps(fields.inspectedOn)} type="date" label="Inspected on" isRequired={false} />
          <TextField key={fields.inspection.key} {...fieldProps(fields.inspection)} label="Inspection" hint="In hand, as mounted, from records; by whom." className="sm:col-span-2" />
        </CardBody>
      </Card>
      <Card title="Comparables" note="sales comparison; each price with its source, what it includes, and why it is adjusted">
        <CardBody className="grid gap-5">
          {fields.comparables.errors ? <FormAlert errors={fields.comparables.errors} /> : null}
          {comparables.map((comparable, index) => (
            <ComparableFields
              key={comparable.key}
              fieldset={comparable.getFieldset() as unknown as ComparableFieldset}
              position={index + 1}
              removeProps={form.remove.getButtonProps({ name: fields.comparables.name, index })}
            />
          ))}
          {comparables.length === 0 ? <p className="text-ink-2">None yet. A signature needs at least one.</p> : null}
          <Button look="quiet" className="justify-self-start" {...form.insert.getButtonProps({ name: fields.comparables.name })}>
            Add a comparable
          </Button>
        </CardBody>
      </Card>
      <Card title="The opinion">
        <CardBody className="grid gap-4 sm:grid-cols-2">
          <TextField key={fields.amount.key} {...fieldProps(fields.amount)} label="Value" inputMode="decimal" isMono isRequired={false} hint="May stay empty while it is a draft." />
          <SelectField key={fields.currency.key} {...fieldProps(fields.currency)} label="Currency" options={currencyCodes.map((value) => ({ value, label: value }))} />
          <CheckboxGroupField id={fields.isTaxIncluded.id} name={fields.isTaxIncluded.name} label="Tax" defaultValues={fields.isTaxIncluded.initialValue === "on" ? ["on"] : []} options={[{ value: "on", label: "The value includes tax" }]} className="sm:col-span-2" />
          <TextAreaField key={fields.approachReasoning.key} {...fieldProps(fields.approachReasoning)} rows={4} label="How the comparables lead to the value" isRequired={false} className="sm:col-span-2" />
          <TextAreaField key={fields.otherApproachesWhyNot.key} {...fieldProps(fields.otherApproachesWhyNot)} label="Why cost and income were not applied" isRequired={false} className="sm:col-span-2" />
          <TextAreaField key={fields.limitingConditions.key} {...fieldProps(fields.limitingConditions)} rows={5} label="Limiting conditions" hint="One a line." isRequired={false} className="sm:col-span-2" />
          <TextField key={fields.priorServices.key} {...fieldProps(fields.priorServices)} label="Services on this property in the last three years" hint="Empty means none." isRequired={false} className="sm:col-span-2" />
        </CardBody>
      </Card>
      <Card title="Certification" note="tick what is true; a signature needs all">
        <CardBody>
          <CheckboxGroupField
            id={fields.certification.id}
            name={fields.certification.name}
            label="I certify that"
            defaultValues={(fields.certification.initialValue as string[] | undefined) ?? []}
            options={certificationPoints.map((value) => ({ value, label: certificationPointTexts[value] }))}
            errors={fields.certification.errors}
          />
        </CardBody>
      </Card>
      <div className="flex flex-wrap gap-3">
        <Button name="then" value="save" look="quiet">
          Save the draft
        </Button>
        <Button name="then" value="sign">Save and sign</Button>
      </div>
    </Form>
  );
}
