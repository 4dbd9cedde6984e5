import { lazy, Suspense, useCallback, useRef, useState, type ComponentType } from "react";
import { TextAreaField } from "#app/components/ui/text-field.tsx";
import type { SpectrumAround } from "./spectrum-around.ts";
import type { SpectrumDrawingProps } from "./spectrum-drawing.tsx";

/** The drawing comes after the page works, and stays away where it cannot be fetched for want of a line: the words alone are a reading. */
const SpectrumDrawing = lazy<ComponentType<SpectrumDrawingProps>>(async () => {
  const drawn = await import("./spectrum-drawing.tsx").catch(() => null);
  return { default: drawn?.SpectrumDrawing ?? (() => null) };
});

type SpectrumFieldProps = {
  id: string;
  name: string;
  label: string;
  hint?: string;
  errors?: readonly string[];
  defaultValue?: string;
  maxLength?: number;
  placeholder?: string;
  around?: Partial<SpectrumAround>;
};

/** Lines and bands of a spectrum: a field of words, which is what is sent, with the same drawn beneath. */
export function SpectrumField({ id, name, label, hint, errors, defaultValue = "", maxLength = 500, placeholder, around }: SpectrumFieldProps) {
  const field = useRef<HTMLTextAreaElement>(null);
  const [text, setText] = useState(defaultValue);
  // Somebody may have typed before script took over.
  const attach = useCallback((element: HTMLTextAreaElement | null) => {
    field.current = element;
    if (element) setText(element.value);
  }, []);
  return (
    <div className="grid gap-3">
      <TextAreaField
        {...{ id, name, label, hint, errors, defaultValue, maxLength, placeholder }}
        unit="nm"
        isRequired={false}
        rows={2}
        ref={attach}
        spellCheck={false}
        autoComplete="off"
        onInput={(event) => setText(event.currentTarget.value)}
      />
      <Suspense fallback={null}>
        <SpectrumDrawing {...{ field, text, id, maxLength }} view={around?.view} candidates={around?.candidates} />
      </Suspense>
    </div>
  );
}
