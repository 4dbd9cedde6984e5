/** A step that should not happen by a slip: opened first, then confirmed. Works without script. */
export function Confirm({ summary, children, tone = "danger" }: { summary: string; children: React.ReactNode; tone?: "danger" | "quiet" }) {
  return (
    <details className="group">
      <summary className={`inline-flex min-h-9 list-none items-center rounded-md border bg-sheet px-3.5 py-1.5 font-semibold select-none ${tone === "danger" ? "border-red text-red" : "border-rule-2 text-tint"}`}>{summary}</summary>
      <div className="mt-2 rounded-md border border-rule-2 bg-sheet p-3.5">{children}</div>
    </details>
  );
}
