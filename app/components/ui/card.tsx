import { useId, type ReactNode } from "react";

type CardProps = {
  title?: ReactNode;
  /** Small words beside the title. */
  note?: ReactNode;
  /** Chips or buttons at the heading's end. */
  aside?: ReactNode;
  /** A CardBody, CardSections or a Table: a card itself has no padding. */
  children: ReactNode;
  /** Layout only. */
  className?: string;
  id?: string;
  headingLevel?: 2 | 3;
};

/** A sheet of paper with a heading. */
export function Card({ title, note, aside, children, className = "", id, headingLevel: level = 2 }: CardProps) {
  const titleId = useId();
  const Heading = `h${level}` as const;
  return (
    <section id={id} aria-labelledby={title ? titleId : undefined} className={`min-w-0 rounded-lg border border-rule bg-sheet print:border-rule-2 ${className}`}>
      {title ? (
        <header className="flex flex-wrap items-baseline gap-x-3 gap-y-1 px-4.5 pt-3.5 pb-2.5">
          <Heading id={titleId}>{title}</Heading>
          {note ? <p className="text-xs text-ink-3">{note}</p> : null}
          {aside ? <div className="ml-auto flex flex-wrap items-center gap-2">{aside}</div> : null}
        </header>
      ) : null}
      {children}
    </section>
  );
}

export function CardBody({ children, className = "" }: { children: ReactNode; className?: string }) {
  return <div className={`px-4.5 pt-1 pb-4.5 first:pt-4.5 ${className}`}>{children}</div>;
}
