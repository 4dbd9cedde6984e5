import type { FieldMetadata } from "@conform-to/react";
import { RadioGroupField } from "#app/components/ui/choice-field.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";

type Name = "laboratoryName" | "slug" | "prefix" | "practice" | "timeZone" | "currency";
export type NewLaboratoryFieldset = Record<Name, FieldMetadata<string, Record<string, unknown>, string[]>>;
type Choices = { timeZones: readonly string[]; currencies: ReadonlyArray<{ value: string; label: string }> };

export function NewLaboratoryFields({ fields, timeZones, currencies }: { fields: NewLaboratoryFieldset } & Choices) {
  return (
    <>
      <TextField key={fields.laboratoryName.key} {...fieldProps(fields.laboratoryName)} label="Name of the laboratory" hint="As it is printed on reports." autoComplete="organization" maxLength={120} />
      <RadioGroupField
        key={fields.practice.key}
        {...practiceProps(fields.practice)}
        label="Who works there"
        options={[
          { value: "laboratory", label: "Several people", hint: "A second person checks every conclusion." },
          { value: "sole", label: "I alone", hint: "You hold every role. Your check a day later is called a self-check, never a second check." },
        ]}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField key={fields.slug.key} {...fieldProps(fields.slug)} label="Short name" hint="In addresses, as in /lab/port-ellery. It stays." isMono autoCapitalize="none" spellCheck={false} autoComplete="off" maxLength={40} />
        <TextField key={fields.prefix.key} {...fieldProps(fields.prefix)} label="Letters of your numbers" hint="2 to 6, as MQ in MQ-R-26-00318. They stay." isMono spellCheck={false} autoComplete="off" maxLength={6} />
        <SelectField key={fields.timeZone.key} {...fieldProps(fields.timeZone)} label="Time zone" emptyLabel="Choose" options={timeZones.map((zone) => ({ value: zone, label: zone.replaceAll("_", " ") }))} />
        <SelectField key={fields.currency.key} {...fieldProps(fields.currency)} label="Currency of fees" emptyLabel="Choose" options={currencies} />
      </div>
    </>
  );
}

export function practiceProps(field: FieldMetadata<string, Record<string, unknown>, string[]>) {
  const { defaultValue, ...props } = fieldProps(field);
  return { ...props, defaultValue: defaultValue ?? "" };
}
