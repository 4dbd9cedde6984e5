import type { ComponentProps } from "react";
import { benchInputLook, describedBy, FieldFrame, inputLook, type FieldFrameProps } from "./field-frame.tsx";

type TextFieldProps = FieldFrameProps &
  Omit<ComponentProps<"input">, "id" | "children" | "className" | "size"> & {
    name: string;
    /** Measured values and codes are typed in the typewriter face. */
    isMono?: boolean;
    size?: "normal" | "bench";
  };

/** One line. Numbers are typed as text with `inputMode="decimal"`, so that a decimal comma is kept and understood. */
export function TextField({ id, label, unit, hint, errors, isRequired = true, isMono = false, size = "normal", className, ...input }: TextFieldProps) {
  const isNumber = input.inputMode === "decimal" || input.inputMode === "numeric";
  return (
    <FieldFrame {...{ id, label, unit, hint, errors, isRequired, className }}>
      <input
        id={id}
        type="text"
        {...(isNumber ? { autoComplete: "off", spellCheck: false } : {})}
        aria-required={isRequired || undefined}
        {...input}
        {...describedBy({ id, hint, errors })}
        className={`${size === "bench" ? benchInputLook : inputLook} ${isMono ? "font-mono" : ""}`}
      />
    </FieldFrame>
  );
}

type TextAreaProps = FieldFrameProps & Omit<ComponentProps<"textarea">, "id" | "className"> & { name: string };

export function TextAreaField({ id, label, unit, hint, errors, isRequired = true, className, ...input }: TextAreaProps) {
  return (
    <FieldFrame {...{ id, label, unit, hint, errors, isRequired, className }}>
      <textarea id={id} rows={3} aria-required={isRequired || undefined} {...input} {...describedBy({ id, hint, errors })} className={inputLook} />
    </FieldFrame>
  );
}
