import { useRef, useState } from "react";
import { Form, useRevalidator } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { FieldNotes, describedBy } from "#app/components/ui/field-frame.tsx";
import { largestPhotoBytes, photoTypes } from "#app/features/photos/photo-limits.ts";

/** Sends one file to the file store and says what became of it; given by the route, which knows the store's client. */
export type SendPhotos = (files: File[], onProgress: (percent: number) => void) => Promise<string[]>;

/**
 * Photographs of an item. Without script the form posts them to us; with script they go to the file store directly and
 * the page shows how far they are.
 */
export function PhotoUpload({ itemNumber, requestId, errors, send }: { itemNumber: string; requestId: string; errors: string[] | undefined; send: SendPhotos }) {
  const id = `photo-${itemNumber}`;
  const input = useRef<HTMLInputElement>(null);
  const [progress, setProgress] = useState<number | null>(null);
  const [problems, setProblems] = useState<string[]>([]);
  const { revalidate } = useRevalidator();
  const shown = problems.length > 0 ? problems : errors;

  async function sendAll(files: File[]) {
    const wrong = files.flatMap((file) => {
      if (!(photoTypes as readonly string[]).includes(file.type)) return [`${file.name} is not a JPEG, PNG or WebP picture.`];
      return file.size > largestPhotoBytes ? [`${file.name} has more than 15 MB.`] : [];
    });
    setProblems(wrong);
    if (files.length === 0 || wrong.length > 0) return;
    setProgress(0);
    try {
      setProblems(await send(files, setProgress));
    } catch {
      setProblems(["The file store did not answer. Nothing was kept; try again in a minute."]);
    }
    setProgress(null);
    if (input.current) input.current.value = "";
    await revalidate();
  }

  return (
    <Form
      method="post"
      encType="multipart/form-data"
      className="grid gap-2"
      onSubmit={(event) => {
        event.preventDefault();
        void sendAll([...(input.current?.files ?? [])]);
      }}
    >
      <input type="hidden" name="intent" value="photo" />
      <input type="hidden" name="itemNumber" value={itemNumber} />
      <input type="hidden" name="requestId" value={requestId} />
      <label htmlFor={id} className="text-[12.5px] font-semibold text-ink-2">
        Add photographs
      </label>
      <div className="flex flex-wrap items-center gap-2">
        <input
          ref={input}
          id={id}
          type="file"
          name="photo"
          accept={photoTypes.join()}
          multiple
          disabled={progress !== null}
          {...describedBy({ id, hint: "x", errors: shown })}
          className="max-w-full text-[13px] file:mr-3 file:min-h-9 file:cursor-pointer file:rounded-md file:border file:border-dashed file:border-rule-2 file:bg-sheet file:px-3 file:font-semibold file:text-tint"
        />
        <Button look="quiet" disabled={progress !== null}>
          Send
        </Button>
      </div>
      {progress === null ? null : (
        <div role="progressbar" aria-label="Sending" aria-valuenow={progress} aria-valuemin={0} aria-valuemax={100} className="h-1.5 overflow-hidden rounded-full bg-rule">
          <div className="ramp h-full" style={{ width: `${progress}%` }} />
        </div>
      )}
      <FieldNotes id={id} errors={shown} hint="JPEG, PNG or WebP, up to 15 MB each. Camera and place are taken out." />
    </Form>
  );
}
