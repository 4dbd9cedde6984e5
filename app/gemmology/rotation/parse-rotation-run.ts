import { usualEdgeU, type RotationFacet, type RotationReading, type RotationRun } from "./rotation-run.ts";

type Problem = Readonly<{ path: string; message: string }>;
export type ParsedRotationRun = Readonly<{ ok: true; run: RotationRun }> | Readonly<{ ok: false; errors: readonly Problem[] }>;

const mostFacets = 6;
const mostReadings = 100;

/** A rotation run out of JSON. Unknown fields are refused by name; every problem is told with its path. */
export function parseRotationRun(value: unknown): ParsedRotationRun {
  const errors: Problem[] = [];
  const fail = (path: string, message: string) => void errors.push({ path, message });
  const isObject = (one: unknown): one is Record<string, unknown> => typeof one === "object" && one !== null && !Array.isArray(one);
  const onlyKnown = (one: Record<string, unknown>, known: readonly string[], path: string) => {
    for (const key of Object.keys(one)) if (!known.includes(key)) fail(path ? `${path}.${key}` : key, "is not a field of a rotation run");
  };
  const number = (one: unknown, path: string, { min, max }: { min: number; max: number }): number => {
    if (typeof one !== "number" || !Number.isFinite(one)) fail(path, "is a number");
    else if (one < min || one > max) fail(path, `lies between ${min} and ${max}`);
    else return one;
    return Number.NaN;
  };

  if (!isObject(value)) return { ok: false, errors: [{ path: "", message: "is an object with facets" }] };
  onlyKnown(value, ["facets"], "");
  if (!Array.isArray(value.facets) || value.facets.length === 0 || value.facets.length > mostFacets) return { ok: false, errors: [...errors, { path: "facets", message: `is a list of 1 to ${mostFacets} facets` }] };
  const facets = value.facets.map((facet: unknown, at): RotationFacet => {
    const path = `facets[${at}]`;
    if (!isObject(facet)) return fail(path, "is an object"), { label: "", readings: [] };
    onlyKnown(facet, ["label", "readings"], path);
    const label = typeof facet.label === "string" && facet.label.length <= 60 ? facet.label : facet.label === undefined ? `facet ${at + 1}` : (fail(`${path}.label`, "is a text of at most 60 characters"), "");
    if (!Array.isArray(facet.readings) || facet.readings.length > mostReadings) return fail(`${path}.readings`, `is a list of at most ${mostReadings} readings`), { label, readings: [] };
    const readings = facet.readings.map((reading: unknown, index): RotationReading => {
      const here = `${path}.readings[${index}]`;
      if (!isObject(reading)) return fail(here, "is an object"), { angleDeg: 0, upper: null, lower: null, u: usualEdgeU, polariserDeg: null };
      onlyKnown(reading, ["angleDeg", "upper", "lower", "u", "polariserDeg"], here);
      const optional = (name: string, range: { min: number; max: number }) => (reading[name] === undefined || reading[name] === null ? null : number(reading[name], `${here}.${name}`, range));
      const [upper, lower] = [optional("upper", { min: 1.2, max: 3 }), optional("lower", { min: 1.2, max: 3 })];
      if (upper === null && lower === null) fail(here, "has an upper or a lower edge");
      if (upper !== null && lower !== null && lower > upper) fail(`${here}.lower`, "is not above the upper edge");
      return { angleDeg: number(reading.angleDeg, `${here}.angleDeg`, { min: -720, max: 720 }), upper, lower, u: optional("u", { min: 1e-6, max: 0.05 }) ?? usualEdgeU, polariserDeg: optional("polariserDeg", { min: -360, max: 360 }) };
    });
    return { label, readings };
  });
  if (errors.length === 0 && facets.every(({ readings }) => readings.length === 0)) fail("facets", "have no readings");
  return errors.length > 0 ? { ok: false, errors } : { ok: true, run: { facets } };
}
