import type { FieldMetadata } from "@conform-to/react";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";

export type ClientFieldset = Record<"name" | "contactName" | "email" | "phone" | "addressLines" | "note", FieldMetadata<string, Record<string, unknown>, string[]>>;

/** What is known of a client, the same for a new one and for a change. */
export function ClientFields({ fields }: { fields: ClientFieldset }) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <TextField key={fields.name.key} {...fieldProps(fields.name)} label="Name" hint="A person, a firm or an estate." autoComplete="off" maxLength={120} />
      <TextField key={fields.contactName.key} {...fieldProps(fields.contactName)} label="Contact" isRequired={false} autoComplete="off" maxLength={120} />
      <TextField key={fields.email.key} {...fieldProps(fields.email)} label="E-mail" isRequired={false} inputMode="email" autoComplete="off" maxLength={254} />
      <TextField key={fields.phone.key} {...fieldProps(fields.phone)} label="Telephone" isRequired={false} inputMode="tel" autoComplete="off" maxLength={40} />
      <TextAreaField key={fields.addressLines.key} {...fieldProps(fields.addressLines)} label="Address" isRequired={false} rows={4} hint="As on an envelope, up to six lines." />
      <TextAreaField key={fields.note.key} {...fieldProps(fields.note)} label="Note" isRequired={false} rows={4} hint="For the desk. The client does not see it." />
    </div>
  );
}
