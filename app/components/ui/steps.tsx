export type Step = { label: string; state: "done" | "now" | "ahead" };

/** How far something has come: said in words for those who do not see the colours. */
export function Steps({ steps, label }: { steps: readonly Step[]; label: string }) {
  return (
    <ol aria-label={label} className="flex flex-wrap text-[12.5px]">
      {steps.map((step, index) => (
        <li
          key={step.label}
          aria-current={step.state === "now" ? "step" : undefined}
          className={`-ml-px border px-3 py-1.5 ${index === 0 ? "rounded-l-md" : ""} ${index === steps.length - 1 ? "rounded-r-md" : ""} ${
            step.state === "now" ? "border-tint bg-tint font-semibold text-on-tint" : step.state === "done" ? "border-rule-2 bg-sheet text-green" : "border-rule-2 bg-sheet text-ink-3"
          }`}
        >
          {step.state === "done" ? <span aria-hidden="true">✓ </span> : null}
          {step.label}
          {step.state === "done" ? <span className="sr-only">, done</span> : null}
        </li>
      ))}
    </ol>
  );
}
