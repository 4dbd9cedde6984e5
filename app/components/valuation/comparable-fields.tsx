import type { FieldMetadata } from "@conform-to/react";
import { Button } from "#app/components/ui/button.tsx";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { checkboxProps, fieldProps } from "#app/components/ui/field-props.ts";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { currencyCodes } from "#app/domain/money/money.ts";
import { comparableKindNames, comparableKinds } from "#app/domain/valuation.ts";

type Field = FieldMetadata<unknown, Record<string, unknown>, string[]>;
export type ComparableFieldset = Record<
  "kind" | "reference" | "onDate" | "place" | "description" | "amount" | "currency" | "exchangeRate" | "isPremiumIncluded" | "isTaxIncluded" | "isSold" | "adjustmentFactor" | "adjustmentReason",
  Field
>;

/** One price that the value is compared with. */
export function ComparableFields({ fieldset, position, removeProps }: { fieldset: ComparableFieldset; position: number; removeProps: React.ComponentProps<"button"> }) {
  const f = fieldset;
  return (
    <fieldset className="grid gap-3 rounded-md border border-rule p-3.5 sm:grid-cols-6">
      <legend className="px-1 font-serif text-[16px]">Comparable {position}</legend>
      <SelectField key={f.kind.key} {...fieldProps(f.kind)} label="Kind" emptyLabel="Choose" options={comparableKinds.map((value) => ({ value, label: comparableKindNames[value] }))} className="sm:col-span-2" />
      <TextField key={f.reference.key} {...fieldProps(f.reference)} label="Reference" className="sm:col-span-4" />
      <TextField key={f.description.key} {...fieldProps(f.description)} label="Description" className="sm:col-span-6" />
      <TextField key={f.onDate.key} {...fieldProps(f.onDate)} type="date" label="Date" className="sm:col-span-2" />
      <TextField key={f.place.key} {...fieldProps(f.place)} label="Place" isRequired={false} className="sm:col-span-2" />
      <TextField key={f.amount.key} {...fieldProps(f.amount)} label="Price" inputMode="decimal" isMono className="sm:col-span-1" />
      <SelectField key={f.currency.key} {...fieldProps(f.currency)} label="Currency" options={currencyCodes.map((value) => ({ value, label: value }))} className="sm:col-span-1" />
      <TextField key={f.exchangeRate.key} {...fieldProps(f.exchangeRate)} label="Exchange rate" inputMode="decimal" isMono hint="Into the currency of the value." className="sm:col-span-2" />
      <TextField key={f.adjustmentFactor.key} {...fieldProps(f.adjustmentFactor)} label="Adjusted by" inputMode="decimal" isMono hint="A factor: 1 leaves it." className="sm:col-span-2" />
      <TextField key={f.adjustmentReason.key} {...fieldProps(f.adjustmentReason)} label="Because" isRequired={false} className="sm:col-span-2" />
      <div className="flex flex-wrap gap-x-5 gap-y-1 sm:col-span-5">
        <CheckboxField key={f.isSold.key} {...checkboxProps(f.isSold)} label="Sold, not only asked" />
        <CheckboxField key={f.isPremiumIncluded.key} {...checkboxProps(f.isPremiumIncluded)} label="Buyer’s premium included" />
        <CheckboxField key={f.isTaxIncluded.key} {...checkboxProps(f.isTaxIncluded)} label="Tax included" />
      </div>
      <Button look="quietDanger" size="small" className="justify-self-end" {...removeProps} type="submit">
        Remove
      </Button>
    </fieldset>
  );
}
