import type { FieldMetadata, FormMetadata } from "@conform-to/react";
import { CardSection } from "#app/components/ui/card-section.tsx";
import { CheckboxGroupField } from "#app/components/ui/choice-field.tsx";
import { describedBy, FieldNotes, inputLook } from "#app/components/ui/field-frame.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import { confidenceNames, confidences, limitCodes, limitNames, natureNames, natures, treatmentExtents, treatmentNames, treatmentStatusNames, type TreatmentCode } from "#app/domain/conclusion.ts";
import { cutWords, lightWords, phenomenonWords, shapeWords, transparencyWords } from "#app/domain/description-words.ts";

export type ConclusionShape = {
  requestId: string;
  version: string;
  speciesName: string;
  variety: string;
  nature: string;
  natureEvidence: string;
  confidence: string;
  treatments: { code: string; status: string; extent: string; evidence: string }[];
  evidence: string;
  limits: string[];
  rejected: { row: string; name: string; because: string }[];
  contradictionsExplained: string;
  description: { shape: string; cut: string; transparency: string; colour: string; colourLight: string; phenomenon: string; condition: string };
  reasoning: string;
};
type Fields = ReturnType<FormMetadata<ConclusionShape, string[]>["getFieldset"]>;

type ConclusionFieldsProps = { fields: Fields; speciesNames: readonly string[] };

export function ConclusionFields({ fields, speciesNames }: ConclusionFieldsProps) {
  const { description } = fields;
  const words = description.getFieldset();
  return (
    <>
      <CardSection title="Identity" headingLevel={3}>
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField key={fields.speciesName.key} {...fieldProps(fields.speciesName)} label="Species or material" list="species-names" autoComplete="off" maxLength={120} />
          <Words id="species-names" words={speciesNames} />
          <TextField key={fields.variety.key} {...fieldProps(fields.variety)} label="Variety" isRequired={false} autoComplete="off" maxLength={120} hint="Ruby, aquamarine: only what the readings and the colour carry." />
          <SelectField key={fields.confidence.key} {...fieldProps(fields.confidence)} label="How sure" emptyLabel="Choose" options={confidences.map((value) => ({ value, label: confidenceNames[value] }))} />
        </div>
      </CardSection>
      <CardSection title="Nature" headingLevel={3} intro="No constant tells natural from synthetic. What does: inclusions, growth, lines.">
        <div className="grid gap-4 sm:grid-cols-[14rem_minmax(0,1fr)]">
          <SelectField key={fields.nature.key} {...fieldProps(fields.nature)} label="Nature" emptyLabel="Choose" options={natures.map((value) => ({ value, label: natureNames[value] }))} />
          <TextAreaField key={fields.natureEvidence.key} {...fieldProps(fields.natureEvidence)} label="What shows it" isRequired={false} rows={2} maxLength={1000} />
        </div>
      </CardSection>
      <CardSection title="Treatments" headingLevel={3} intro="Found, looked for and not found, or not determinable here. What is left open is not said to be absent.">
        <FieldNotes id={fields.treatments.id} errors={fields.treatments.errors} />
        <div className="grid gap-2.5">
          {fields.treatments.getFieldList().map((treatment) => (
            <TreatmentRow key={treatment.key} treatment={treatment} />
          ))}
        </div>
      </CardSection>
      <CardSection title="Evidence and limits" headingLevel={3}>
        <div className="grid gap-4">
          <TextAreaField key={fields.evidence.key} {...fieldProps(fields.evidence)} label="What the conclusion rests on" isRequired={false} rows={3} maxLength={2000} />
          <fieldset className="min-w-0">
            <legend className="mb-1 text-xs font-semibold text-ink-2">Alternatives ruled out, and why</legend>
            <FieldNotes id={fields.rejected.id} errors={fields.rejected.errors} />
            <div className="grid gap-2">
              {fields.rejected.getFieldList().map((row, at) => (
                <RejectedRow key={row.key} row={row} at={at} />
              ))}
            </div>
          </fieldset>
          <TextAreaField
            key={fields.contradictionsExplained.key}
            {...fieldProps(fields.contradictionsExplained)}
            label="Why a good reading that contradicts this does not stand against it"
            isRequired={false}
            rows={2}
            maxLength={2000}
          />
          <CheckboxGroupField
            key={fields.limits.key}
            id={fields.limits.id}
            name={fields.limits.name}
            label="Limits of this examination"
            hasColumns
            errors={fields.limits.errors}
            defaultValues={asList(fields.limits.initialValue)}
            options={limitCodes.map((value) => ({ value, label: limitNames[value] }))}
          />
        </div>
      </CardSection>
      <CardSection title="Appearance" headingLevel={3} intro="Neutral words; no trade names of colours.">
        <div className="grid gap-4 sm:grid-cols-2 xl:grid-cols-3">
          <TextField key={words.shape.key} {...fieldProps(words.shape)} label="Outline" isRequired={false} list="shape-words" autoComplete="off" maxLength={80} />
          <TextField key={words.cut.key} {...fieldProps(words.cut)} label="Cut" isRequired={false} list="cut-words" autoComplete="off" maxLength={80} />
          <TextField key={words.transparency.key} {...fieldProps(words.transparency)} label="Transparency" isRequired={false} list="transparency-words" autoComplete="off" maxLength={80} />
          <TextField key={words.colour.key} {...fieldProps(words.colour)} label="Colour" isRequired={false} autoComplete="off" maxLength={120} />
          <TextField key={words.colourLight.key} {...fieldProps(words.colourLight)} label="Colour seen in" isRequired={false} list="light-words" autoComplete="off" maxLength={80} />
          <TextField key={words.phenomenon.key} {...fieldProps(words.phenomenon)} label="Phenomenon" isRequired={false} list="phenomenon-words" autoComplete="off" maxLength={120} />
          <TextField key={words.condition.key} {...fieldProps(words.condition)} label="Condition" isRequired={false} autoComplete="off" maxLength={300} className="sm:col-span-2 xl:col-span-3" />
        </div>
        <Words id="shape-words" words={shapeWords} />
        <Words id="cut-words" words={cutWords} />
        <Words id="transparency-words" words={transparencyWords} />
        <Words id="light-words" words={lightWords} />
        <Words id="phenomenon-words" words={phenomenonWords} />
      </CardSection>
      <CardSection title="For the laboratory alone" headingLevel={3}>
        <TextAreaField key={fields.reasoning.key} {...fieldProps(fields.reasoning)} label="Reasoning" isRequired={false} rows={4} maxLength={8000} hint="Not printed on a report." />
      </CardSection>
    </>
  );
}

function TreatmentRow({ treatment }: { treatment: FieldMetadata<ConclusionShape["treatments"][number], ConclusionShape, string[]> }) {
  const { code, status, extent, evidence } = treatment.getFieldset();
  const name = treatmentNames[code.initialValue as TreatmentCode] ?? code.initialValue;
  return (
    <fieldset className="grid min-w-0 gap-x-3 gap-y-1.5 border-t border-rule pt-2.5 first:border-t-0 first:pt-0 md:grid-cols-[minmax(0,11rem)_minmax(0,13rem)_8rem_minmax(0,1fr)]">
      <legend className="float-left w-full self-center md:w-auto md:pt-1.5">{name}</legend>
      <input type="hidden" name={code.name} defaultValue={code.initialValue} />
      <BareSelect field={status} label={`${name}: finding`} emptyLabel="Left open" options={Object.entries(treatmentStatusNames)} />
      <BareSelect field={extent} label={`${name}: extent`} emptyLabel="Extent" options={treatmentExtents.map((value) => [value, value] as const)} />
      <div className="min-w-0">
        <input aria-label={`${name}: what was seen`} placeholder="What was seen" type="text" maxLength={300} autoComplete="off" {...bare(evidence)} className={inputLook} />
        <FieldNotes id={evidence.id} errors={evidence.errors} />
      </div>
    </fieldset>
  );
}

function RejectedRow({ row, at }: { row: FieldMetadata<ConclusionShape["rejected"][number], ConclusionShape, string[]>; at: number }) {
  const { row: number, name, because } = row.getFieldset();
  return (
    <div className="grid gap-x-3 gap-y-1.5 sm:grid-cols-[14rem_minmax(0,1fr)]">
      {/* Keeps an empty row in its place when the form comes back. */}
      <input type="hidden" name={number.name} value={at} readOnly />
      <div>
        <input aria-label={`Alternative ${at + 1}`} aria-required={at === 0 || undefined} placeholder="Alternative" type="text" maxLength={120} autoComplete="off" list="species-names" {...bare(name)} className={inputLook} />
        <FieldNotes id={name.id} errors={name.errors} />
      </div>
      <div>
        <input aria-label={`Alternative ${at + 1}: why it is ruled out`} aria-required={at === 0 || undefined} placeholder="Why it is ruled out" type="text" maxLength={300} autoComplete="off" {...bare(because)} className={inputLook} />
        <FieldNotes id={because.id} errors={because.errors} />
      </div>
    </div>
  );
}

type BareField = Pick<FieldMetadata<string>, "name" | "id" | "initialValue" | "errors" | "key">;
const bare = ({ name, id, initialValue, errors }: BareField) => ({ name, id, defaultValue: initialValue, ...describedBy({ id, errors }) });

function BareSelect({ field, label, emptyLabel, options }: { field: BareField; label: string; emptyLabel: string; options: ReadonlyArray<readonly [string, string]> }) {
  return (
    <div className="min-w-0">
      <select aria-label={label} {...bare(field)} className={`${inputLook} truncate`}>
        <option value="">{emptyLabel}</option>
        {options.map(([value, text]) => (
          <option key={value} value={value}>
            {text}
          </option>
        ))}
      </select>
      <FieldNotes id={field.id} errors={field.errors} />
    </div>
  );
}

function Words({ id, words }: { id: string; words: readonly string[] }) {
  return (
    <datalist id={id}>
      {words.map((word) => (
        <option key={word} value={word} />
      ))}
    </datalist>
  );
}

function asList(value: unknown): string[] {
  return Array.isArray(value) ? value.filter((one) => typeof one === "string") : typeof value === "string" ? [value] : [];
}
