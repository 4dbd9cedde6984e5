import { Form, Link } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { inputLook } from "#app/components/ui/field-frame.tsx";

export const mapReadingFields = ["n", "nU", "d", "dU"] as const;
export type MapReadingField = (typeof mapReadingFields)[number];

const labels: Readonly<Record<MapReadingField, string>> = { n: "Index", nU: "its u", d: "Density", dU: "its u" };
const names: Readonly<Record<MapReadingField, string>> = { n: "Index", nU: "Standard uncertainty of the index", d: "Density", dU: "Standard uncertainty of the density" };

type MapReadingFormProps = { typed: Readonly<Record<MapReadingField, string>>; errors: Readonly<Partial<Record<MapReadingField, string>>>; placeholders: Readonly<Record<"nU" | "dU", string>>; clearTo: string | null };

/** A reading that is not in the logbook is placed by typing it. */
export function MapReadingForm({ typed, errors, placeholders, clearTo }: MapReadingFormProps) {
  const wrong = mapReadingFields.filter((name) => errors[name]);
  return (
    <Form className="no-print mb-3 flex flex-wrap items-end gap-2.5" aria-label="Place a reading" key={JSON.stringify(typed)}>
      {mapReadingFields.map((name) => (
        <div key={name} className={name.endsWith("U") ? "w-20" : "w-24"}>
          <label htmlFor={`map-${name}`} className="mb-1 block text-xs font-semibold text-ink-2">
            {labels[name]}
            {name.endsWith("U") ? <span className="sr-only">: {names[name].toLowerCase()}</span> : null}
          </label>
          <input
            id={`map-${name}`}
            name={name}
            defaultValue={typed[name]}
            placeholder={name === "nU" || name === "dU" ? placeholders[name] : undefined}
            inputMode="decimal"
            autoComplete="off"
            maxLength={12}
            aria-invalid={errors[name] ? true : undefined}
            aria-describedby={errors[name] ? "map-reading-error" : undefined}
            className={`${inputLook} font-mono`}
          />
        </div>
      ))}
      <Button look="quiet">Place</Button>
      {clearTo ? (
        <Link to={clearTo} className="self-end px-1 pb-2 text-ink-2">
          Clear
        </Link>
      ) : null}
      {wrong.length > 0 ? (
        <p id="map-reading-error" className="basis-full text-xs font-medium text-red">
          {wrong.map((name) => `${names[name]}: ${errors[name]}`).join(" ")}
        </p>
      ) : null}
    </Form>
  );
}
