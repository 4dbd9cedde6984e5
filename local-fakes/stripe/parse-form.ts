export type FormValue = string | FormValue[] | FormFields;
export type FormFields = { [name: string]: FormValue };

/** a[b][0][c]=v → { a: { b: [ { c: v } ] } }: the way the SDK writes bodies and queries */
export function parseForm(text: string): FormFields {
  const root: FormFields = Object.create(null);
  for (const [name, value] of new URLSearchParams(text)) {
    const steps = name.replaceAll("]", "").split("[");
    let at: FormFields = root;
    for (const step of steps.slice(0, -1)) {
      const next = at[step];
      at = typeof next === "object" && !Array.isArray(next) ? next : (at[step] = Object.create(null) as FormFields);
    }
    at[steps.at(-1)!] = value;
  }
  return withArrays(root) as FormFields;
}

function withArrays(value: FormValue): FormValue {
  if (typeof value === "string" || Array.isArray(value)) return value;
  const entries = Object.entries(value).map(([name, inner]) => [name, withArrays(inner)] as const);
  const isArray = entries.length > 0 && entries.every(([name], index) => name === String(index) || name === "");
  return isArray ? entries.map(([, inner]) => inner) : Object.fromEntries(entries);
}

export function fieldsOf(value: FormValue | undefined): FormFields {
  return typeof value === "object" && !Array.isArray(value) ? value : {};
}

export function listOf(value: FormValue | undefined): FormValue[] {
  return Array.isArray(value) ? value : [];
}

export function textOf(value: FormValue | undefined): string | null {
  return typeof value === "string" && value !== "" ? value : null;
}
