import worked from "#fixtures/worked/worked.json" with { type: "json" };

export type Worked = { id: string; topic: string; inputs: Record<string, number | undefined>; expected: Record<string, number | undefined>; source: string };

/** Published worked examples on some topics, each with its source. */
export function workedOn(...topics: string[]): Worked[] {
  const found = (worked as unknown as Worked[]).filter(({ topic }) => topics.includes(topic));
  if (found.length === 0) throw new Error(`no worked example on ${topics.join(", ")}`);
  return found;
}
