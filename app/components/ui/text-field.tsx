import { describedBy, FieldFrame, inputLook, type FieldFrameProps } from "./field-frame.tsx";

type TextFieldProps = FieldFrameProps &
  Omit<React.ComponentProps<"input">, "id" | "children" | "className"> & {
    name: string;
    /** Measured values and codes are typed in the typewriter face. */
    isMono?: boolean;
  };

/** One line. Numbers are typed as text with `inputMode="decimal"`, so that a decimal comma is kept and understood. */
export function TextField({ id, label, unit, hint, errors, isRequired = true, isMono = false, className, ...input }: TextFieldProps) {
  return (
    <FieldFrame {...{ id, label, unit, hint, errors, isRequired, className }}>
      <input id={id} type="text" {...input} {...describedBy({ id, hint, errors })} className={`${inputLook} ${isMono ? "font-mono" : ""}`} />
    </FieldFrame>
  );
}

type TextAreaProps = FieldFrameProps & Omit<React.ComponentProps<"textarea">, "id" | "className"> & { name: string };

export function TextAreaField({ id, label, unit, hint, errors, isRequired = true, className, ...input }: TextAreaProps) {
  return (
    <FieldFrame {...{ id, label, unit, hint, errors, isRequired, className }}>
      <textarea id={id} rows={3} {...input} {...describedBy({ id, hint, errors })} className={inputLook} />
    </FieldFrame>
  );
}
