import type { ReactNode } from "react";
import { Mark } from "../layout/mark.tsx";

/** Says what would be here and what to do first. */
export function EmptyState({ title, children, action }: { title: string; children: ReactNode; action?: ReactNode }) {
  return (
    <div className="grid justify-items-center gap-1 px-6 py-12 text-center">
      <span className="mb-2 opacity-60">
        <Mark size={40} />
      </span>
      <p className="font-serif text-xl">{title}</p>
      <p className="max-w-prose text-ink-2">{children}</p>
      {action ? <div className="mt-3">{action}</div> : null}
    </div>
  );
}
