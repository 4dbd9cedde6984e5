import type { FieldMetadata } from "@conform-to/react";
import { lazy, Suspense, useState } from "react";
import { useIsHydrated } from "#app/components/layout/use-is-hydrated.ts";
import { fieldProps } from "#app/components/ui/field-props.ts";
import { FieldNotes } from "#app/components/ui/field-frame.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField } from "#app/components/ui/text-field.tsx";
import { lightNames, type Light } from "#app/domain/reading.ts";
import type { ComposedReading } from "#app/features/readings/compose-reading.ts";
import type { ReadingInstrument } from "#app/features/readings/reading-instrument.ts";

const RotationEditor = lazy(() => import("./rotation-editor.tsx"));

type Field = FieldMetadata<string, Record<string, string>, string[]>;
type RotationFieldsProps = { rows: Field; light: Field; instrument: ReadingInstrument | null; quality: "good" | "fair" | "poor" | "noResult"; onReading: (reading: ComposedReading | null) => void };

/** A run typed as lines without script; with script a table, a dial and the curves that its edges make. */
export function RotationFields({ rows, light, instrument, quality, onReading }: RotationFieldsProps) {
  const isHydrated = useIsHydrated();
  const [shownLight, setShownLight] = useState<Light>((light.initialValue as Light | undefined) ?? "sodium");
  const lines = (
    <TextAreaField
      key={rows.key}
      {...fieldProps(rows)}
      label="Positions"
      rows={8}
      spellCheck={false}
      hint="One a line: angle, the two edges, and the polariser’s azimuth if it was read: “15 1.658 1.673 80”. A dash for an edge not seen, = for one edge alone; a line with a facet’s name before its positions."
    />
  );
  return (
    <>
      <SelectField key={light.key} {...fieldProps(light)} label="Light" options={Object.entries(lightNames).map(([value, label]) => ({ value, label }))} onChange={(event) => setShownLight(event.target.value as Light)} />
      {isHydrated ? (
        <Suspense fallback={lines}>
          <div>
            <RotationEditor name={rows.name} initial={(rows.initialValue as string | undefined) ?? ""} light={shownLight} {...{ instrument, quality, onReading }} />
            <FieldNotes id={rows.id} errors={rows.errors} />
          </div>
        </Suspense>
      ) : (
        lines
      )}
    </>
  );
}
