export type FieldFrameProps = {
  id: string;
  label: string;
  /** Beside the label: "ct", "°C", "n". */
  unit?: string;
  hint?: React.ReactNode;
  errors?: readonly string[];
  isRequired?: boolean;
  className?: string;
};

/** Label, hint and messages of one field, tied together for those who hear the page. */
export function FieldFrame({ id, label, unit, hint, errors, isRequired, className = "", children }: FieldFrameProps & { children: React.ReactNode }) {
  return (
    <div className={`min-w-0 ${className}`}>
      <label htmlFor={id} className="mb-1 block text-[12.5px] font-semibold text-ink-2">
        {label}
        {unit ? <span className="font-normal text-ink-3">, {unit}</span> : null}
        {isRequired ? null : <span className="font-normal text-ink-3"> (optional)</span>}
      </label>
      {children}
      <FieldNotes id={id} hint={hint} errors={errors} />
    </div>
  );
}

export function FieldNotes({ id, hint, errors }: Pick<FieldFrameProps, "id" | "hint" | "errors">) {
  return (
    <>
      {errors?.length ? (
        <ul id={`${id}-error`} className="mt-1 list-none text-[13px] text-red">
          {errors.map((error) => (
            <li key={error}>{error}</li>
          ))}
        </ul>
      ) : null}
      {hint ? (
        <p id={`${id}-hint`} className="mt-1 text-[12.5px] text-ink-3">
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

export const inputLook =
  "block w-full min-h-9 rounded-md border border-rule-2 bg-sheet px-2.5 py-1.5 text-ink placeholder:text-ink-3 aria-invalid:border-red focus-visible:outline-offset-0 disabled:opacity-60";
