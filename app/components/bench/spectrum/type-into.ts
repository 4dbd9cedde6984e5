/** Puts text into a field as if it had been typed: React and the form around hear of it, and undoing works on what was there. */
export function typeInto(field: HTMLTextAreaElement, text: string): void {
  const set = Object.getOwnPropertyDescriptor(HTMLTextAreaElement.prototype, "value")?.set;
  set?.call(field, text);
  field.dispatchEvent(new Event("input", { bubbles: true }));
}
