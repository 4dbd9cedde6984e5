import type { FieldMetadata } from "@conform-to/react";
import { useRef, useSyncExternalStore } from "react";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { TextField } from "#app/components/ui/text-field.tsx";

type Remembered = Readonly<{ text: string; at: number }>;
const storageKey = "water-temperature";
/** A vessel on a bench keeps its warmth about so long. */
const goodForMs = 60 * 60 * 1000;

/** The water's temperature; what this bench last typed is offered for an hour, never filled in unasked. */
export function WaterTemperature({ field }: { field: FieldMetadata<string, Record<string, string>, string[]> }) {
  const input = useRef<HTMLDivElement>(null);
  const offered = useSyncExternalStore(never, remembered, () => null);
  const take = () => {
    const control = input.current?.querySelector("input");
    if (!control || !offered) return;
    control.value = offered;
    control.dispatchEvent(new Event("input", { bubbles: true }));
    control.focus();
  };
  return (
    <div ref={input} onBlur={({ target }) => target instanceof HTMLInputElement && remember(target.value)}>
      <TextField key={field.key} {...fieldProps(field)} label="Water" unit="°C" inputMode="decimal" isMono maxLength={24} />
      {offered ? (
        <button type="button" onClick={take} className="mt-1 inline-flex min-h-6 items-center text-xs text-tint underline decoration-rule-2 pointer-coarse:min-h-11">
          As last time: {offered} °C
        </button>
      ) : null}
    </div>
  );
}

const never = () => () => {};

function remembered(): string | null {
  try {
    const kept = JSON.parse(localStorage.getItem(storageKey) ?? "null") as Remembered | null;
    return kept && Date.now() - kept.at < goodForMs ? kept.text : null;
  } catch {
    return null;
  }
}

function remember(text: string): void {
  if (!/^\s*\d{1,2}([.,]\d{1,2})?\s*$/.test(text)) return;
  try {
    localStorage.setItem(storageKey, JSON.stringify({ text: text.trim(), at: Date.now() }));
  } catch {
    // A browser that keeps nothing offers nothing.
  }
}
