/** The rows of a json_arrayagg; null where there was none. The driver parses some JSON columns itself, but not every expression's. */
export function parseJsonRows<Row>(json: string | readonly Row[] | null): Row[] {
  if (json === null) return [];
  return typeof json === "string" ? (JSON.parse(json) as Row[]) : [...json];
}
