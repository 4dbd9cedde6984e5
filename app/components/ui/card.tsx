type CardProps = { title?: React.ReactNode; note?: React.ReactNode; aside?: React.ReactNode; children: React.ReactNode; className?: string; id?: string; headingLevel?: 2 | 3 };

/** A sheet of paper with a heading. */
export function Card({ title, note, aside, children, className = "", id, headingLevel: level = 2 }: CardProps) {
  const Heading = `h${level}` as const;
  return (
    <section id={id} aria-labelledby={title && id ? `${id}-title` : undefined} className={`overflow-hidden rounded-[10px] border border-rule bg-sheet ${className}`}>
      {title ? (
        <header className="flex flex-wrap items-baseline gap-x-3 gap-y-1 px-4.5 pt-3.5 pb-2.5">
          <Heading id={id ? `${id}-title` : undefined} className="text-[18px]">
            {title}
          </Heading>
          {note ? <small className="text-[12.5px] text-ink-3">{note}</small> : null}
          {aside ? <div className="ml-auto">{aside}</div> : null}
        </header>
      ) : null}
      {children}
    </section>
  );
}

export function CardBody({ children, className = "" }: { children: React.ReactNode; className?: string }) {
  return <div className={`px-4.5 pt-1 pb-4 ${className}`}>{children}</div>;
}
