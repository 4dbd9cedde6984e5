type SegmentedChoiceProps<Value extends string> = { label: string; value: Value | null; options: Readonly<Record<Value, string>>; onChoose: (value: Value) => void };

/** A few choices side by side, acting at once; for what script alone does. */
export function SegmentedChoice<Value extends string>({ label, value, options, onChoose }: SegmentedChoiceProps<Value>) {
  return (
    <div role="group" aria-label={label} className="inline-flex">
      {(Object.entries(options) as [Value, string][]).map(([option, text]) => (
        <button
          key={option}
          type="button"
          aria-pressed={option === value}
          onClick={() => onChoose(option)}
          className={`-ml-px min-h-8 cursor-pointer border px-2.5 text-sm first-of-type:ml-0 first-of-type:rounded-l-md last-of-type:rounded-r-md pointer-coarse:min-h-11 ${
            option === value ? "z-10 border-tint bg-tint font-semibold text-on-tint" : "border-rule-2 bg-sheet text-ink-2 hover:bg-tint-bg hover:text-tint"
          }`}
        >
          {text}
        </button>
      ))}
    </div>
  );
}
