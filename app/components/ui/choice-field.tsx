import { describedBy, FieldNotes, type FieldFrameProps } from "./field-frame.tsx";

type CheckboxProps = Omit<React.ComponentProps<"input">, "id" | "className"> & Pick<FieldFrameProps, "id" | "hint" | "errors" | "className"> & { name: string; label: React.ReactNode };

export function CheckboxField({ id, label, hint, errors, className = "", ...input }: CheckboxProps) {
  return (
    <div className={className}>
      <label htmlFor={id} className="flex min-h-6 items-start gap-2.5">
        <input id={id} type="checkbox" {...input} {...describedBy({ id, hint, errors })} className="mt-0.5 size-4 shrink-0 accent-tint" />
        <span>{label}</span>
      </label>
      <div className="pl-6.5">
        <FieldNotes id={id} hint={hint} errors={errors} />
      </div>
    </div>
  );
}

type RadioGroupProps = Pick<FieldFrameProps, "id" | "label" | "hint" | "errors" | "className"> & {
  name: string;
  options: ReadonlyArray<{ value: string; label: React.ReactNode }>;
  defaultValue?: string;
  /** In one row where there is room. */
  isInline?: boolean;
};

export function RadioGroupField({ id, label, name, options, defaultValue, hint, errors, className = "", isInline = false }: RadioGroupProps) {
  return (
    <fieldset className={className} {...describedBy({ id, hint, errors })}>
      <legend className="mb-1 text-[12.5px] font-semibold text-ink-2">{label}</legend>
      <div className={isInline ? "flex flex-wrap gap-x-5 gap-y-1" : "grid gap-1"}>
        {options.map((option) => (
          <label key={option.value} className="flex min-h-6 items-start gap-2">
            <input type="radio" name={name} value={option.value} defaultChecked={option.value === defaultValue} className="mt-0.5 size-4 shrink-0 accent-tint" />
            <span>{option.label}</span>
          </label>
        ))}
      </div>
      <FieldNotes id={id} hint={hint} errors={errors} />
    </fieldset>
  );
}
