import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { RadioGroupField } from "#app/components/ui/choice-field.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { checkAdvice, scaleUnitSigns } from "#app/domain/instrument-scale.ts";
import type { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import type { ReferenceMaterial } from "#app/features/reference-materials/list-reference-materials.server.ts";

type CheckCardProps = {
  instrument: Awaited<ReturnType<typeof getInstrument>>;
  references: readonly ReferenceMaterial[];
  requestId: string;
  /** Calendar dates in the laboratory's zone. */
  tomorrow: string;
  usualNextDueOn: string;
  lastResult: SubmissionResult<string[]> | undefined;
};

type Names = "requestId" | "reference" | "referenceMaterial" | "nominal" | "reading" | "limit" | "seenText" | "outcome" | "tempC" | "nextDueOn" | "note";

export function CheckCard({ instrument, references, requestId, tomorrow, usualNextDueOn, lastResult }: CheckCardProps) {
  const last = instrument.checks[0];
  const text = (value: number | null | undefined) => (value === null || value === undefined ? undefined : String(value));
  const [form, fields] = useForm<Record<Names, string>>({
    id: "check",
    lastResult,
    // The same reference as last time is likely; what the instrument shows is never filled in for anybody.
    defaultValue: {
      requestId,
      nextDueOn: usualNextDueOn,
      reference: last?.referenceRef ?? undefined,
      ...(last?.referenceRef ? {} : { referenceMaterial: last?.referenceMaterial, nominal: text(last?.nominalValue), limit: text(last?.limitValue) }),
    },
  });
  const number = { inputMode: "decimal", isMono: true, autoComplete: "off", maxLength: 24 } as const;
  const hasScale = instrument.unit !== null;
  const behind = instrument.unit ? scaleUnitSigns[instrument.unit] : "";
  return (
    <Card title="Record a check" id="record-check" className="content-start self-start">
      <CardBody>
        <Form method="post" {...getFormProps(form)} className="grid gap-3.5">
          <FormAlert errors={form.errors} id={form.errorId} />
          <input type="hidden" name="intent" value="check" />
          <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
          <p className="text-[12.5px] text-ink-3">{checkAdvice[instrument.kind]}</p>
          {references.length > 0 ? (
            <SelectField
              key={fields.reference.key}
              {...fieldProps(fields.reference)}
              label="Reference"
              isRequired={false}
              emptyLabel="Another, named below"
              options={references.map(({ ref, name, nominalValue, limitValue, expectedText }) => ({ value: ref, label: `${name}, ${nominalValue === null ? expectedText : `${nominalValue} ± ${limitValue}`}` }))}
            />
          ) : null}
          <TextField key={fields.referenceMaterial.key} {...fieldProps(fields.referenceMaterial)} label={references.length > 0 ? "Another reference" : "Reference"} isRequired={references.length === 0} hint="A check weight, a piece of quartz." autoComplete="off" maxLength={120} />
          {hasScale ? (
            <>
              <div className="grid grid-cols-2 gap-3">
                <TextField key={fields.nominal.key} {...fieldProps(fields.nominal)} {...number} unit={behind} label="Its value" isRequired={references.length === 0} />
                <TextField key={fields.limit.key} {...fieldProps(fields.limit)} {...number} unit={behind} label="Limit ±" isRequired={references.length === 0} />
              </div>
              <TextField key={fields.reading.key} {...fieldProps(fields.reading)} {...number} unit={behind} label="Shown" hint={instrument.corrections.some(({ endedAt }) => endedAt === null) ? "As the instrument shows it: its correction is added before it is judged." : undefined} />
            </>
          ) : (
            <>
              <input type="hidden" name="isSeen" value="on" />
              <TextField key={fields.seenText.key} {...fieldProps(fields.seenText)} label="Seen" autoComplete="off" maxLength={200} />
              <RadioGroupField
                key={fields.outcome.key}
                id={fields.outcome.id}
                name={fields.outcome.name}
                errors={fields.outcome.errors}
                defaultValue={fields.outcome.initialValue}
                label="As it should be?"
                isInline
                options={[
                  { value: "asExpected", label: "Yes" },
                  { value: "notAsExpected", label: "No" },
                ]}
              />
            </>
          )}
          <div className="grid grid-cols-2 gap-3">
            <TextField key={fields.tempC.key} {...fieldProps(fields.tempC)} {...number} label="Temperature" unit="°C" isRequired={false} />
            <TextField key={fields.nextDueOn.key} {...fieldProps(fields.nextDueOn)} label="Next check" type="date" min={tomorrow} />
          </div>
          <TextField key={fields.note.key} {...fieldProps(fields.note)} label="Note" isRequired={false} autoComplete="off" maxLength={500} />
          <Button>Record the check</Button>
          <p className="text-[12.5px] text-ink-3">A check beyond its limit takes the instrument out of service at once, and calls back what was read on it since its last good check.</p>
        </Form>
      </CardBody>
    </Card>
  );
}
