import type { ReactNode } from "react";

/** A caution beside the work it is about: what can be harmed, and that local rules and licensed practice come first. */
export function Caution({ children, className = "" }: { children: ReactNode; className?: string }) {
  return (
    <div role="note" className={`rounded-r-md border-l-[3px] border-straw-mark bg-straw-bg px-3 py-2 text-sm text-straw print:border print:border-l-[3px] ${className}`}>
      {children}
    </div>
  );
}
