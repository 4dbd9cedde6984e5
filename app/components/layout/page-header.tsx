import type { ReactNode } from "react";

type PageHeaderProps = {
  title: ReactNode;
  /** A line below the title. */
  note?: ReactNode;
  /** A code, or the way back, above the title. */
  eyebrow?: ReactNode;
  /** What belongs to the matter: client, size, where it is. */
  meta?: ReadonlyArray<{ name: string; value: ReactNode }>;
  /** A picture before the words. */
  picture?: ReactNode;
  actions?: ReactNode;
};

/** The page's one h1. After a navigation the shell moves the focus to it. */
export function PageHeader({ title, note, eyebrow, meta, picture, actions }: PageHeaderProps) {
  const shownMeta = meta?.filter(({ value }) => value !== null && value !== undefined && value !== "") ?? [];
  return (
    <div className="flex flex-wrap items-start gap-x-6 gap-y-3 pt-6 pb-4">
      {picture}
      <div className="min-w-0 grow basis-72">
        {eyebrow ? <p className="font-mono text-sm text-ink-3">{eyebrow}</p> : null}
        <h1 tabIndex={-1}>{title}</h1>
        {note ? <p className="mt-1 text-ink-2">{note}</p> : null}
        {shownMeta.length > 0 ? (
          <dl className="mt-1.5 flex flex-wrap gap-x-4.5 gap-y-0.5">
            {shownMeta.map(({ name, value }) => (
              <div key={name} className="flex gap-1.5">
                <dt className="text-ink-3">{name}</dt>
                <dd className="text-ink-2">{value}</dd>
              </div>
            ))}
          </dl>
        ) : null}
      </div>
      {actions ? <div className="no-print ml-auto flex flex-wrap items-center gap-2.5 pt-1">{actions}</div> : null}
    </div>
  );
}
