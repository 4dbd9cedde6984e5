/** A caution beside the work it is about: what can be harmed, and that local rules and licensed practice come first. */
export function Caution({ children, className = "" }: { children: React.ReactNode; className?: string }) {
  return <div className={`rounded-r-md border-l-[3px] border-straw-mark bg-straw-bg px-3 py-2 text-[13px] text-straw ${className}`}>{children}</div>;
}
