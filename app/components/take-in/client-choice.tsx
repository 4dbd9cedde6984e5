import { FieldNotes } from "#app/components/ui/field-frame.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";

export type ClientOption = { ref: string; name: string; contactName: string; place: string };
type Typed = { email: string | undefined; phone: string | undefined; address: string | undefined };

/** Which client: one that is known, or a new one. Plain radio buttons, so that it works without script. */
export function ClientChoice({ options, chosen, typed, errors }: { options: readonly ClientOption[]; chosen: string; typed: Typed; errors: { email?: string[]; address?: string[] } }) {
  return (
    <fieldset className="mt-3 rounded-md border border-rule-2 p-3.5">
      <legend className="px-1 text-[12.5px] font-semibold text-ink-2">Which client</legend>
      <div className="grid gap-1.5">
        {options.map((option) => (
          <label key={option.ref} className="flex min-h-6 items-start gap-2.5">
            <input type="radio" name="client" value={option.ref} defaultChecked={option.ref === chosen} className="mt-0.5 size-4 shrink-0 accent-tint" />
            <span>
              {option.name}
              <span className="text-ink-3">{[option.contactName, option.place].filter(Boolean).map((text) => `, ${text}`).join("")}</span>
            </span>
          </label>
        ))}
        <div className="has-[input[value=new]:checked]:[&>.new-client]:grid">
          <label className="flex min-h-6 items-start gap-2.5">
            <input type="radio" name="client" value="new" defaultChecked={chosen === "new"} className="mt-0.5 size-4 shrink-0 accent-tint" />
            <span>A new client with the name above</span>
          </label>
          <div className="new-client mt-2 hidden gap-3.5 pl-6.5 sm:grid-cols-3">
            <TextField id="new-client-email" name="newClientEmail" label="E-mail" isRequired={false} defaultValue={typed.email} errors={errors.email} inputMode="email" autoComplete="off" maxLength={254} />
            <TextField id="new-client-phone" name="newClientPhone" label="Telephone" isRequired={false} defaultValue={typed.phone} inputMode="tel" autoComplete="off" maxLength={40} />
            <TextAreaField id="new-client-address" name="newClientAddress" label="Address" isRequired={false} defaultValue={typed.address} errors={errors.address} rows={3} />
          </div>
        </div>
      </div>
      <FieldNotes id="client-choice" />
    </fieldset>
  );
}
