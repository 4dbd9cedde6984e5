import { useEffect, useRef, type ReactNode } from "react";

type DisclosureProps = {
  summary: ReactNode;
  /** The name of the summary where it shows a picture alone. */
  label?: string;
  summaryClassName: string;
  className?: string;
  /** A menu also closes when something else is pressed. */
  isMenu?: boolean;
  children: ReactNode;
};

/** A `<details>` that opens without script; with script, Escape closes it and gives the focus back. */
export function Disclosure({ summary, label, summaryClassName, className = "", isMenu = false, children }: DisclosureProps) {
  const details = useRef<HTMLDetailsElement>(null);
  useEffect(() => {
    const element = details.current;
    if (!element) return;
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== "Escape" || !element.open) return;
      element.open = false;
      element.querySelector("summary")?.focus();
    };
    const onPointerDown = (event: PointerEvent) => {
      if (isMenu && element.open && event.target instanceof Node && !element.contains(event.target)) element.open = false;
    };
    element.addEventListener("keydown", onKeyDown);
    document.addEventListener("pointerdown", onPointerDown);
    return () => {
      element.removeEventListener("keydown", onKeyDown);
      document.removeEventListener("pointerdown", onPointerDown);
    };
  }, [isMenu]);
  return (
    <details ref={details} className={className}>
      <summary className={summaryClassName} aria-label={label}>
        {summary}
      </summary>
      {children}
    </details>
  );
}
