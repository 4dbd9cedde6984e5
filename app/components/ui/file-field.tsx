import type { ComponentProps } from "react";
import { describedBy, FieldFrame, type FieldFrameProps } from "./field-frame.tsx";

type FileFieldProps = FieldFrameProps & Omit<ComponentProps<"input">, "id" | "className" | "type"> & { name: string };

export function FileField({ id, label, unit, hint, errors, isRequired = true, className, ...input }: FileFieldProps) {
  return (
    <FieldFrame {...{ id, label, unit, hint, errors, isRequired, className }}>
      <input
        {...input}
        id={id}
        type="file"
        {...describedBy({ id, hint, errors })}
        className="block w-full rounded-md border border-dashed border-edge bg-sheet p-2 text-sm text-ink-2 file:mr-3 file:cursor-pointer file:rounded-md file:border file:border-rule-2 file:bg-paper file:px-3 file:py-1.5 file:font-semibold file:text-tint"
      />
    </FieldFrame>
  );
}
