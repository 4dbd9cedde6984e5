import type { ComponentProps } from "react";
import { describedBy, FieldFrame, inputLook, type FieldFrameProps } from "./field-frame.tsx";
import { Icon } from "./icon.tsx";

type Option = { value: string; label: string };
type OptionGroup = { group: string; options: readonly Option[] };
type SelectFieldProps = FieldFrameProps &
  Omit<ComponentProps<"select">, "id" | "className" | "children" | "size"> & {
    name: string;
    options: readonly (Option | OptionGroup)[];
    /** The first, empty choice: shown until something is chosen. */
    emptyLabel?: string;
    size?: "normal" | "bench";
  };

const optionOf = ({ value, label }: Option) => (
  <option key={value} value={value}>
    {label}
  </option>
);

export function SelectField({ id, label, unit, hint, errors, isRequired = true, size = "normal", className, options, emptyLabel, ...select }: SelectFieldProps) {
  return (
    <FieldFrame {...{ id, label, unit, hint, errors, isRequired, className }}>
      <span className="relative block">
        <select id={id} aria-required={isRequired || undefined} {...select} {...describedBy({ id, hint, errors })} className={`${inputLook} appearance-none truncate pr-9 ${size === "bench" ? "min-h-11" : ""}`}>
          {emptyLabel === undefined ? null : <option value="">{emptyLabel}</option>}
          {options.map((option) =>
            "group" in option ? (
              <optgroup key={option.group} label={option.group}>
                {option.options.map(optionOf)}
              </optgroup>
            ) : (
              optionOf(option)
            ),
          )}
        </select>
        <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-ink-2">
          <Icon name="down" sizePx={14} />
        </span>
      </span>
    </FieldFrame>
  );
}
