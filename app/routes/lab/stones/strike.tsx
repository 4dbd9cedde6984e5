import { useRef } from "react";
import { moveOnByEnter } from "#app/components/bench/move-on-by-enter.ts";
import { useFirstField } from "#app/components/bench/use-first-field.ts";
import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, redirect } from "react-router";
import { StoneHeader } from "#app/components/bench/stone-header.tsx";
import { Button, LinkButton } from "#app/components/ui/button.tsx";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { Facts } from "#app/components/ui/facts.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { TextAreaField } from "#app/components/ui/text-field.tsx";
import { observationKindNames } from "#app/domain/reading.ts";
import { presentReadings } from "#app/features/readings/present-readings.ts";
import { strikeForm } from "#app/features/readings/reading-forms.server.ts";
import { readingConditions, readingSeenText, readingValueText } from "#app/features/readings/reading-words.ts";
import { strikeReading } from "#app/features/readings/strike-reading.server.ts";
import { getBench } from "#app/features/stones/get-bench.server.ts";
import { labContext } from "#app/web/contexts.server.ts";
import { labContextFor } from "#app/web/lab-context-for.server.ts";
import { formInvalid, formRefused } from "#app/web/form-result.server.ts";
import { noticeHeader } from "#app/web/notice.server.ts";
import { orResponse } from "#app/web/or-response.server.ts";
import type { Route } from "./+types/strike";

export async function loader({ context, params }: Route.LoaderArgs) {
  const ctx = context.get(labContext);
  const bench = await orResponse(getBench(ctx, params));
  const reading = bench.readings?.find(({ sequence }) => String(sequence) === params.sequence);
  if (!reading) throw data({ userMessage: "There is no such reading." }, { status: 404 });
  return { stone: bench.stone, checkName: ctx.laboratory.isSolePractice ? "Self-check" : "Second check", reading: presentReadings([reading], ctx.laboratory.timeZone)[0]! };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const ctx = labContextFor(context, "readings.record");
  const submission = parseWithZod(await request.formData(), { schema: strikeForm });
  if (submission.status !== "success") return formInvalid(submission);
  try {
    await strikeReading(ctx, { stoneCode: params.stoneCode, sequence: /^\d{1,6}$/.test(params.sequence) ? Number(params.sequence) : 0, reason: submission.value.reason });
    return redirect(`/lab/${params.labSlug}/stones/${params.stoneCode}`, { headers: { "Set-Cookie": await noticeHeader(`Reading ${params.sequence} is struck. It stays legible.`) } });
  } catch (error) {
    return formRefused(submission, error);
  }
}

export const meta: Route.MetaFunction = ({ params }) => [{ title: `Strike reading ${params.sequence} of ${params.stoneCode} · Isogyre` }];

export default function StrikeRoute({ loaderData: { stone, reading, checkName }, actionData, params }: Route.ComponentProps) {
  const [form, fields] = useForm<{ reason: string }>({ id: "strike", lastResult: actionData?.result });
  const element = useRef<HTMLFormElement>(null);
  useFirstField(element);
  return (
    <>
      <StoneHeader stone={stone} labSlug={params.labSlug} checkName={checkName} title={`Strike reading ${reading.sequence}`} />
      <Card title={observationKindNames[reading.detail.kind]} note={`${reading.day}, ${reading.when}, by ${reading.observer}`} className="max-w-3xl">
        <CardBody className="grid gap-4">
          <Facts
            rows={[
              { name: "Value", value: reading.quality === "noResult" ? `No reading: ${reading.noResultReason}` : readingValueText(reading), isMono: reading.quality !== "noResult" },
              { name: "Seen", value: [readingSeenText(reading), readingConditions(reading)].filter(Boolean).join("; ") },
              { name: "Note", value: reading.note },
            ]}
          />
          {reading.strike ? (
            <p className="text-red">
              Struck {reading.strike.when} by {reading.strike.by}: {reading.strike.reason}
            </p>
          ) : (
            <Form method="post" {...getFormProps(form)} ref={element} onKeyDown={moveOnByEnter} className="grid gap-3.5">
              <FormAlert errors={form.errors} id={form.errorId} />
              <TextAreaField key={fields.reason.key} {...fieldProps(fields.reason)} label="Why it is struck" maxLength={500} hint="Ctrl and Enter strike it. The reading stays in the record, crossed through, with this reason beside it. It no longer counts." />
              <div className="flex flex-wrap gap-2.5">
                <Button look="danger">Strike the reading</Button>
                <LinkButton to={`/lab/${params.labSlug}/stones/${stone.code}`}>Leave it</LinkButton>
              </div>
            </Form>
          )}
        </CardBody>
      </Card>
    </>
  );
}
