import type { KeyboardEvent } from "react";

const controls = "input:not([type=hidden]):not([type=checkbox]):not([type=radio]):not([data-cell=angle]):not([data-cell=polariser]), select";
const isEmpty = (control: HTMLInputElement | HTMLSelectElement) => control.value.trim() === "";

/**
 * One hand types a whole reading. Enter goes on: to the next field that is still empty, or, from one that was left empty,
 * to the next that may not be; with none left it records. A blank after digits goes on likewise, so that "1762 1770" fills
 * both edges. Enter with Control records from anywhere.
 */
export function moveOnByEnter(event: KeyboardEvent<HTMLFormElement>): void {
  const { key, target, currentTarget: form } = event;
  if (event.nativeEvent.isComposing || event.altKey || event.metaKey || event.shiftKey) return;
  if (key === "Enter" && event.ctrlKey) {
    event.preventDefault();
    form.requestSubmit();
    return;
  }
  if (event.ctrlKey || !(target instanceof HTMLInputElement || target instanceof HTMLSelectElement) || !target.matches(controls)) return;
  const isBlankAfterDigits = key === " " && target instanceof HTMLInputElement && target.inputMode === "decimal" && !isEmpty(target);
  if (key !== "Enter" && !isBlankAfterDigits) return;
  const all = [...form.querySelectorAll<HTMLInputElement | HTMLSelectElement>(controls)].filter((control) => control.checkVisibility());
  const later = all.slice(all.indexOf(target) + 1).filter(isEmpty);
  const next = isEmpty(target) ? later.find((control) => control.ariaRequired === "true") : later[0];
  event.preventDefault();
  if (next) next.focus();
  else if (key === "Enter") form.requestSubmit();
}
