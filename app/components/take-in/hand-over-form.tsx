import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { checkboxProps, fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextField } from "#app/components/ui/text-field.tsx";
import type { GoodsState } from "#app/domain/stone-state.ts";
import { custodyPurposeNames } from "#app/features/custody/custody-purpose-names.ts";

const units = [
  { value: "ct", label: "ct" },
  { value: "g", label: "g" },
];
type Props = { itemNumber: string; requestId: string; massUnit: "ct" | "g"; lastResult: SubmissionResult<string[]> | undefined };

const purposesFrom: Record<GoodsState, Array<"toBench" | "toSafe" | "toOutside" | "fromOutside">> = {
  safe: ["toBench", "toSafe", "toOutside"],
  bench: ["toSafe", "toBench", "toOutside"],
  away: ["fromOutside"],
  released: [],
};

/** From one place to another, weighed. */
export function HandOverForm({ itemNumber, requestId, massUnit, lastResult, goodsState, holders }: Props & { goodsState: GoodsState; holders: ReadonlyArray<{ ref: string; name: string }> }) {
  const [form, fields] = useForm<Record<"purpose" | "toPlace" | "holder" | "massText" | "massUnit" | "seal" | "remark", string>>({
    id: `hand-over-${itemNumber}`,
    lastResult,
    defaultValue: { massUnit, purpose: purposesFrom[goodsState][0] },
  });
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-3 sm:grid-cols-6">
      <input type="hidden" name="intent" value="handOver" />
      <input type="hidden" name="itemNumber" value={itemNumber} />
      <input type="hidden" name="requestId" value={requestId} />
      {form.errors ? (
        <div className="sm:col-span-6">
          <FormAlert errors={form.errors} id={form.errorId} />
        </div>
      ) : null}
      <SelectField key={fields.purpose.key} {...fieldProps(fields.purpose)} label="What happens" className="sm:col-span-2" options={purposesFrom[goodsState].map((value) => ({ value, label: custodyPurposeNames[value] }))} />
      <TextField key={fields.toPlace.key} {...fieldProps(fields.toPlace)} label="Where to" hint="Bench 2, Safe 1, the laboratory's name." className="sm:col-span-2" autoComplete="off" maxLength={120} />
      <SelectField key={fields.holder.key} {...fieldProps(fields.holder)} label="Who has it" isRequired={false} hint="At the bench; else yourself." className="sm:col-span-2" emptyLabel="" options={holders.map(({ ref, name }) => ({ value: ref, label: name }))} />
      <TextField key={fields.massText.key} {...fieldProps(fields.massText)} label="Weight" isRequired={false} className="sm:col-span-2" inputMode="decimal" isMono autoComplete="off" maxLength={24} />
      <SelectField key={fields.massUnit.key} {...fieldProps(fields.massUnit)} label="Unit" className="sm:col-span-1" options={units} />
      <TextField key={fields.seal.key} {...fieldProps(fields.seal)} label="Seal" isRequired={false} className="sm:col-span-1" isMono autoComplete="off" maxLength={60} />
      <TextField key={fields.remark.key} {...fieldProps(fields.remark)} label="Remark" isRequired={false} className="sm:col-span-2" autoComplete="off" maxLength={400} />
      <div className="sm:col-span-6">
        <Button look="quiet">Record the hand-over</Button>
      </div>
    </Form>
  );
}

/** Back to the client. */
export function ReleaseForm({ itemNumber, requestId, massUnit, lastResult }: Props) {
  const [form, fields] = useForm<Record<"collectedBy" | "idSeen" | "massText" | "massUnit" | "isConditionAgreed" | "seal" | "remark", string>>({
    id: `release-${itemNumber}`,
    lastResult,
    defaultValue: { massUnit },
  });
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-3 sm:grid-cols-6">
      <input type="hidden" name="intent" value="release" />
      <input type="hidden" name="itemNumber" value={itemNumber} />
      <input type="hidden" name="requestId" value={requestId} />
      {form.errors ? (
        <div className="sm:col-span-6">
          <FormAlert errors={form.errors} id={form.errorId} />
        </div>
      ) : null}
      <TextField key={fields.collectedBy.key} {...fieldProps(fields.collectedBy)} label="Collected by" hint="The person, or the courier." className="sm:col-span-3" autoComplete="off" maxLength={120} />
      <TextField key={fields.idSeen.key} {...fieldProps(fields.idSeen)} label="Known by" hint="Passport, the receipt, known to us. No numbers in full." className="sm:col-span-3" autoComplete="off" maxLength={120} />
      <TextField key={fields.massText.key} {...fieldProps(fields.massText)} label="Weight out" className="sm:col-span-2" inputMode="decimal" isMono autoComplete="off" maxLength={24} />
      <SelectField key={fields.massUnit.key} {...fieldProps(fields.massUnit)} label="Unit" className="sm:col-span-1" options={units} />
      <TextField key={fields.remark.key} {...fieldProps(fields.remark)} label="Remark" isRequired={false} className="sm:col-span-3" autoComplete="off" maxLength={200} />
      <CheckboxField key={fields.isConditionAgreed.key} {...checkboxProps(fields.isConditionAgreed)} label="Looked at together; the condition is agreed" className="sm:col-span-6" />
      <div className="sm:col-span-6">
        <Button>Release the item</Button>
      </div>
    </Form>
  );
}
