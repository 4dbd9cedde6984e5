import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { Form, useNavigation } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FileField } from "#app/components/ui/file-field.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { spectrumFileNames } from "#app/features/spectra/spectrum-file-limits.ts";
import { xUnitNames, yUnitNames } from "#app/features/spectra/spectrum-words.ts";

type Fields = { intent: string; requestId: string; file: string; xUnit: string; yUnit: string; note: string };
const optionsOf = (names: Readonly<Record<string, string>>) => Object.entries(names).map(([value, label]) => ({ value, label }));

/** Attaches the file of a spectrometer to the stone. It is the same form with and without script. */
export function SpectrumForm({ requestId, lastResult }: { requestId: string; lastResult: SubmissionResult<string[]> | undefined }) {
  const [form, fields] = useForm<Fields>({ id: "spectrum", lastResult, defaultValue: { xUnit: "nm", yUnit: "absorbance" } });
  const isSending = useNavigation().formMethod === "POST";
  return (
    <Form method="post" encType="multipart/form-data" {...getFormProps(form)} className="grid gap-3.5">
      <FormAlert errors={form.errors} id={form.errorId} />
      <input type="hidden" name="intent" value="add" />
      <input type="hidden" name="requestId" value={requestId} />
      <FileField
        key={fields.file.key}
        id={fields.file.id}
        name={fields.file.name}
        errors={fields.file.errors}
        label="File of the spectrum"
        accept={spectrumFileNames}
        hint="JCAMP-DX, or a table of two columns with a semicolon, a tab or a comma between; up to 4 MB."
      />
      <fieldset className="grid gap-2.5 sm:grid-cols-2">
        <legend className="mb-1.5 text-xs text-ink-3">Where the file itself does not say:</legend>
        <SelectField key={fields.xUnit.key} {...fieldProps(fields.xUnit)} label="First column" options={optionsOf(xUnitNames)} />
        <SelectField key={fields.yUnit.key} {...fieldProps(fields.yUnit)} label="Second column" options={optionsOf(yUnitNames)} />
      </fieldset>
      <TextField key={fields.note.key} {...fieldProps(fields.note)} label="What was measured, and how" isRequired={false} maxLength={500} placeholder="through the table, transmitted, 2 nm" autoComplete="off" />
      <div>
        <Button busyLabel={isSending && "Reading the file"}>Attach</Button>
      </div>
    </Form>
  );
}
