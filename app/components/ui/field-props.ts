import type { FieldMetadata } from "@conform-to/react";

/** What a text, select or area field takes from a conform field: name, id, what was typed, messages. Pass `key={field.key}` beside it. */
export function fieldProps(field: FieldMetadata<unknown, Record<string, unknown>, string[]> | FieldMetadata<never, never, string[]>) {
  const { name, id, initialValue, errors } = field as FieldMetadata<string, Record<string, unknown>, string[]>;
  return { name, id, defaultValue: initialValue as string | undefined, errors };
}

/** The same for a checkbox that sends "on". */
export function checkboxProps(field: FieldMetadata<unknown, Record<string, unknown>, string[]> | FieldMetadata<never, never, string[]>) {
  const { name, id, initialValue, errors } = field as FieldMetadata<string, Record<string, unknown>, string[]>;
  return { name, id, defaultChecked: initialValue === "on", errors };
}
