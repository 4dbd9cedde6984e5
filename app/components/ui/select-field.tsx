import { describedBy, FieldFrame, inputLook, type FieldFrameProps } from "./field-frame.tsx";

type Option = { value: string; label: string };
type SelectFieldProps = FieldFrameProps &
  Omit<React.ComponentProps<"select">, "id" | "className" | "children"> & {
    name: string;
    options: readonly Option[];
    /** The first, empty choice: shown until something is chosen. */
    emptyLabel?: string;
  };

export function SelectField({ id, label, unit, hint, errors, isRequired = true, className, options, emptyLabel, ...select }: SelectFieldProps) {
  return (
    <FieldFrame {...{ id, label, unit, hint, errors, isRequired, className }}>
      <select id={id} {...select} {...describedBy({ id, hint, errors })} className={inputLook}>
        {emptyLabel === undefined ? null : <option value="">{emptyLabel}</option>}
        {options.map(({ value, label: text }) => (
          <option key={value} value={value}>
            {text}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}
