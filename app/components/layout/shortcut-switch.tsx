import { useSyncExternalStore } from "react";
import { areShortcutsOn, onShortcutsChange, setShortcuts } from "./use-shortcut.ts";

/** Turns keys alone on and off for this browser. Without script there are none, and no switch. */
export function ShortcutSwitch() {
  const isOn = useSyncExternalStore<boolean | null>(onShortcutsChange, areShortcutsOn, () => null);
  if (isOn === null) return null;
  return (
    <label className="flex min-h-6 cursor-pointer items-center gap-2.5 text-sm">
      <input type="checkbox" checked={isOn} onChange={(event) => setShortcuts(event.target.checked)} className="size-4.5 accent-tint" />
      Single keys act, such as / for search
    </label>
  );
}
