import type { FieldMetadata } from "@conform-to/react";
import { CheckboxField, CheckboxGroupField } from "#app/components/ui/choice-field.tsx";
import { checkboxProps, fieldProps } from "#app/components/ui/field-props.ts";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import type { TestField } from "#app/domain/bench-tests/test-form.ts";
import { testForms, type DescribedKind } from "#app/domain/bench-tests/test-forms.ts";
import type { SpectrumAround } from "./spectrum/spectrum-around.ts";
import { SpectrumField } from "./spectrum/spectrum-field.tsx";

type Fields = Readonly<Record<string, FieldMetadata<string, Record<string, string>, string[]>>>;
const units: Partial<Record<string, string>> = { deg: "°", degC: "°C", x: "×", "1": "" };
const isShort = ({ type }: TestField) => type === "number" || type === "choice";

/** The form of a described test: what it says first and large, how it was seen below in two columns. */
export function DescribedFields({ kind, fields, spectrum }: { kind: DescribedKind; fields: Fields; spectrum?: SpectrumAround }) {
  const seen = testForms[kind].fields.filter(({ isCondition }) => !isCondition);
  const conditions = testForms[kind].fields.filter(({ isCondition }) => isCondition);
  return (
    <>
      {seen.map((field, at) =>
        kind === "spectroscope" && field.name === "lines" ? (
          <LinesField key={field.name} field={field} metadata={fields[field.name]!} spectrum={spectrum} />
        ) : (
          <DescribedField key={field.name} field={field} metadata={fields[field.name]!} isFirst={at === 0} />
        ),
      )}
      {conditions.length > 0 ? (
        <div className="grid grid-cols-2 gap-2.5">
          {conditions.map((field, at) => (
            <div key={field.name} className={isShort(field) && !(at === conditions.length - 1 && at % 2 === 0) ? "min-w-0" : "col-span-2 min-w-0"}>
              <DescribedField field={field} metadata={fields[field.name]!} isFirst={false} />
            </div>
          ))}
        </div>
      ) : null}
    </>
  );
}

function LinesField({ field, metadata, spectrum }: { field: TestField; metadata: Fields[string]; spectrum?: SpectrumAround }) {
  const { id, name, errors, defaultValue = spectrum?.taken } = fieldProps(metadata);
  return (
    <SpectrumField
      {...{ id, name, errors, defaultValue }}
      label={field.label}
      hint={field.hint}
      maxLength={field.type === "words" ? field.most : undefined}
      placeholder={field.type === "words" ? field.example : undefined}
      around={spectrum}
    />
  );
}

function DescribedField({ field, metadata, isFirst }: { field: TestField; metadata: Fields[string]; isFirst: boolean }) {
  const { label, hint } = field;
  const size = isFirst ? "bench" : "normal";
  switch (field.type) {
    case "choice":
      return <SelectField {...fieldProps(metadata)} {...{ label, hint, size }} isRequired={field.isRequired} emptyLabel={field.isRequired ? "Choose" : "Not noted"} options={Object.entries(field.options).map(([value, text]) => ({ value, label: text }))} />;
    case "many":
      return (
        <CheckboxGroupField
          id={metadata.id}
          name={metadata.name}
          errors={metadata.errors}
          {...{ label, hint }}
          hasColumns
          defaultValues={([] as string[]).concat((metadata.initialValue as string | string[] | undefined) ?? [])}
          options={Object.entries(field.options).map(([value, text]) => ({ value, label: text }))}
        />
      );
    case "tick":
      return <CheckboxField {...checkboxProps(metadata)} {...{ label, hint }} />;
    case "words":
      return field.lines === 1 ? (
        <TextField {...fieldProps(metadata)} {...{ label, hint, size }} isRequired={field.isRequired} maxLength={field.most} placeholder={field.example} autoComplete="off" />
      ) : (
        <TextAreaField {...fieldProps(metadata)} {...{ label, hint }} isRequired={field.isRequired} maxLength={field.most} rows={field.lines} placeholder={field.example} />
      );
    case "number":
      return <TextField {...fieldProps(metadata)} {...{ label, hint, size }} unit={(units[field.unit] ?? field.unit) || undefined} isRequired={field.isRequired} inputMode={field.isWhole ? "numeric" : "decimal"} isMono maxLength={24} />;
  }
}
