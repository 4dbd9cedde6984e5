/** A key of the keyboard. */
export function Key({ children, isInverse = false }: { children: React.ReactNode; isInverse?: boolean }) {
  return (
    <kbd
      className={`rounded border border-b-2 px-1.5 font-mono text-[11px] leading-4 font-normal ${isInverse ? "border-current bg-transparent opacity-80" : "border-rule-2 bg-sheet text-ink-2"}`}
      aria-hidden="true"
    >
      {children}
    </kbd>
  );
}
