export type Tone = "green" | "straw" | "red" | "tint" | "plain";

const tones: Record<Tone, string> = {
  green: "bg-green-bg text-green",
  straw: "bg-straw-bg text-straw",
  red: "bg-red-bg text-red",
  tint: "bg-tint-bg text-tint",
  plain: "bg-sunken text-ink-2",
};

/** A word on a coloured ground: the word says it, the colour helps. */
export function Chip({ tone = "plain", children }: { tone?: Tone; children: React.ReactNode }) {
  return <span className={`inline-block rounded-full px-2.5 py-px text-[12px] font-semibold whitespace-nowrap ${tones[tone]}`}>{children}</span>;
}

const dots: Record<Tone, string> = { green: "bg-green", straw: "bg-straw-mark", red: "bg-red", tint: "bg-tint", plain: "bg-ink-3" };

export function StateWord({ tone = "plain", children }: { tone?: Tone; children: React.ReactNode }) {
  return (
    <span className="inline-flex items-center gap-2 font-medium whitespace-nowrap">
      <span aria-hidden="true" className={`size-2 rounded-full ring-2 ring-rule ${dots[tone]}`} />
      {children}
    </span>
  );
}
