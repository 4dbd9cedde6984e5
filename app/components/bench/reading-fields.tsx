import type { FieldMetadata } from "@conform-to/react";
import { WaterTemperature } from "./water-temperature.tsx";
import { CheckboxField } from "#app/components/ui/choice-field.tsx";
import { checkboxProps, fieldProps } from "#app/components/ui/field-props.ts";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { TextAreaField, TextField } from "#app/components/ui/text-field.tsx";
import {
  facetNames, interferenceFigureNames, lightNames, polariscopeBehaviourNames, spotMethodNames, weighingMethodNames, type WrittenKind,
} from "#app/domain/reading.ts";

export type ReadingFieldset = Record<
  | "requestId" | "instrument" | "quality" | "noResultReason" | "note" | "facet" | "light" | "isOneEdge" | "isRotated" | "low" | "high" | "n" | "method" | "limit" | "angleDeg" | "prismN"
  | "behaviour" | "directionsTried" | "figure" | "sign" | "massAirCt" | "massLiquidCt" | "massAirCt2" | "massAirCt3" | "massLiquidCt2" | "massLiquidCt3" | "tempC" | "weightCt" | "shape" | "lengthMm" | "widthMm" | "depthMm" | "text" | "rows",
  string
>;
type Fields = Required<{ [Name in keyof ReadingFieldset]: FieldMetadata<string, ReadingFieldset, string[]> }>;

/** Open where something in it was typed or refused. */
const againOpen = (fields: Fields) => (["massAirCt2", "massAirCt3", "massLiquidCt2", "massLiquidCt3"] as const).some((name) => fields[name].initialValue || fields[name].errors?.length);
const optionsOf = (names: Readonly<Record<string, string>>) => Object.entries(names).map(([value, label]) => ({ value, label }));
const figures = { inputMode: "decimal", isMono: true, size: "bench", maxLength: 24 } as const;

/** What each test asks for: the numbers as the instrument shows them, then how they were seen. */
export function ReadingFields({ kind, fields }: { kind: Exclude<WrittenKind, "rotation">; fields: Fields }) {
  const number = (name: keyof ReadingFieldset, label: string, unit: string, more: object = {}) => <TextField key={fields[name].key} {...fieldProps(fields[name])} {...figures} label={label} unit={unit} {...more} />;
  const choice = (name: keyof ReadingFieldset, label: string, names: Readonly<Record<string, string>>, more: object = {}) => <SelectField key={fields[name].key} {...fieldProps(fields[name])} label={label} options={optionsOf(names)} {...more} />;
  const seen = (
    <div className="grid grid-cols-2 gap-2.5">
      {choice("light", "Light", lightNames)}
      {choice("facet", "Facet", facetNames)}
    </div>
  );
  switch (kind) {
    case "refractometer":
      return (
        <>
          <div className="grid grid-cols-2 gap-2.5">
            {number("low", "Low edge", "n", { hint: "1762 1770 will do" })}
            {number("high", "High edge", "n", { isRequired: true })}
          </div>
          <div className="flex flex-wrap gap-x-5">
            <CheckboxField key={fields.isOneEdge.key} {...checkboxProps(fields.isOneEdge)} label="One edge only" />
            <CheckboxField key={fields.isRotated.key} {...checkboxProps(fields.isRotated)} label="Extremes of a full rotation" />
          </div>
          {seen}
        </>
      );
    case "spot":
      return (
        <>
          {number("n", "Spot", "n")}
          {choice("method", "Read at", spotMethodNames)}
          {seen}
        </>
      );
    case "overLimit":
      return (
        <>
          {number("limit", "The liquid's limit", "n", { hint: "Only the liquid's own edge was seen, on two facets if there are two." })}
          {seen}
        </>
      );
    case "criticalAngle":
      return (
        <>
          <div className="grid grid-cols-2 gap-2.5">
            {number("angleDeg", "Critical angle", "°")}
            {number("prismN", "Prism's index", "n")}
          </div>
          {seen}
        </>
      );
    case "polariscope":
      return (
        <>
          {choice("behaviour", "In a full turn", polariscopeBehaviourNames, { emptyLabel: "Choose", size: "bench" })}
          {number("directionsTried", "Directions tried", "", { inputMode: "numeric", size: "normal", hint: "At least three: along an optic axis every stone looks singly refractive." })}
          <div className="grid grid-cols-[minmax(0,2fr)_minmax(0,1fr)] gap-2.5">
            {choice("figure", "Interference figure", interferenceFigureNames)}
            {choice("sign", "Sign", { "+": "Positive", "-": "Negative" }, { emptyLabel: "Not read", isRequired: false })}
          </div>
        </>
      );
    case "density":
      return (
        <>
          <div className="grid grid-cols-2 gap-2.5">
            {number("massAirCt", "In air", "ct")}
            {number("massLiquidCt", "In water", "ct")}
          </div>
          <WaterTemperature field={fields.tempC} />
          <details open={againOpen(fields)}>
            <summary className="flex min-h-6 cursor-pointer items-center text-sm text-tint pointer-coarse:min-h-11">Weigh a second and third time</summary>
            <div className="mt-1.5 grid grid-cols-2 gap-2.5">
              {number("massAirCt2", "In air, second", "ct", { size: "normal", isRequired: false })}
              {number("massLiquidCt2", "In water, second", "ct", { size: "normal", isRequired: false })}
              {number("massAirCt3", "In air, third", "ct", { size: "normal", isRequired: false })}
              {number("massLiquidCt3", "In water, third", "ct", { size: "normal", isRequired: false })}
            </div>
          </details>
          {choice("method", "How it was weighed", weighingMethodNames)}
        </>
      );
    case "weight":
      return number("weightCt", "Weight", "ct");
    case "dimensions":
      return (
        <>
          {choice("shape", "Outline", { other: "Length and width", round: "Round: largest and smallest diameter" })}
          <div className="grid grid-cols-3 gap-2.5">
            {number("lengthMm", "Length", "mm", { hint: "or largest" })}
            {number("widthMm", "Width", "mm", { hint: "or smallest" })}
            {number("depthMm", "Depth", "mm")}
          </div>
        </>
      );
    case "free":
      return <TextAreaField key={fields.text.key} {...fieldProps(fields.text)} label="What was seen" rows={5} hint="Inclusions, growth, colour, fluorescence: where, how large, with which light and magnification." />;
  }
}
