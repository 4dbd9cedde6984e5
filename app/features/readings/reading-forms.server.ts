import { z } from "zod";
import {
  facets, interferenceFigures, lights, noResultReasons, polariscopeBehaviours, readingQualities, spotMethods, weighingMethods, type ObservationKind,
} from "#app/domain/reading.ts";
import { idFromShortRef } from "#app/domain/short-ref.ts";
import { describedKinds, isDescribed, testForms, type DescribedKind } from "#app/domain/bench-tests/test-forms.ts";
import { againNames, twoEdges, type DescribedDraft, type ReadingDraft } from "./reading-draft.ts";
import { isTicked, optionalLines, requestIdField, requiredText } from "#app/features/form-fields.server.ts";

/** Digits as typed; whether they make sense is judged with the instrument in hand (compose-reading.ts). */
const typed = () => z.string().optional().transform((text) => text ?? "");

const seen = {
  facet: z.enum(facets, { error: "Choose the facet." }),
  light: z.enum(lights, { error: "Choose the light." }),
};

const common = {
  requestId: requestIdField<"observation">(),
  instrument: z
    .string()
    .optional()
    .transform((ref, issues) => {
      if (!ref) return null;
      const id = idFromShortRef<"instrument">(ref);
      if (id === undefined) {
        issues.addIssue({ code: "custom", message: "Choose an instrument of this laboratory." });
        return z.NEVER;
      }
      return id;
    }),
  quality: z.enum(readingQualities, { error: "Choose how good the reading is." }),
  noResultReason: z.enum(noResultReasons, { error: "Choose a reason from the list." }).optional(),
  note: optionalLines(2000),
  /** By the clock of a device that kept the reading while there was no line. */
  madeAt: z.iso.datetime({ offset: true, error: "The time of this reading does not read as one." }).transform((text) => new Date(text)).optional(),
  /** The candidates were hidden while the reading was made. */
  areCandidatesHidden: isTicked(),
};

/** The fields of a described test as they came; composeDescribed judges them with the instrument in hand. */
function typedFields(kind: DescribedKind) {
  const one = () => z.string().optional().transform((text) => text ?? "");
  const many = () => z.union([z.array(z.string()), z.string().transform((text) => [text])]).optional().transform((texts) => texts ?? []);
  return Object.fromEntries(testForms[kind].fields.map(({ name, type }) => [name, type === "many" ? many() : one()]));
}

const readings = z.discriminatedUnion(
  "kind",
  [
    z.object({ ...common, ...seen, kind: z.literal("refractometer"), isOneEdge: isTicked(), isRotated: isTicked(), low: typed(), high: typed() }),
    z.object({ ...common, ...seen, kind: z.literal("spot"), method: z.enum(spotMethods, { error: "Choose how the spot was read." }), n: typed() }),
    z.object({ ...common, ...seen, kind: z.literal("overLimit"), limit: typed() }),
    z.object({ ...common, ...seen, kind: z.literal("criticalAngle"), angleDeg: typed(), prismN: typed() }),
    z.object({
      ...common,
      kind: z.literal("polariscope"),
      behaviour: z.enum(polariscopeBehaviours, { error: "Choose what was seen in a full turn." }).optional(),
      directionsTried: typed(),
      figure: z.enum(interferenceFigures, { error: "Choose which figure was seen." }).optional(),
      sign: z.enum(["+", "-"], { error: "Choose the sign, or leave it open." }).optional(),
    }),
    z.object({ ...common, kind: z.literal("density"), method: z.enum(weighingMethods, { error: "Choose how it was weighed." }), massAirCt: typed(), massLiquidCt: typed(), tempC: typed(), massAirCt2: typed(), massAirCt3: typed(), massLiquidCt2: typed(), massLiquidCt3: typed() }),
    z.object({ ...common, kind: z.literal("weight"), weightCt: typed() }),
    z.object({ ...common, kind: z.literal("dimensions"), shape: z.enum(["round", "other"], { error: "Choose the outline." }), lengthMm: typed(), widthMm: typed(), depthMm: typed() }),
    z.object({ ...common, kind: z.literal("rotation"), light: seen.light, rows: typed() }),
    z.object({ ...common, kind: z.literal("free"), text: typed() }),
    ...describedKinds.map((kind) => z.object({ ...common, kind: z.literal(kind), ...typedFields(kind) })),
  ],
  { error: "Choose a test." },
);

/** One reading of the bench's form, whatever its kind. */
export const readingForm = readings
  .superRefine((input, issues) => {
    if (input.quality === "noResult" && !input.noResultReason) issues.addIssue({ code: "custom", path: ["noResultReason"], message: "Say why there is no reading." });
    if (input.kind === "polariscope" && input.quality !== "noResult") {
      if (!input.behaviour) issues.addIssue({ code: "custom", path: ["behaviour"], message: "Choose what was seen in a full turn." });
      if (!input.figure) issues.addIssue({ code: "custom", path: ["figure"], message: "Choose which figure was seen, or that none was sought." });
    }
  })
  .transform((input) => ({
    requestId: input.requestId,
    instrumentId: input.instrument,
    noResultReason: input.quality === "noResult" ? (input.noResultReason ?? "") : "",
    note: input.note,
    areCandidatesHidden: input.areCandidatesHidden,
    madeAt: input.madeAt ?? null,
    draft: draftOf(input),
  }));

const isOfDescribed = <Input extends { kind: ObservationKind }>(input: Input): input is Extract<Input, { kind: DescribedKind }> => isDescribed(input.kind);

function draftOf(input: z.output<typeof readings>): ReadingDraft {
  if (isOfDescribed(input)) return { kind: input.kind, quality: input.quality, typed: Object.fromEntries(testForms[input.kind].fields.map(({ name }) => [name, (input as unknown as DescribedDraft["typed"])[name] ?? ""])) };
  if (input.kind === "refractometer") return { ...input, ...twoEdges(input), edges: input.isOneEdge ? "one" : "two" };
  if (input.kind === "density") return { ...input, again: Object.fromEntries(againNames.map((name) => [name, input[name]])) };
  if (input.kind === "polariscope") return { ...input, behaviour: input.behaviour ?? "cannotTell", figure: input.figure ?? "notSought", sign: input.sign ?? null };
  return input;
}

/** A strike that waited on a device: of a saved reading by its number, of one that waited before it by its form. */
export const sentStrikeForm = z.object({
  reason: requiredText(500, "Say why the reading is struck."),
  named: z.union([z.object({ sequence: z.coerce.number().int().min(1).max(1_000_000) }), z.object({ requestId: requestIdField<"observation">() })], { error: "This strike names no reading." }),
});

export const strikeForm = z.object({ reason: requiredText(500, "Say why the reading is struck.") });
