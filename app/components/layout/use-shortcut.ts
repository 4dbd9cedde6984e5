import { useEffect, useRef } from "react";

const storageKey = "single-key-shortcuts";
const changed = "single-key-shortcuts-changed";

/** Keys alone act unless this browser's user has turned them off (WCAG 2.2, 2.1.4). */
export function areShortcutsOn(): boolean {
  try {
    return localStorage.getItem(storageKey) !== "off";
  } catch {
    return true;
  }
}

export function setShortcuts(isOn: boolean): void {
  try {
    if (isOn) localStorage.removeItem(storageKey);
    else localStorage.setItem(storageKey, "off");
  } catch {
    // A browser that keeps nothing keeps the keys as they are.
  }
  window.dispatchEvent(new Event(changed));
}

export function onShortcutsChange(listener: () => void): () => void {
  window.addEventListener(changed, listener);
  window.addEventListener("storage", listener);
  return () => {
    window.removeEventListener(changed, listener);
    window.removeEventListener("storage", listener);
  };
}

/** Runs while nothing is being typed and no modifier is held. */
export function useShortcut(key: string, run: () => void): void {
  const latest = useRef(run);
  useEffect(() => {
    latest.current = run;
  });
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== key || event.ctrlKey || event.metaKey || event.altKey || event.isComposing || event.defaultPrevented) return;
      const { target } = event;
      if (target instanceof HTMLElement && target.closest("input, textarea, select, [contenteditable]")) return;
      if (!areShortcutsOn()) return;
      event.preventDefault();
      latest.current();
    };
    document.addEventListener("keydown", onKeyDown);
    return () => document.removeEventListener("keydown", onKeyDown);
  }, [key]);
}
