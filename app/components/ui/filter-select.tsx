import { inputLook } from "./field-frame.tsx";

type FilterSelectProps = { name: string; label: string; value: string | undefined; options: ReadonlyArray<readonly [value: string, label: string]>; className?: string };

/** One filter of a list: any, or one of its values. */
export function FilterSelect({ name, label, value, options, className = "w-36" }: FilterSelectProps) {
  return (
    <div className={className}>
      <label htmlFor={`filter-${name}`} className="mb-1 block text-xs font-semibold text-ink-2">
        {label}
      </label>
      <select id={`filter-${name}`} name={name} defaultValue={value} className={inputLook}>
        <option value="">any</option>
        {options.map(([key, text]) => (
          <option key={key} value={key}>
            {text}
          </option>
        ))}
      </select>
    </div>
  );
}
