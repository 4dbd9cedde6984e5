import type { ReactNode } from "react";
import { Icon } from "./icon.tsx";

export type FieldFrameProps = {
  id: string;
  label: string;
  /** Beside the label: "ct", "°C", "n". */
  unit?: string;
  hint?: ReactNode;
  errors?: readonly string[];
  isRequired?: boolean;
  className?: string;
};

/** Label, hint and messages of one field, tied together for those who hear the page. */
export function FieldFrame({ id, label, unit, hint, errors, isRequired, className = "", children }: FieldFrameProps & { children: ReactNode }) {
  return (
    <div className={`min-w-0 ${className}`}>
      <label htmlFor={id} className="mb-1 block text-xs font-semibold text-ink-2">
        {label}
        {unit ? <span className="font-normal text-ink-3">, {unit}</span> : null}
        {isRequired ? null : <span className="font-normal text-ink-3"> (optional)</span>}
      </label>
      {children}
      <FieldNotes id={id} hint={hint} errors={errors} />
    </div>
  );
}

/** What is wrong, a sentence a line, then the hint. */
export function FieldNotes({ id, hint, errors }: Pick<FieldFrameProps, "id" | "hint" | "errors">) {
  return (
    <>
      {errors?.length ? (
        <ul id={`${id}-error`} className="mt-1 grid gap-0.5 text-xs font-medium text-red">
          {errors.map((error) => (
            <li key={error} className="flex gap-1.5">
              <span className="pt-px">
                <Icon name="alert" sizePx={14} />
              </span>
              <span>{error}</span>
            </li>
          ))}
        </ul>
      ) : null}
      {hint ? (
        <p id={`${id}-hint`} className="mt-1 text-xs text-ink-3">
          {hint}
        </p>
      ) : null}
    </>
  );
}

/** The attributes that tie an input to its messages. */
export function describedBy({ id, hint, errors }: Pick<FieldFrameProps, "id" | "hint" | "errors">) {
  const ids = [errors?.length ? `${id}-error` : "", hint ? `${id}-hint` : ""].filter(Boolean).join(" ");
  return { "aria-invalid": errors?.length ? true : undefined, "aria-describedby": ids || undefined } as const;
}

export const inputLook = "control block w-full px-3 py-1.5 disabled:opacity-60";
/** The same at the bench: 44 px and large figures, read at arm's length in the dark. */
export const benchInputLook = "control block w-full min-h-11 px-3 py-1.5 text-lg font-medium disabled:opacity-60";
