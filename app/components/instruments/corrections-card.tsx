import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Confirm } from "#app/components/ui/confirm.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { Mono } from "#app/components/ui/mono.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import { formatInstant } from "#app/domain/calendar-date.ts";
import type { getInstrument } from "#app/features/instruments/get-instrument.server.ts";
import { correctionWords } from "./correction-words.ts";

type CorrectionsCardProps = { instrument: Awaited<ReturnType<typeof getInstrument>>; timeZone: string; canManage: boolean; workOutTo: string; lastResult: SubmissionResult<string[]> | undefined };

/** What is added to every reading, and what was before. */
export function CorrectionsCard({ instrument: { corrections, unit, checks }, timeZone, canManage, workOutTo, lastResult }: CorrectionsCardProps) {
  const current = corrections.find(({ endedAt }) => endedAt === null);
  const past = corrections.filter(({ endedAt }) => endedAt !== null);
  const [form, fields] = useForm<{ reason: string }>({ id: "end-correction", lastResult });
  return (
    <Card title="Correction" id="correction" note="added to every reading, the raw one kept">
      <CardBody className="grid gap-3">
        {current ? (
          <p>
            <Mono>{correctionWords(current.correction, unit)}</Mono>
            <span className="block text-[12.5px] text-ink-3">
              since {formatInstant(current.fromAt, timeZone)}, from {current.checkCount} {current.checkCount === 1 ? "check" : "checks"}, by {current.by}: {current.reason}
            </span>
          </p>
        ) : (
          <p className="text-ink-2">None: readings are taken as the instrument shows them.</p>
        )}
        {past.length > 0 ? (
          <ul className="grid gap-1 text-[12.5px] text-ink-3">
            {past.map(({ id, correction, fromAt, endedAt }) => (
              <li key={id}>
                <Mono>{correctionWords(correction, unit)}</Mono>, {formatInstant(fromAt, timeZone)} to {endedAt ? formatInstant(endedAt, timeZone) : ""}
              </li>
            ))}
          </ul>
        ) : null}
        {canManage && unit && checks.some(({ readingValue }) => readingValue !== null) ? (
          <div className="flex flex-wrap items-start gap-2.5">
            <LinkButton to={workOutTo}>Work out from the checks</LinkButton>
            {current ? (
              <Confirm summary="End it" tone="quiet">
                <Form method="post" {...getFormProps(form)} className="grid gap-3">
                  <FormAlert errors={form.errors} id={form.errorId} />
                  <input type="hidden" name="intent" value="endCorrection" />
                  <TextField key={fields.reason.key} {...fieldProps(fields.reason)} label="Why it ends" autoComplete="off" maxLength={300} />
                  <Button look="quiet">End the correction</Button>
                </Form>
              </Confirm>
            ) : null}
          </div>
        ) : null}
      </CardBody>
    </Card>
  );
}
