import { inputLook } from "#app/components/ui/field-frame.tsx";
import { FilterSelect } from "#app/components/ui/filter-select.tsx";
import { characterFilterNames, characterFilters, kindFilters, kindNames, phenomenonFilters, signFilterNames, signFilters, transparencyFilters } from "#app/features/species/species-filter.ts";
import { colourFamilies } from "#app/gemmology/species/colour-families.ts";

type PropertyFiltersProps = { typed: Readonly<Record<string, string>>; errors: Readonly<Partial<Record<string, string>>> };

const labelLook = "mb-1 block text-xs font-semibold text-ink-2";

/** The properties most asked for stand open; the rest is a press away, and open where it is used. */
export function PropertyFilters({ typed, errors }: PropertyFiltersProps) {
  const isMoreUsed = ["birefringenceFrom", "birefringenceTo", "sign", "kind", "transparency", "phenomenon"].some((name) => typed[name]);
  return (
    <>
      <RangeFilter name="index" label="Index" typed={typed} error={errors.index} />
      <RangeFilter name="density" label="Density" typed={typed} error={errors.density} />
      <FilterSelect name="character" label="Between crossed polars" value={typed.character} options={characterFilters.map((value) => [value, characterFilterNames[value]])} className="w-48" />
      <FilterSelect name="colour" label="Colour" value={typed.colour} options={colourFamilies.map((value) => [value, value])} />
      <details open={isMoreUsed} className="mt-5.5 open:order-last open:mt-0 open:basis-full">
        <summary className="flex min-h-9 items-center px-1 text-tint underline decoration-1 underline-offset-3 pointer-coarse:min-h-11">More properties</summary>
        <div className="flex flex-wrap items-end gap-2.5 pt-1">
          <RangeFilter name="birefringence" label="Birefringence" typed={typed} error={errors.birefringence} />
          <FilterSelect name="sign" label="Optic sign" value={typed.sign} options={signFilters.map((value) => [value, signFilterNames[value]])} />
          <FilterSelect name="kind" label="Nature" value={typed.kind} options={kindFilters.map((value) => [value, kindNames[value]])} />
          <FilterSelect name="transparency" label="Transparency" value={typed.transparency} options={transparencyFilters.map((value) => [value, value])} />
          <FilterSelect name="phenomenon" label="Phenomenon" value={typed.phenomenon} options={phenomenonFilters.map((value) => [value, value])} />
        </div>
      </details>
    </>
  );
}

function RangeFilter({ name, label, typed, error }: { name: string; label: string; typed: Readonly<Record<string, string>>; error?: string }) {
  return (
    <fieldset aria-describedby={error ? `${name}-error` : undefined}>
      <legend className={labelLook}>{label}</legend>
      <div className="flex items-center gap-1.5">
        {(["From", "To"] as const).map((end) => (
          <span key={end} className="flex items-center gap-1.5">
            {end === "To" ? <span aria-hidden="true">–</span> : null}
            <input
              name={name + end}
              defaultValue={typed[name + end]}
              aria-label={`${label}, ${end === "From" ? "from" : "to"}`}
              aria-invalid={error ? true : undefined}
              inputMode="decimal"
              maxLength={20}
              autoComplete="off"
              className={`${inputLook} !w-20 font-mono`}
            />
          </span>
        ))}
      </div>
      {error ? (
        <p id={`${name}-error`} className="mt-1 max-w-44 text-xs font-medium text-red">
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}
