import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { Form, useNavigation } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { inclusionAmountNames, inclusionDepthNames, inclusionTypeNames, type PlotSide } from "#app/domain/inclusion.ts";

export type PlaceFields = Readonly<{ plotX: string; plotY: string; photo: string; photoX: string; photoY: string }>;
type Fields = Record<"requestId" | "type" | "otherText" | "depth" | "amount" | "size" | "note" | keyof PlaceFields, string>;
type InclusionFormProps = {
  requestId: string;
  side: PlotSide;
  /** The photographs that can be placed on, by their number. */
  photos: ReadonlyArray<{ ref: string; label: string }>;
  places: PlaceFields;
  onPlaces: (places: PlaceFields) => void;
  lastResult: SubmissionResult<string[]> | undefined;
};

const optionsOf = (names: Readonly<Record<string, string>>) => Object.entries(names).map(([value, label]) => ({ value, label }));

/** What was seen, and where. The places are filled by pointing, or typed in per cent of the picture. */
export function InclusionForm({ requestId, side, photos, places, onPlaces, lastResult }: InclusionFormProps) {
  const [form, fields] = useForm<Fields>({ id: "inclusion", lastResult, defaultValue: { depth: "notJudged", amount: "one" } });
  const isSaving = useNavigation().formMethod === "POST";
  const place = (name: "plotX" | "plotY" | "photoX" | "photoY", label: string) => (
    <TextField id={fields[name].id} name={name} errors={fields[name].errors} label={label} unit="%" isRequired={false} inputMode="decimal" isMono maxLength={6} value={places[name]} onChange={(event) => onPlaces({ ...places, [name]: event.currentTarget.value })} />
  );
  return (
    <Form method="post" preventScrollReset {...getFormProps(form)} className="grid gap-3.5">
      <FormAlert errors={form.errors} id={form.errorId} />
      <input type="hidden" name="intent" value="place" />
      <input type="hidden" name="requestId" value={requestId} />
      <input type="hidden" name="plotSide" value={side} />
      <SelectField key={fields.type.key} {...fieldProps(fields.type)} label="What it is" size="bench" emptyLabel="Choose" options={optionsOf(inclusionTypeNames)} />
      <TextField key={fields.otherText.key} {...fieldProps(fields.otherText)} label="In words, where none of these fits" isRequired={false} maxLength={60} autoComplete="off" />
      <div className="grid grid-cols-2 gap-2.5">
        <SelectField key={fields.depth.key} {...fieldProps(fields.depth)} label="How deep" options={optionsOf(inclusionDepthNames)} />
        <SelectField key={fields.amount.key} {...fieldProps(fields.amount)} label="How many" options={optionsOf(inclusionAmountNames)} />
        <TextField key={fields.size.key} {...fieldProps(fields.size)} label="Size" unit="mm" isRequired={false} inputMode="decimal" isMono maxLength={24} />
      </div>
      <fieldset className="grid grid-cols-2 gap-2.5">
        <legend className="mb-1 text-xs text-ink-3">On the outline, from its left and from its top</legend>
        {place("plotX", "From the left")}
        {place("plotY", "From the top")}
      </fieldset>
      {photos.length > 0 ? (
        <fieldset className="grid grid-cols-2 gap-2.5">
          <legend className="mb-1 text-xs text-ink-3">On a photograph</legend>
          <SelectField className="col-span-2" id={fields.photo.id} name="photo" errors={fields.photo.errors} label="Photograph" isRequired={false} emptyLabel="None" value={places.photo} onChange={(event) => onPlaces({ ...places, photo: event.currentTarget.value })} options={photos.map(({ ref, label }) => ({ value: ref, label }))} />
          {place("photoX", "From its left")}
          {place("photoY", "From its top")}
        </fieldset>
      ) : null}
      <TextField key={fields.note.key} {...fieldProps(fields.note)} label="Note" isRequired={false} maxLength={500} autoComplete="off" placeholder="colour, relief, at 60° to the next" />
      <div>
        <Button size="bench" busyLabel={isSaving && "Keeping"}>
          Keep
        </Button>
      </div>
    </Form>
  );
}
