import { useSyncExternalStore } from "react";

const never = () => () => {};

/** False while the page is only HTML, true when script has taken over: for what does nothing without script. */
export function useIsHydrated(): boolean {
  return useSyncExternalStore(never, () => true, () => false);
}
