import type { ReactNode } from "react";

export type Tone = "green" | "straw" | "red" | "tint" | "blue" | "plain";

const tones: Readonly<Record<Tone, string>> = {
  green: "bg-green-bg text-green",
  straw: "bg-straw-bg text-straw",
  red: "bg-red-bg text-red",
  tint: "bg-tint-bg text-tint",
  blue: "bg-blue-bg text-blue",
  plain: "bg-sunken text-ink-2",
};

/** A word on a coloured ground: the word says it, the colour helps. */
export function Chip({ tone = "plain", children }: { tone?: Tone; children: ReactNode }) {
  // The border is unseen until colours are forced or the ground is left out in print.
  return <span className={`inline-block rounded-full border border-transparent px-2.5 text-xs font-semibold whitespace-nowrap print:border-current ${tones[tone]}`}>{children}</span>;
}

const dots: Readonly<Record<Tone, string>> = {
  green: "bg-green ring-green-bg",
  straw: "bg-straw-mark ring-straw-bg",
  red: "bg-red ring-red-bg",
  tint: "bg-tint ring-tint-bg",
  blue: "bg-blue ring-blue-bg",
  plain: "bg-ink-3 ring-sunken",
};

/** A state: a dot, and the word that it stands for. */
export function StateWord({ tone = "plain", children }: { tone?: Tone; children: ReactNode }) {
  return (
    <span className="inline-flex items-center gap-2 font-medium whitespace-nowrap">
      <span aria-hidden="true" className={`size-2 rounded-full ring-2 forced-color-adjust-none [print-color-adjust:exact] ${dots[tone]}`} />
      {children}
    </span>
  );
}
