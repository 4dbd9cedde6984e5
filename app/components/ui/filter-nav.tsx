import { Link } from "react-router";

type FilterNavProps<Value extends string> = { label: string; base: string; /** The address's parameter. */ name: string; current: Value | null; choices: ReadonlyArray<{ value: Value | null; label: string }> };

/** Groups of a list, as links that change its address. */
export function FilterNav<Value extends string>({ label, base, name, current, choices }: FilterNavProps<Value>) {
  return (
    <nav aria-label={label} className="no-print mb-3 flex flex-wrap gap-2">
      {choices.map(({ value, label: words }) => (
        <Link
          key={value ?? "all"}
          to={value ? `${base}?${name}=${value}` : base}
          aria-current={value === current ? "page" : undefined}
          className={`rounded-md border px-3 py-1.5 no-underline ${value === current ? "border-tint bg-tint-bg font-semibold text-tint" : "border-rule-2 bg-sheet text-ink-2"}`}
        >
          {words}
        </Link>
      ))}
    </nav>
  );
}
