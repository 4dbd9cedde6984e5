import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { Form, useNavigation } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FileField } from "#app/components/ui/file-field.tsx";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { photoTypes } from "#app/features/photos/photo-limits.ts";

type Fields = Record<"file" | "magnification" | "pictureWidth", string>;
type PhotoScaleFormProps = {
  /** A new photograph, or the scale of one that is here. */
  of: { intent: "photo"; requestId: string } | { intent: "scale"; photoRef: string; magnification: string; pictureWidth: string };
  lastResult: SubmissionResult<string[]> | undefined;
};

/** A photograph through the microscope: the picture, the magnification, and what it shows from left to right. */
export function PhotoScaleForm({ of, lastResult }: PhotoScaleFormProps) {
  const isNew = of.intent === "photo";
  const [form, fields] = useForm<Fields>({ id: isNew ? "microscope-photo" : "photo-scale", lastResult, defaultValue: isNew ? {} : { magnification: of.magnification, pictureWidth: of.pictureWidth } });
  const isSending = useNavigation().formMethod === "POST";
  return (
    <Form method="post" preventScrollReset encType={isNew ? "multipart/form-data" : undefined} {...getFormProps(form)} className="grid gap-3">
      <FormAlert errors={form.errors} id={form.errorId} />
      <input type="hidden" name="intent" value={of.intent} />
      {isNew ? <input type="hidden" name="requestId" value={of.requestId} /> : <input type="hidden" name="photo" value={of.photoRef} />}
      {isNew ? <FileField key={fields.file.key} id={fields.file.id} name="file" errors={fields.file.errors} label="Photograph of this stone" accept={photoTypes.join()} hint="JPEG, PNG or WebP, up to 15 MB. Camera and place are taken out." /> : null}
      <div className="grid grid-cols-2 gap-2.5">
        <TextField key={fields.magnification.key} {...fieldProps(fields.magnification)} label="Magnification" unit="×" isRequired={false} inputMode="decimal" isMono maxLength={24} />
        <TextField key={fields.pictureWidth.key} {...fieldProps(fields.pictureWidth)} label="Picture's width" unit="mm" isRequired={false} inputMode="decimal" isMono maxLength={24} />
      </div>
      <p className="text-xs text-ink-3">The width is what the whole picture shows from left to right, read off a graticule: the scale bar is drawn from it.</p>
      <div>
        <Button look="quiet" busyLabel={isSending && "Keeping"}>
          {isNew ? "Add the photograph" : "Set the scale"}
        </Button>
      </div>
    </Form>
  );
}
