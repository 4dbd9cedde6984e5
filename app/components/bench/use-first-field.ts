import { useEffect, type RefObject } from "react";
import { useLocation } from "react-router";

/** State of a navigation to a test that a key chose: its form is typed into at once. */
export const typeAtOnce = { typeAtOnce: true } as const;

let handledKey = "";

/** Puts the focus into a form's first field when the test was chosen by a key; a finger would only get a keyboard in its way. */
export function useFirstField(form: RefObject<HTMLFormElement | null>): void {
  const { state, key } = useLocation();
  const isByKey = (state as Partial<typeof typeAtOnce> | null)?.typeAtOnce === true;
  useEffect(() => {
    // Once a navigation: a form that is put up anew after a reading leaves the keys to the choice of tests.
    if (!isByKey || handledKey === key) return;
    handledKey = key;
    form.current?.querySelector<HTMLElement>("input:not([type=hidden]), select, textarea")?.focus({ preventScroll: true });
  }, [form, isByKey, key]);
}
