import { isDescribed, testForms, type DescribedKind } from "#app/domain/bench-tests/test-forms.ts";
import {
  facets, interferenceFigures, lights, observationKinds, polariscopeBehaviours, readingQualities, spotMethods, weighingMethods,
  type Facet, type InterferenceFigure, type Light, type ObservationKind, type PolariscopeBehaviour, type ReadingQuality, type SpotMethod, type WeighingMethod,
} from "#app/domain/reading.ts";

/** Fields of a second and third weighing. */
export const againNames = ["massAirCt2", "massAirCt3", "massLiquidCt2", "massLiquidCt3"] as const;
type AgainName = (typeof againNames)[number];

type Seen = { facet: Facet; light: Light };

/** A reading while it is being typed: choices as chosen, numbers as text. */
export type ReadingDraft = Readonly<
  { quality: ReadingQuality } & (
    | ({ kind: "refractometer"; edges: "two" | "one"; low: string; high: string; isRotated: boolean } & Seen)
    | ({ kind: "spot"; method: SpotMethod; n: string } & Seen)
    | ({ kind: "overLimit"; limit: string } & Seen)
    | ({ kind: "criticalAngle"; angleDeg: string; prismN: string } & Seen)
    | { kind: "polariscope"; behaviour: PolariscopeBehaviour; directionsTried: string; figure: InterferenceFigure; sign: "+" | "-" | null }
    | { kind: "density"; method: WeighingMethod; massAirCt: string; massLiquidCt: string; tempC: string; /** The second and third weighing of each; all may be left out. */ again?: Partial<Record<AgainName, string>> }
    | { kind: "weight"; weightCt: string }
    | { kind: "dimensions"; shape: "round" | "other"; lengthMm: string; widthMm: string; depthMm: string }
    | { kind: "rotation"; light: Light; rows: string }
    | { kind: "free"; text: string }
    | DescribedDraft
  )
>;

/** What was chosen and typed in a described form, field by field, nothing judged yet. */
export type DescribedDraft = { kind: DescribedKind; typed: Readonly<Record<string, string | readonly string[]>> };
export const isDescribedDraft = <Draft extends { kind: ObservationKind }>(draft: Draft): draft is Extract<Draft, { kind: DescribedKind }> => isDescribed(draft.kind);

/** Both edges may be typed in the first field, with a blank between: "1762 1770". */
export function twoEdges({ low, high }: { low: string; high: string }): { low: string; high: string } {
  const both = /^\s*(\S+)\s+(\S+)\s*$/.exec(low);
  return both && high.trim() === "" ? { low: both[1]!, high: both[2]! } : { low, high };
}

/** Reads a form that is still being filled in; what is not chosen yet says nothing, or takes the form's own first choice. */
export function readingDraftFromForm(form: Pick<FormData, "get" | "getAll">): ReadingDraft {
  const text = (name: string) => {
    const value = form.get(name);
    return typeof value === "string" ? value : "";
  };
  const one = <T extends string>(name: string, choices: readonly T[]): T => choices.find((choice) => choice === form.get(name)) ?? choices[0]!;
  const seen = () => ({ facet: one("facet", facets), light: one("light", lights) });
  const kind = [...observationKinds].find((choice) => choice === form.get("kind")) ?? "refractometer";
  const quality = one("quality", readingQualities);
  if (isDescribed(kind)) return { kind, quality, typed: describedEntries(kind, form) };
  switch (kind) {
    case "refractometer":
      return { kind, quality, edges: form.get("isOneEdge") === "on" ? "one" : "two", ...twoEdges({ low: text("low"), high: text("high") }), isRotated: form.get("isRotated") === "on", ...seen() };
    case "spot":
      return { kind, quality, method: one("method", spotMethods), n: text("n"), ...seen() };
    case "overLimit":
      return { kind, quality, limit: text("limit"), ...seen() };
    case "criticalAngle":
      return { kind, quality, angleDeg: text("angleDeg"), prismN: text("prismN"), ...seen() };
    case "polariscope": {
      const sign = form.get("sign");
      return { kind, quality, behaviour: polariscopeBehaviours.find((choice) => choice === form.get("behaviour")) ?? "cannotTell", directionsTried: text("directionsTried"), figure: one("figure", interferenceFigures), sign: sign === "+" || sign === "-" ? sign : null };
    }
    case "density":
      return { kind, quality, method: one("method", weighingMethods), massAirCt: text("massAirCt"), massLiquidCt: text("massLiquidCt"), tempC: text("tempC"), again: Object.fromEntries(againNames.map((name) => [name, text(name)])) };
    case "weight":
      return { kind, quality, weightCt: text("weightCt") };
    case "dimensions":
      return { kind, quality, shape: one("shape", ["other", "round"] as const), lengthMm: text("lengthMm"), widthMm: text("widthMm"), depthMm: text("depthMm") };
    case "rotation":
      return { kind, quality, light: one("light", lights), rows: text("rows") };
    case "free":
      return { kind, quality, text: text("text") };
  }
}

function describedEntries(kind: DescribedKind, form: Pick<FormData, "getAll">): DescribedDraft["typed"] {
  return Object.fromEntries(
    testForms[kind].fields.map(({ name, type }) => {
      const texts = form.getAll(name).filter((value) => typeof value === "string");
      return [name, type === "many" ? texts : (texts[0] ?? "")];
    }),
  );
}
