import { useEffect } from "react";

/** Escape takes the focus out of a field, so that single keys act again. What was typed stays. */
export function useEscapeLeavesField(): void {
  useEffect(() => {
    const onKeyDown = ({ key, target, isComposing, defaultPrevented }: KeyboardEvent) => {
      if (key !== "Escape" || isComposing || defaultPrevented) return;
      // A search field clears itself first, and a dialog closes by the same key.
      if (target instanceof HTMLElement && target.matches("input:not([type=search]), textarea, select") && !target.closest("dialog")) target.blur();
    };
    document.addEventListener("keydown", onKeyDown);
    return () => document.removeEventListener("keydown", onKeyDown);
  }, []);
}
