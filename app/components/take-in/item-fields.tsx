import type { FieldMetadata } from "@conform-to/react";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FieldNotes } from "#app/components/ui/field-frame.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import { consentQuestions } from "#app/domain/consent.ts";

type Field = FieldMetadata<string, Record<string, unknown>, string[]>;
export type ItemFieldset = Record<"description" | "mount" | "stoneCount" | "massText" | "massUnit" | "balanceId" | "condition" | "declaredValue" | "seal", Field> & { consents: FieldMetadata<string[], Record<string, unknown>, string[]> };
export type BalanceChoice = { ref: string; name: string; checked: string };

/** One thing that is handed over: what is seen of it, counted, weighed, and what may be done to it. */
export function ItemFields({ fields, position, balances, currency, remove }: { fields: ItemFieldset; position: number; balances: readonly BalanceChoice[]; currency: string; remove: React.ReactNode }) {
  const ticked = ([] as string[]).concat((fields.consents.initialValue as unknown as string | string[] | undefined) ?? []);
  return (
    <fieldset className="border-t border-rule px-4.5 pt-4 pb-5">
      <legend className="sr-only">Item {position}</legend>
      <div className="mb-3 flex flex-wrap items-baseline gap-x-3">
        <h2 className="text-[18px]">Item {position}</h2>
        <p className="text-ink-2">Only what is seen: colour, shape, setting, condition. What it is gets said later, by a gemmologist.</p>
        <div className="ml-auto">{remove}</div>
      </div>
      <div className="grid gap-3.5 sm:grid-cols-12">
        <TextField key={fields.description.key} {...fieldProps(fields.description)} label="As received" className="sm:col-span-12 xl:col-span-8" autoComplete="off" maxLength={300} />
        <SelectField
          key={fields.mount.key}
          {...fieldProps(fields.mount)}
          label="Loose or set"
          className="sm:col-span-4 xl:col-span-2"
          options={[
            { value: "loose", label: "Loose" },
            { value: "mounted", label: "Mounted" },
            { value: "strung", label: "Strung" },
          ]}
        />
        <TextField key={fields.stoneCount.key} {...fieldProps(fields.stoneCount)} label="Stones" className="sm:col-span-2" inputMode="numeric" isMono autoComplete="off" maxLength={9} />
        <TextField key={fields.massText.key} {...fieldProps(fields.massText)} label="Weight" className="sm:col-span-4 xl:col-span-3" inputMode="decimal" isMono autoComplete="off" maxLength={24} hint="All digits that the balance shows." />
        <SelectField
          key={fields.massUnit.key}
          {...fieldProps(fields.massUnit)}
          label="Unit"
          className="sm:col-span-2"
          options={[
            { value: "ct", label: "ct" },
            { value: "g", label: "g" },
          ]}
        />
        <SelectField
          key={fields.balanceId.key}
          {...fieldProps(fields.balanceId)}
          label="Balance"
          className="sm:col-span-7 xl:col-span-4"
          emptyLabel="Choose"
          options={balances.map(({ ref, name, checked }) => ({ value: ref, label: `${name}, ${checked}` }))}
        />
        <TextField
          key={fields.declaredValue.key}
          {...fieldProps(fields.declaredValue)}
          label="Declared value"
          unit={currency}
          isRequired={false}
          className="sm:col-span-5 xl:col-span-3"
          inputMode="decimal"
          isMono
          autoComplete="off"
          maxLength={40}
          hint="Custody only, hidden from examiners."
        />
        <TextAreaField key={fields.condition.key} {...fieldProps(fields.condition)} label="Condition" className="sm:col-span-8" rows={2} maxLength={1000} hint="Chips, abrasion, loose or missing parts, repairs. If nothing is seen: none seen with 10×." />
        <TextField key={fields.seal.key} {...fieldProps(fields.seal)} label="Seal or bag" isRequired={false} className="sm:col-span-4" isMono autoComplete="off" maxLength={60} />
      </div>
      <fieldset className="mt-4">
        <legend className="text-[12.5px] font-semibold text-ink-2">Consents</legend>
        <p className="mb-2 text-ink-2">A test that is not ticked will not be offered at the bench.</p>
        <div className="grid gap-x-5 gap-y-1.5 sm:grid-cols-2 xl:grid-cols-3" key={fields.consents.key}>
          {consentQuestions.map(({ code, label, caution }) => (
            <label key={code} className="flex min-h-6 items-start gap-2.5">
              <input type="checkbox" name={fields.consents.name} value={code} defaultChecked={ticked.includes(code)} className="mt-0.5 size-4 shrink-0 accent-tint" />
              <span>
                {label}
                {caution ? <span className="block text-[12.5px] text-ink-3">{caution}</span> : null}
              </span>
            </label>
          ))}
        </div>
        <FieldNotes id={fields.consents.id} errors={fields.consents.errors} />
      </fieldset>
    </fieldset>
  );
}
