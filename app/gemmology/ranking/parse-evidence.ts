import { estimateWays, fluorescenceStrengths, magneticResponses, opticCharacters, readingGrades, strengths, type Evidence } from "./evidence.ts";

export type EvidenceProblem = Readonly<{ path: string; message: string }>;
export type ParsedEvidence = { ok: true; evidence: Evidence } | { ok: false; errors: EvidenceProblem[] };

type Check = (value: unknown, path: string, errors: EvidenceProblem[]) => void;
type Shape = Readonly<Record<string, { check: Check; isRequired?: boolean }>>;

/** Reads evidence from outside: unknown fields are refused by name, absurd values with what is possible. */
export function parseEvidence(value: unknown): ParsedEvidence {
  const errors: EvidenceProblem[] = [];
  object(evidenceShape)(value, "", errors);
  return errors.length === 0 ? { ok: true, evidence: value as Evidence } : { ok: false, errors };
}

const at = (path: string, key: string | number) => (path === "" ? String(key) : typeof key === "number" ? `${path}[${key}]` : `${path}.${key}`);

function object(shape: Shape, extra?: Check): Check {
  return (value, path, errors) => {
    if (typeof value !== "object" || value === null || Array.isArray(value)) return void errors.push({ path, message: "must be an object" });
    for (const key of Object.keys(value)) if (!Object.hasOwn(shape, key)) errors.push({ path: at(path, key), message: "is not a field of evidence, version 1" });
    for (const [key, { check, isRequired }] of Object.entries(shape)) {
      const field = (value as Record<string, unknown>)[key];
      if (field !== undefined) check(field, at(path, key), errors);
      else if (isRequired) errors.push({ path: at(path, key), message: "is missing" });
    }
    extra?.(value, path, errors);
  };
}

function list(check: Check, most: number): Check {
  return (value, path, errors) => {
    if (!Array.isArray(value)) return void errors.push({ path, message: "must be a list" });
    if (value.length > most) return void errors.push({ path, message: `has more than ${most} entries` });
    value.forEach((item, index) => check(item, at(path, index), errors));
  };
}

function number(low: number, high: number): Check {
  return (value, path, errors) => {
    if (typeof value !== "number" || !Number.isFinite(value)) errors.push({ path, message: "must be a number" });
    else if (value < low || value > high) errors.push({ path, message: `must lie between ${low} and ${high}` });
  };
}

function uncertainty(high: number): Check {
  return (value, path, errors) => {
    if (typeof value !== "number" || !Number.isFinite(value) || value <= 0 || value > high) errors.push({ path, message: `must be above 0 and at most ${high}` });
  };
}

const text: Check = (value, path, errors) => {
  if (typeof value !== "string" || value.length > 200) errors.push({ path, message: "must be a text of at most 200 characters" });
};
const flag: Check = (value, path, errors) => {
  if (typeof value !== "boolean") errors.push({ path, message: "must be true or false" });
};
function oneOf(choices: readonly string[]): Check {
  return (value, path, errors) => {
    if (typeof value !== "string" || !choices.includes(value)) errors.push({ path, message: `must be one of: ${choices.join(", ")}` });
  };
}
const required = (check: Check) => ({ check, isRequired: true });
const optional = (check: Check) => ({ check });

const index = number(1, 4);
const graded = { quality: optional(oneOf(readingGrades)) };
/** The named fields, where they are numbers, must not fall. */
function rising(...keys: readonly string[]): Check {
  return (value, path, errors) => {
    const found = keys.map((key) => (value as Record<string, unknown>)[key]).filter((each) => typeof each === "number");
    if (found.some((each, at) => at > 0 && each < found[at - 1]!)) errors.push({ path: at(path, keys[0]!), message: keys.length > 2 ? `${keys.join(", ")} must not fall` : `must not be above the ${keys[1]} ${keys[1] === "high" ? "edge" : "value"}` });
  };
}
const indices: Check = (value, path, errors) => {
  const keys = typeof value === "object" && value !== null ? Object.keys(value) : [];
  const named = [["n"], ["omega", "epsilon"], ["alpha", "beta", "gamma"]].find((names) => names.length === keys.length && names.every((name) => keys.includes(name)));
  if (!named) return void errors.push({ path, message: "must be n, or omega and epsilon, or alpha, beta and gamma" });
  object(Object.fromEntries(named.map((name) => [name, required(index)])), named.length === 3 ? rising("alpha", "beta", "gamma") : undefined)(value, path, errors);
};
const crystals: Check = (value, path, errors) => {
  if (Array.isArray(value) && value.length === 0) errors.push({ path, message: "must hold at least one crystal" });
  else list(object({ indices: required(indices), u: optional(uncertainty(0.5)), weight: optional(number(1e-6, 1e6)) }), 8)(value, path, errors);
};
const refractiveShapes: Record<string, Check> = {
  edges: object({ kind: required(text), low: required(index), high: required(index), u: optional(uncertainty(0.5)), rotated: required(flag), ...graded }, rising("low", "high")),
  single: object({ kind: required(text), n: required(index), u: optional(uncertainty(0.5)), ...graded }),
  spot: object({ kind: required(text), n: required(index), u: optional(uncertainty(0.5)), ...graded }),
  interval: object({ kind: required(text), low: required(index), high: required(index), u: optional(uncertainty(0.5)), ...graded }, rising("low", "high")),
  criticalAngle: object({ kind: required(text), angleDeg: required(number(0, 90)), prismN: required(number(1.3, 4)), u: optional(uncertainty(10)), ...graded }, (value, path, errors) => {
    const { angleDeg, prismN } = value as { angleDeg?: unknown; prismN?: unknown };
    if (typeof angleDeg === "number" && typeof prismN === "number" && prismN * Math.sin((angleDeg * Math.PI) / 180) < 1) errors.push({ path: at(path, "angleDeg"), message: "gives an index below 1 with this prism" });
  }),
  overLimit: object({ kind: required(text), limit: required(number(1.3, 4)), ...graded }),
  rotation: object({ kind: required(text), solutions: required(crystals), ...graded }),
  estimate: object({ kind: required(text), n: required(index), u: required(uncertainty(1)), by: required(oneOf(estimateWays)), ...graded }),
};
const refractive: Check = (value, path, errors) => {
  const kind = typeof value === "object" && value !== null ? (value as { kind?: unknown }).kind : undefined;
  const check = typeof kind === "string" && Object.hasOwn(refractiveShapes, kind) ? refractiveShapes[kind] : undefined;
  if (!check) return void errors.push({ path: at(path, "kind"), message: `must be one of: ${Object.keys(refractiveShapes).join(", ")}` });
  check(value, path, errors);
};
const measured = (low: number, high: number, mostU: number) => object({ value: required(number(low, high)), u: optional(uncertainty(mostU)), ...graded });
const liquid = object({ behaviour: required(oneOf(["floats", "suspended", "sinks"])), liquidSg: required(number(0.7, 5)), uLiquidSg: optional(uncertainty(1)) });
const fluorescence = object({ strength: required(oneOf(fluorescenceStrengths)), colour: optional(text) });

const evidenceShape: Shape = {
  id: optional((value, path, errors) => {
    if (typeof value !== "string" && typeof value !== "number") errors.push({ path, message: "must be a text" });
  }),
  ri: optional(list(refractive, 50)),
  birefringence: optional(measured(0, 1, 0.5)),
  opticCharacter: optional(oneOf(opticCharacters)),
  opticSign: optional(oneOf(["+", "-"])),
  sg: optional(measured(0.5, 25, 10)),
  heavyLiquids: optional(list(liquid, 20)),
  colour: optional(list(text, 20)),
  transparency: optional(text),
  lustre: optional(text),
  pleochroism: optional(object({ strength: required(oneOf(strengths)), colours: optional(list(text, 10)) })),
  fluorescence: optional(object({ longWave: optional(fluorescence), shortWave: optional(fluorescence) })),
  absorption: optional(list(object({ nm: required(number(350, 800)), kind: required(oneOf(["line", "band"])), u: optional(uncertainty(50)) }), 50)),
  colourFilter: optional(text),
  phenomena: optional(list(text, 20)),
  thermal: optional(oneOf(["diamond-like", "inert"])),
  magnetic: optional(oneOf(magneticResponses)),
  features: optional(list(text, 50)),
};
