import type { FieldMetadata } from "@conform-to/react";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { instrumentKindNames, instrumentKinds } from "#app/domain/instrument-kind.ts";
import { scaleUnitNames, scaleUnits } from "#app/domain/instrument-scale.ts";

type Field = FieldMetadata<string, Record<string, unknown>, string[]>;
export type ReferenceFieldset = Record<"name" | "forKind" | "unit" | "nominalValue" | "standardUncertainty" | "limitValue" | "expectedText" | "source" | "condition" | "conditionSeenOn", Field>;

export function ReferenceFields({ fields }: { fields: ReferenceFieldset }) {
  const number = { inputMode: "decimal", isMono: true, isRequired: false, autoComplete: "off", maxLength: 24 } as const;
  return (
    <div className="grid gap-3.5 sm:grid-cols-2">
      <TextField key={fields.name.key} {...fieldProps(fields.name)} label="Name" hint="The piece, and which of its values: Quartz Q1, ordinary ray." autoComplete="off" maxLength={120} className="sm:col-span-2" />
      <SelectField key={fields.forKind.key} {...fieldProps(fields.forKind)} label="Checks a" emptyLabel="Choose" options={instrumentKinds.map((value) => ({ value, label: instrumentKindNames[value] }))} />
      <SelectField key={fields.unit.key} {...fieldProps(fields.unit)} label="Unit" isRequired={false} emptyLabel="As usual for the kind" options={scaleUnits.map((value) => ({ value, label: scaleUnitNames[value] }))} />
      <TextField key={fields.nominalValue.key} {...fieldProps(fields.nominalValue)} {...number} label="Its value" hint="As its certificate or the literature says." />
      <TextField key={fields.standardUncertainty.key} {...fieldProps(fields.standardUncertainty)} {...number} label="Standard uncertainty of its value" hint="Half of an expanded one (k = 2)." />
      <TextField key={fields.limitValue.key} {...fieldProps(fields.limitValue)} {...number} label="Limit ±" hint="How far an instrument may be off: 0.002 of an index." />
      <TextField key={fields.expectedText.key} {...fieldProps(fields.expectedText)} label="What is to be seen" isRequired={false} hint="Where the eye judges: red under long wave." autoComplete="off" maxLength={200} />
      <TextField key={fields.source.key} {...fieldProps(fields.source)} label="Source of its value" hint="Certificate with its date, or the literature." autoComplete="off" maxLength={300} className="sm:col-span-2" />
      <TextField key={fields.condition.key} {...fieldProps(fields.condition)} label="Condition" isRequired={false} autoComplete="off" maxLength={300} />
      <TextField key={fields.conditionSeenOn.key} {...fieldProps(fields.conditionSeenOn)} label="Condition seen on" isRequired={false} type="date" />
    </div>
  );
}
