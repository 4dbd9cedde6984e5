import type { FieldMetadata } from "@conform-to/react";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { instrumentKindNames, instrumentKinds } from "#app/domain/instrument-kind.ts";
import { scaleUnitNames, scaleUnits } from "#app/domain/instrument-scale.ts";

type Field = FieldMetadata<string, Record<string, unknown>, string[]>;
export type InstrumentFieldset = Record<"kind" | "name" | "description" | "serial" | "location" | "scaleUnit" | "checkDays" | "resolution" | "standardUncertainty" | "upperLimit" | "prismIndex", Field>;

export function InstrumentFields({ fields }: { fields: InstrumentFieldset }) {
  const number = { inputMode: "decimal", isMono: true, isRequired: false, autoComplete: "off", maxLength: 24 } as const;
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <SelectField key={fields.kind.key} {...fieldProps(fields.kind)} label="Kind" emptyLabel="Choose" options={instrumentKinds.map((value) => ({ value, label: instrumentKindNames[value] }))} />
      <TextField key={fields.name.key} {...fieldProps(fields.name)} label="Name" hint="As on its label: B1, R2." autoComplete="off" maxLength={40} />
      <TextField key={fields.description.key} {...fieldProps(fields.description)} label="Description" isRequired={false} autoComplete="off" maxLength={200} />
      <TextField key={fields.serial.key} {...fieldProps(fields.serial)} label="Serial number" isRequired={false} isMono autoComplete="off" maxLength={80} />
      <TextField key={fields.location.key} {...fieldProps(fields.location)} label="Where it stands" isRequired={false} autoComplete="off" maxLength={80} />
      <SelectField key={fields.scaleUnit.key} {...fieldProps(fields.scaleUnit)} label="Unit of its scale" isRequired={false} emptyLabel="As usual for the kind" options={scaleUnits.map((value) => ({ value, label: scaleUnitNames[value] }))} />
      <TextField key={fields.checkDays.key} {...fieldProps(fields.checkDays)} {...number} inputMode="numeric" label="Days between checks" hint="Left empty, what is usual for the kind." />
      <TextField key={fields.resolution.key} {...fieldProps(fields.resolution)} {...number} label="Smallest step read" hint="In its own unit: 0.001." />
      <TextField key={fields.standardUncertainty.key} {...fieldProps(fields.standardUncertainty)} {...number} label="Standard uncertainty of a reading" hint="From your own study; left empty, that of the kind." />
      <TextField key={fields.upperLimit.key} {...fieldProps(fields.upperLimit)} {...number} label="Highest index" hint="Refractometers: what the contact liquid lets be read." />
      <TextField key={fields.prismIndex.key} {...fieldProps(fields.prismIndex)} {...number} label="Index of the prism" hint="Angle refractometers: at 589.3 nm." />
    </div>
  );
}
