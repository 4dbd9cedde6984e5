import { useId, type ReactNode } from "react";

/** A ruled-off part of a card that holds several, as in a long form. */
export function CardSection({ title, intro, headingLevel: level = 2, children }: { title?: string; intro?: ReactNode; headingLevel?: 2 | 3; children: ReactNode }) {
  const titleId = useId();
  const Heading = `h${level}` as const;
  return (
    <section aria-labelledby={title ? titleId : undefined} className="border-t border-rule px-4.5 py-4.5 first:border-t-0 sm:px-5">
      {title ? <Heading id={titleId}>{title}</Heading> : null}
      {intro ? <p className="mt-1 max-w-prose text-ink-2">{intro}</p> : null}
      <div className={title ? "mt-3.5" : undefined}>{children}</div>
    </section>
  );
}
