import type { ReactNode } from "react";

/** A key of the keyboard, in the colour of what it stands in. Not shown where there is no keyboard to press it on. */
export function Key({ children }: { children: ReactNode }) {
  return (
    <kbd className="hidden rounded-sm border border-b-2 border-current px-1.5 text-xs leading-4 font-normal opacity-80 md:pointer-fine:inline-block" aria-hidden="true">
      {children}
    </kbd>
  );
}
