type PageHeaderProps = { title: React.ReactNode; note?: React.ReactNode; eyebrow?: React.ReactNode; actions?: React.ReactNode };

export function PageHeader({ title, note, eyebrow, actions }: PageHeaderProps) {
  return (
    <div className="flex flex-wrap items-start gap-x-6 gap-y-3 pt-6 pb-4">
      <div className="min-w-0">
        {eyebrow ? <p className="font-mono text-[13px] text-ink-3">{eyebrow}</p> : null}
        <h1 className="text-[27px]">{title}</h1>
        {note ? <p className="mt-0.5 text-ink-2">{note}</p> : null}
      </div>
      {actions ? <div className="no-print ml-auto flex flex-wrap items-center gap-2 pt-1">{actions}</div> : null}
    </div>
  );
}
