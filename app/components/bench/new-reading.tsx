import { getFormProps, useForm, type SubmissionResult } from "@conform-to/react";
import { useCallback, useEffect, useRef, useState, type FormEvent } from "react";
import { Form, useNavigation } from "react-router";
import { formatCalendarDate } from "#app/domain/calendar-date.ts";
import { uuidv7 } from "uuidv7";
import { useIsHydrated } from "#app/components/layout/use-is-hydrated.ts";
import { Button } from "#app/components/ui/button.tsx";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FormAlert } from "#app/components/ui/form-alert.tsx";
import { RadioGroupField } from "#app/components/ui/choice-field.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField } from "#app/components/ui/text-field.tsx";
import { Caution } from "#app/components/ui/caution.tsx";
import { isDescribed } from "#app/domain/bench-tests/test-forms.ts";
import { aboutTest, noResultReasons, readingQualities, readingQualityNames, type ObservationKind, type ReadingQuality } from "#app/domain/reading.ts";
import type { ComposedReading } from "#app/features/readings/compose-reading.ts";
import { readingDraftFromForm } from "#app/features/readings/reading-draft.ts";
import { withUncertainty } from "#app/features/readings/reading-words.ts";
import { weighingNotes } from "#app/features/readings/weighing-notes.ts";
import type { BenchInstrument } from "#app/features/stones/get-bench.server.ts";
import { DescribedFields } from "./described-fields.tsx";
import { moveOnByEnter } from "./move-on-by-enter.ts";
import { correctionWords } from "#app/components/instruments/correction-words.ts";
import { ReadingFields, type ReadingFieldset } from "./reading-fields.tsx";
import { RotationFields } from "./rotation-fields.tsx";
import type { SpectrumAround } from "./spectrum/spectrum-around.ts";
import { useFirstField } from "./use-first-field.ts";

type NewReadingProps = {
  kind: ObservationKind;
  instruments: readonly BenchInstrument[];
  requestId: string;
  lastResult: SubmissionResult<string[]> | undefined;
  areCandidatesHidden: boolean;
  /** What the typed digits amount to; null while they are no reading. */
  onDraft?: (reading: ComposedReading | null) => void;
  /** For the spectroscope's form alone. */
  spectrum?: SpectrumAround;
};

/** Forms with something to draw in take the whole width. */
const wide: ReadonlySet<ObservationKind> = new Set(["rotation", "spectroscope", "magnification"]);

/** The form of one test. It posts without script; with script it says at once what follows from the digits. */
export function NewReading({ kind, instruments, requestId, lastResult, areCandidatesHidden, onDraft, spectrum }: NewReadingProps) {
  const { instrumentKind: needed, needsInstrument, caution } = aboutTest(kind);
  const fitting = needed ? instruments.filter((instrument) => instrument.kind === needed) : instruments;
  const usual = needed && needsInstrument ? (fitting.find(({ isOutOfCheck, status }) => !isOutOfCheck && status === "inService") ?? fitting[0]) : undefined;
  // A form that script puts up is a new one, whatever the page's loader last said: two readings of one id would be kept as one.
  const isPutUpByScript = useIsHydrated();
  const [ownRequestId] = useState(() => (isPutUpByScript ? uuidv7() : requestId));
  const [form, fields] = useForm<ReadingFieldset>({
    id: `reading-${kind}`,
    lastResult,
    shouldValidate: "onSubmit",
    // What a number is, is never filled in for anybody; the prism's index and the liquid's limit belong to the instrument.
    defaultValue: { requestId: ownRequestId, instrument: usual?.ref, quality: "good", facet: "table", light: "sodium", limit: usual?.upperLimit ? String(usual.upperLimit) : undefined, prismN: usual?.prismIndex ? String(usual.prismIndex) : undefined },
  });
  const [preview, setPreview] = useState<ComposedReading | null>(null);
  const [instrumentRef, setInstrumentRef] = useState(usual?.ref ?? "");
  const [quality, setQuality] = useState<ReadingQuality>("good");
  const element = useRef<HTMLFormElement>(null);
  useFirstField(element);
  useEffect(() => void loadCompose(), []);
  const navigation = useNavigation();
  const isSaving = navigation.state === "submitting";
  const instrument = fitting.find(({ ref }) => ref === instrumentRef) ?? null;

  function onType(event: FormEvent<HTMLFormElement>) {
    const typed = new FormData(event.currentTarget);
    const chosen = fitting.find(({ ref }) => ref === typed.get("instrument")) ?? null;
    setInstrumentRef(chosen?.ref ?? "");
    const draft = readingDraftFromForm(typed);
    setQuality(draft.quality);
    // A run is fitted where its curves are drawn.
    if (draft.kind !== "rotation") void loadCompose().then(({ composeReading }) => show(composeReading(draft, chosen).reading ?? null));
  }
  const show = useCallback(
    (reading: ComposedReading | null) => {
      setPreview(reading);
      onDraft?.(reading);
    },
    [onDraft],
  );

  return (
    <Form method="post" preventScrollReset {...getFormProps(form)} ref={element} onChange={onType} onKeyDown={moveOnByEnter} className="group/reading grid gap-x-7 gap-y-4 px-4.5 py-4 md:grid-cols-[minmax(0,19rem)_minmax(0,1fr)]">
      <input type="hidden" name="kind" value={kind} />
      <input type="hidden" name={fields.requestId.name} defaultValue={fields.requestId.initialValue} key={fields.requestId.key} />
      {areCandidatesHidden ? <input type="hidden" name="areCandidatesHidden" value="on" /> : null}
      <div className="md:col-span-2 empty:hidden">
        <FormAlert errors={form.errors} id={form.errorId} />
        {caution ? <Caution>{caution}</Caution> : null}
      </div>
      <div className={`grid content-start gap-3 ${wide.has(kind) ? "md:col-span-2" : ""}`}>
        {isDescribed(kind) ? (
          <DescribedFields kind={kind} fields={fields} spectrum={spectrum} />
        ) : kind === "rotation" ? (
          <RotationFields rows={fields.rows} light={fields.light} onReading={show} {...{ instrument, quality }} />
        ) : (
          <ReadingFields kind={kind} fields={fields} />
        )}
        <div className="mt-1 flex flex-wrap gap-2.5">
          <Button size="bench" busyLabel={isSaving && "Recording"}>
            Record
          </Button>
        </div>
        <Preview reading={preview} instrument={instrument} />
      </div>
      <div className={`grid content-start gap-3 ${wide.has(kind) ? "md:col-span-2 md:grid-cols-2" : ""}`}>
        {fitting.length > 0 ? (
          <SelectField
            key={fields.instrument.key}
            {...fieldProps(fields.instrument)}
            label="Instrument"
            isRequired={needsInstrument}
            emptyLabel={needsInstrument ? "Choose" : "None, or by eye"}
            options={fitting.map(({ ref, name, description, isOutOfCheck }) => ({ value: ref, label: `${name}${description ? `, ${description}` : ""}${isOutOfCheck ? " (out of check)" : ""}` }))}
          />
        ) : needsInstrument ? (
          <p className="text-sm text-straw">No instrument of this kind is in service. Enter it under Instruments, or record “No reading”.</p>
        ) : null}
        <RadioGroupField
          key={fields.quality.key}
          {...pick(fieldProps(fields.quality))}
          name={fields.quality.name}
          label="Quality"
          isInline
          defaultValue={fields.quality.initialValue}
          options={readingQualities.map((value) => ({ value, label: readingQualityNames[value] }))}
        />
        <SelectField
          key={fields.noResultReason.key}
          {...fieldProps(fields.noResultReason)}
          label="Why there is no reading"
          isRequired={false}
          className="hidden group-has-[[value=noResult]:checked]/reading:block"
          emptyLabel="Choose"
          options={noResultReasons.map((value) => ({ value, label: value[0]!.toUpperCase() + value.slice(1) }))}
        />
        {hasOwnText.has(kind) ? null : (
          <TextAreaField key={fields.note.key} {...fieldProps(fields.note)} label="Note" isRequired={false} rows={2} maxLength={2000} />
        )}
      </div>
    </Form>
  );
}

/** Forms whose own text is where a note would go. */
const hasOwnText: ReadonlySet<ObservationKind> = new Set(["free", "magnification", "immersion"]);
/** What the digits amount to is worked out by a part that comes once the form is there. */
const loadCompose = () => import("#app/features/readings/compose-reading.ts");
const pick = ({ id, errors }: { id: string; errors?: string[] }) => ({ id, errors });

/** What follows from the digits, before they are saved. */
function Preview({ reading, instrument }: { reading: ComposedReading | null; instrument: BenchInstrument | null }) {
  const derived = reading?.values.filter(({ formula }) => formula !== null) ?? [];
  const notes = reading && weighingNotes(reading);
  if (derived.length === 0 && !instrument) return null;
  return (
    <dl className="grid grid-cols-[auto_1fr] gap-x-3.5 gap-y-1 border-t border-dashed border-rule-2 pt-2.5 text-sm" aria-live="polite">
      {derived.map((value) => (
        <div key={value.name} className="contents">
          <dt className="text-ink-3">{derivedNames[value.name] ?? value.name}</dt>
          <dd className="font-mono">{withUncertainty(value, value.name === "sg" ? 3 : 4)}</dd>
        </div>
      ))}
      {notes ? (
        <div className="contents">
          <dt className="text-ink-3">Weighings</dt>
          <dd>
            {notes.spread}
            {notes.drift ? <span className="block text-straw">{notes.drift}</span> : null}
          </dd>
        </div>
      ) : null}
      {instrument ? (
        <div className="contents">
          <dt className="text-ink-3">Instrument</dt>
          <dd>
            {instrument.name}
            {instrument.check ? `, checked ${formatCalendarDate(instrument.check.checkedOn)} on ${instrument.check.referenceMaterial}` : ", no check on record"}
            {instrument.outOfCheck ? <span className="block font-medium text-red">{instrument.outOfCheck} A reading on it is marked, and cannot carry “identified” until it is checked.</span> : null}
            {instrument.correction ? <span className="block text-ink-3">its correction is added: {correctionWords(instrument.correction.correction, instrument.correction.unit)}</span> : null}
            {instrument.status === "restricted" ? <span className="text-straw">; restricted</span> : null}
          </dd>
        </div>
      ) : null}
    </dl>
  );
}

const derivedNames: Partial<Record<string, string>> = { birefringence: "Birefringence", sg: "Density", n: "Index", low: "Lowest index", high: "Highest index", omega: "nω", epsilon: "nε", alpha: "nα", beta: "nβ", gamma: "nγ" };
