import { Link, useSearchParams } from "react-router";

type TableProps = { caption: string; isCaptionShown?: boolean; children: React.ReactNode; className?: string };

/** A table that scrolls sideways in its own frame where the screen is narrow. */
export function Table({ caption, isCaptionShown = false, children, className = "" }: TableProps) {
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
      <table className={`w-full border-collapse text-left ${className}`}>
        <caption className={isCaptionShown ? "px-4.5 py-2 text-left text-ink-3" : "sr-only"}>{caption}</caption>
        {children}
      </table>
    </div>
  );
}

type CellProps = { isNumber?: boolean; children?: React.ReactNode; className?: string };

export function HeaderCell({ isNumber, children, className = "" }: CellProps) {
  return (
    <th scope="col" className={`px-4.5 pt-2 pb-1.5 text-[12px] font-semibold whitespace-nowrap text-ink-3 ${isNumber ? "text-right" : ""} ${className}`}>
      {children}
    </th>
  );
}

/** A column heading that sorts by changing the URL. */
export function SortHeaderCell({ sortKey, defaultDirection = "desc", isNumber, children }: CellProps & { sortKey: string; defaultDirection?: "asc" | "desc" }) {
  const [params] = useSearchParams();
  const isCurrent = params.get("sort") === sortKey;
  const direction = isCurrent ? (params.get("direction") ?? defaultDirection) : null;
  const next = new URLSearchParams(params);
  next.set("sort", sortKey);
  next.set("direction", direction === defaultDirection ? (defaultDirection === "desc" ? "asc" : "desc") : defaultDirection);
  for (const cursor of ["after", "before"]) next.delete(cursor);
  return (
    <th scope="col" aria-sort={direction === "asc" ? "ascending" : direction === "desc" ? "descending" : undefined} className={`px-4.5 pt-2 pb-1.5 text-[12px] font-semibold whitespace-nowrap text-ink-3 ${isNumber ? "text-right" : ""}`}>
      <Link to={`?${next}`} preventScrollReset className="text-ink-2 no-underline hover:underline">
        {children}
        <span aria-hidden="true">{direction === "asc" ? " ↑" : direction === "desc" ? " ↓" : ""}</span>
      </Link>
    </th>
  );
}

export function Cell({ isNumber, children, className = "" }: CellProps) {
  return <td className={`border-t border-rule px-4.5 py-2 align-top ${isNumber ? "text-right font-mono whitespace-nowrap" : ""} ${className}`}>{children}</td>;
}

/** The cell that names its row, with the row's link. */
export function RowHeaderCell({ to, children, isMono = false }: { to: string; children: React.ReactNode; isMono?: boolean }) {
  return (
    <th scope="row" className={`border-t border-rule px-4.5 py-2 align-top font-normal whitespace-nowrap ${isMono ? "font-mono" : ""}`}>
      <Link to={to} className="text-ink underline decoration-rule-2 hover:decoration-tint">
        {children}
      </Link>
    </th>
  );
}
