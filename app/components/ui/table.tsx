import type { ReactNode } from "react";
import { Link, useSearchParams } from "react-router";
import { Icon } from "./icon.tsx";

type TableProps = { caption: string; isCaptionShown?: boolean; children: ReactNode; className?: string };

/** A table that scrolls sideways in its own frame where the screen is narrow, by keyboard too. */
export function Table({ caption, isCaptionShown = false, children, className = "" }: TableProps) {
  return (
    <div className="relative overflow-x-auto rounded-b-lg print:overflow-visible" tabIndex={0} role="region" aria-label={caption}>
      <table className={`w-full border-collapse text-left ${className}`}>
        <caption className={isCaptionShown ? "px-4.5 py-2 text-left text-xs text-ink-3" : "sr-only"}>{caption}</caption>
        {children}
      </table>
    </div>
  );
}

/** The width of screen below which a column steps back; given to the heading and the cells alike. */
export type HideBelow = "sm" | "md" | "lg" | "xl";
const hidden: Readonly<Record<HideBelow, string>> = {
  sm: "not-print:max-sm:hidden",
  md: "not-print:max-md:hidden",
  lg: "not-print:max-lg:hidden",
  xl: "not-print:max-xl:hidden",
};

type CellProps = {
  /** Right-aligned typewriter figures; the unit stands in the heading. */
  isNumber?: boolean;
  hideBelow?: HideBelow;
  children?: ReactNode;
  className?: string;
};

const padding = "px-3 first:pl-4.5 last:pr-4.5";
const headerLook = `${padding} h-9 py-1 align-middle text-xs font-semibold whitespace-nowrap text-ink-3`;
const look = ({ isNumber, hideBelow, className = "" }: CellProps, numberLook: string) => `${isNumber ? numberLook : ""} ${hideBelow ? hidden[hideBelow] : ""} ${className}`;

export function HeaderCell({ children, ...cell }: CellProps) {
  return (
    <th scope="col" className={`${headerLook} ${look(cell, "text-right")}`}>
      {children}
    </th>
  );
}

/** A column heading that sorts by changing the URL. */
export function SortHeaderCell({ sortKey, defaultDirection = "desc", children, ...cell }: CellProps & { sortKey: string; defaultDirection?: "asc" | "desc" }) {
  const [params] = useSearchParams();
  const isCurrent = params.get("sort") === sortKey;
  const direction = isCurrent ? (params.get("direction") ?? defaultDirection) : null;
  const next = new URLSearchParams(params);
  next.set("sort", sortKey);
  next.set("direction", direction === defaultDirection ? (defaultDirection === "desc" ? "asc" : "desc") : defaultDirection);
  for (const cursor of ["after", "before"]) next.delete(cursor);
  return (
    <th scope="col" aria-sort={direction === "asc" ? "ascending" : direction === "desc" ? "descending" : undefined} className={`${headerLook} ${look(cell, "text-right")}`}>
      <Link
        to={`?${next}`}
        preventScrollReset
        className={`group inline-flex min-h-6 items-center gap-1 no-underline hover:text-tint hover:underline ${cell.isNumber ? "flex-row-reverse" : ""} ${direction ? "text-ink" : "text-ink-3"}`}
      >
        {children}
        <span className={direction ? "" : "opacity-0 group-hover:opacity-60"}>
          <Icon name={direction === "asc" ? "up" : "down"} sizePx={12} />
        </span>
      </Link>
    </th>
  );
}

const cellLook = `border-t border-rule py-2 align-top ${padding}`;

export function Cell({ children, colSpan, isStruck = false, ...cell }: CellProps & { colSpan?: number; /** Crossed through in red, still legible. */ isStruck?: boolean }) {
  return (
    <td colSpan={colSpan} className={`${cellLook} ${isStruck ? "text-ink-3 line-through decoration-red" : ""} ${look(cell, "text-right font-mono whitespace-nowrap")}`}>
      {children}
    </td>
  );
}

/** The cell that names its row, with the row's link. */
export function RowHeaderCell({ to, children, isMono = false }: { to: string; children: ReactNode; isMono?: boolean }) {
  return (
    <th scope="row" className={`${cellLook} font-normal whitespace-nowrap ${isMono ? "font-mono" : ""}`}>
      <Link to={to} className="text-ink underline decoration-rule-2 hover:text-tint hover:decoration-tint">
        {children}
      </Link>
    </th>
  );
}
