/** Says what would be here and what to do first. */
export function EmptyState({ title, children, action }: { title: string; children: React.ReactNode; action?: React.ReactNode }) {
  return (
    <div className="px-6 py-10 text-center">
      <p className="font-serif text-[18px]">{title}</p>
      <p className="mx-auto mt-1 max-w-prose text-ink-2">{children}</p>
      {action ? <div className="mt-4">{action}</div> : null}
    </div>
  );
}
