import { useState } from "react";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { useIsHydrated } from "#app/components/layout/use-is-hydrated.ts";

type PasswordFieldProps = { id: string; name: string; label: string; errors?: string[]; autoComplete: "current-password" | "new-password"; hint?: React.ReactNode };

/** A password that can be pasted, filled in by a manager, and looked at where script runs. Never filled in by the server. */
export function PasswordField({ id, name, label, errors, autoComplete, hint }: PasswordFieldProps) {
  const isHydrated = useIsHydrated();
  const [isShown, setIsShown] = useState(false);
  return (
    <div className="grid gap-1">
      <TextField id={id} name={name} label={label} errors={errors} hint={hint} type={isShown ? "text" : "password"} autoComplete={autoComplete} maxLength={512} spellCheck={false} autoCapitalize="none" />
      {isHydrated ? <CheckboxField id={`${id}-show`} name="" label="Show it" checked={isShown} onChange={(event) => setIsShown(event.currentTarget.checked)} /> : null}
    </div>
  );
}

export const newPasswordHint = "At least 15 characters. A few words that do not belong together are easy to remember and hard to guess; capitals, digits and marks are not asked for.";
