import { useId, useState } from "react";
import { Button } from "#app/components/ui/button.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";

/** Strikes a reading without leaving the page: what is not sent yet, or any while there is no line. */
export function StrikeForm({ onStrike }: { onStrike: (reason: string) => Promise<void> }) {
  const id = useId();
  const [errors, setErrors] = useState<string[]>([]);
  return (
    <details>
      <summary className="inline-flex min-h-6 cursor-pointer items-center text-xs text-ink-3 underline decoration-rule-2 hover:text-red pointer-coarse:min-h-11">Strike</summary>
      <form
        className="mt-1.5 flex flex-wrap items-end gap-2.5"
        onSubmit={(event) => {
          event.preventDefault();
          const reason = String(new FormData(event.currentTarget).get("reason") ?? "").trim();
          if (reason === "") setErrors(["Say why the reading is struck."]);
          else void onStrike(reason).catch(() => setErrors(["This device would not keep the strike. Nothing was changed."]));
        }}
      >
        <TextField id={id} name="reason" label="Why it is struck" maxLength={500} errors={errors} className="min-w-56 flex-1" />
        <Button look="danger">Strike it</Button>
      </form>
    </details>
  );
}
