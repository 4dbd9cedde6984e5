import type { HydrostaticWeighing } from "./hydrostatic-density.ts";

type Problem = { path: string; message: string };
export type ParsedWeighing = { ok: true; weighing: HydrostaticWeighing } | { ok: false; errors: Problem[] };

const numbers: Readonly<Record<string, readonly [low: number, high: number, isRequired: boolean]>> = {
  massAirCt: [1e-4, 1e6, true],
  massLiquidCt: [0, 1e6, true],
  tempC: [0, 40, true],
  airDensityKgM3: [0, 2, false],
  uMassAirCt: [0, 1e3, false],
  uMassLiquidCt: [0, 1e3, false],
  uTempC: [0, 20, false],
  uAirDensityKgM3: [0, 1, false],
};

/** Reads a weighing from outside: unknown fields are refused by name, impossible masses with what is possible. */
export function parseWeighing(value: unknown): ParsedWeighing {
  if (typeof value !== "object" || value === null || Array.isArray(value)) return { ok: false, errors: [{ path: "", message: "must be an object" }] };
  const fields = value as Record<string, unknown>;
  const errors: Problem[] = [];
  for (const key of Object.keys(fields)) if (key !== "method" && !Object.hasOwn(numbers, key)) errors.push({ path: key, message: "is not a field of a weighing" });
  const method = fields.method ?? "suspended";
  if (method !== "suspended" && method !== "beakerOnPan") errors.push({ path: "method", message: "must be one of: suspended, beakerOnPan" });
  for (const [key, [low, high, isRequired]] of Object.entries(numbers)) {
    const field = fields[key];
    if (field === undefined) {
      if (isRequired) errors.push({ path: key, message: "is missing" });
    } else if (typeof field !== "number" || !Number.isFinite(field)) errors.push({ path: key, message: "must be a number" });
    else if (field < low || field > high) errors.push({ path: key, message: `must lie between ${low} and ${high}` });
  }
  const { massAirCt, massLiquidCt } = fields;
  if (typeof massAirCt === "number" && typeof massLiquidCt === "number") {
    if (method === "suspended" && massLiquidCt >= massAirCt) errors.push({ path: "massLiquidCt", message: `must be less than the mass in air (${massAirCt} ct)` });
    if (method === "beakerOnPan" && (massLiquidCt <= 0 || massLiquidCt > massAirCt)) errors.push({ path: "massLiquidCt", message: `must be above 0 and at most the mass in air (${massAirCt} ct)` });
  }
  return errors.length > 0 ? { ok: false, errors } : { ok: true, weighing: { ...(fields as unknown as HydrostaticWeighing), method: method as HydrostaticWeighing["method"] } };
}
