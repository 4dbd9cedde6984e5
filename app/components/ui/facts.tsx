/** Pairs of a name and what is so, as a definition list. Empty values are left out. */
export function Facts({ rows, className = "" }: { rows: ReadonlyArray<{ name: string; value: React.ReactNode; isMono?: boolean }>; className?: string }) {
  const shown = rows.filter(({ value }) => value !== null && value !== undefined && value !== "");
  return (
    <dl className={`grid grid-cols-[minmax(7rem,auto)_1fr] gap-x-4 gap-y-1.5 ${className}`}>
      {shown.map(({ name, value, isMono }) => (
        <div key={name} className="contents">
          <dt className="text-ink-3">{name}</dt>
          <dd className={`min-w-0 break-words ${isMono ? "font-mono" : ""}`}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
