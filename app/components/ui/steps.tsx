import { Icon } from "./icon.tsx";

export type Step = { label: string; state: "done" | "now" | "ahead" };

const looks: Readonly<Record<Step["state"], string>> = {
  done: "border-rule-2 bg-sheet text-green",
  now: "z-10 border-tint bg-tint font-semibold text-on-tint",
  ahead: "border-rule-2 bg-sheet text-ink-3",
};

/** How far something has come: said in words for those who do not see the colours. On a narrow screen only the present step keeps its word. */
export function Steps({ steps, label }: { steps: readonly Step[]; label: string }) {
  return (
    <ol aria-label={label} className="flex text-sm">
      {steps.map((step) => (
        <li
          key={step.label}
          aria-current={step.state === "now" ? "step" : undefined}
          className={`relative -ml-px flex min-h-8 items-center gap-1.5 border px-3 first:ml-0 first:rounded-l-md last:rounded-r-md ${looks[step.state]}`}
        >
          {step.state === "done" ? <Icon name="check" sizePx={14} /> : null}
          <span className={step.state === "now" ? "" : "max-sm:sr-only"}>{step.label}</span>
          {step.state === "ahead" ? (
            <span aria-hidden="true" className="sm:hidden">
              ·
            </span>
          ) : null}
          {step.state === "done" ? <span className="sr-only">, done</span> : null}
        </li>
      ))}
    </ol>
  );
}
