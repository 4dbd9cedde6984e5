import type { ReactNode } from "react";

type Fact = { name: string; value: ReactNode; isMono?: boolean };

/** Pairs of a name and what is so, as a definition list. Empty values are left out. `isRuled` draws a line under each, as on a report. */
export function Facts({ rows, isRuled = false, className = "" }: { rows: readonly Fact[]; isRuled?: boolean; className?: string }) {
  const shown = rows.filter(({ value }) => value !== null && value !== undefined && value !== "");
  return (
    <dl className={`grid ${isRuled ? "" : "gap-y-1.5"} ${className}`}>
      {shown.map(({ name, value, isMono }) => (
        <div key={name} className={`grid grid-cols-[minmax(6.5rem,2fr)_5fr] gap-x-4 ${isRuled ? "border-b border-rule py-2" : ""}`}>
          <dt className="text-ink-3">{name}</dt>
          <dd className={`min-w-0 break-words ${isMono ? "font-mono" : ""}`}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
