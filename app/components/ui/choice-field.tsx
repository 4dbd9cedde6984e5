import type { ComponentProps, ReactNode } from "react";
import { describedBy, FieldNotes, type FieldFrameProps } from "./field-frame.tsx";

const labelLook = "flex min-h-6 cursor-pointer items-start gap-2.5 py-1 pointer-coarse:min-h-11 pointer-coarse:items-center";
const boxLook = "mt-px size-4.5 shrink-0 accent-tint pointer-coarse:mt-0";

type CheckboxProps = Omit<ComponentProps<"input">, "id" | "className"> & Pick<FieldFrameProps, "id" | "hint" | "errors" | "className"> & { name: string; label: ReactNode };

export function CheckboxField({ id, label, hint, errors, className = "", ...input }: CheckboxProps) {
  return (
    <div className={className}>
      <label htmlFor={id} className={labelLook}>
        <input id={id} type="checkbox" {...input} {...describedBy({ id, hint, errors })} className={boxLook} />
        <span>{label}</span>
      </label>
      <div className="-mt-1 pl-7">
        <FieldNotes id={id} hint={hint} errors={errors} />
      </div>
    </div>
  );
}

type Choice = { value: string; label: ReactNode; hint?: ReactNode };
type GroupProps = Pick<FieldFrameProps, "id" | "label" | "hint" | "errors" | "className"> & {
  name: string;
  options: readonly Choice[];
  /** In one row where there is room. */
  isInline?: boolean;
  /** Side by side where there is room, aligned. */
  hasColumns?: boolean;
};

function ChoiceGroup({ id, label, options, hint, errors, className = "", isInline = false, hasColumns = false, boxOf }: Omit<GroupProps, "name"> & { boxOf: (value: string) => ReactNode }) {
  const layout = isInline ? "flex flex-wrap gap-x-5" : hasColumns ? "grid grid-cols-[repeat(auto-fill,minmax(min(100%,13rem),1fr))] gap-x-6" : "grid";
  return (
    <fieldset className={`min-w-0 ${className}`} aria-describedby={describedBy({ id, hint, errors })["aria-describedby"]}>
      <legend className="mb-1 text-xs font-semibold text-ink-2">{label}</legend>
      <div className={layout}>
        {options.map((option) => (
          <label key={option.value} className={labelLook}>
            {boxOf(option.value)}
            <span>
              {option.label}
              {option.hint ? <span className="block text-xs text-ink-3">{option.hint}</span> : null}
            </span>
          </label>
        ))}
      </div>
      <FieldNotes id={id} hint={hint} errors={errors} />
    </fieldset>
  );
}

/** A few choices, one of them. */
export function RadioGroupField({ name, defaultValue, ...group }: GroupProps & { defaultValue?: string }) {
  return (
    <ChoiceGroup
      {...group}
      boxOf={(value) => <input type="radio" name={name} value={value} defaultChecked={value === defaultValue} aria-invalid={group.errors?.length ? true : undefined} className={boxLook} />}
    />
  );
}

/** A few choices, any of them: each one ticked is sent under the same name. */
export function CheckboxGroupField({ name, defaultValues = [], ...group }: GroupProps & { defaultValues?: readonly string[] }) {
  return (
    <ChoiceGroup
      {...group}
      boxOf={(value) => <input type="checkbox" name={name} value={value} defaultChecked={defaultValues.includes(value)} aria-invalid={group.errors?.length ? true : undefined} className={boxLook} />}
    />
  );
}
