import { useSearchParams } from "react-router";
import { LinkButton } from "./button.tsx";

/** Goes on from a keyset cursor in the URL; "Earlier" leads back. */
export function Pager({ before, after }: { before?: string | null; after?: string | null }) {
  const [params] = useSearchParams();
  if (!before && !after) return null;
  const to = (key: "before" | "after", cursor: string) => {
    const next = new URLSearchParams(params);
    next.delete("before");
    next.delete("after");
    if (cursor) next.set(key, cursor);
    return `?${next}`;
  };
  return (
    <nav aria-label="Pages" className="no-print mt-3 flex justify-end gap-2">
      {before !== null && before !== undefined ? <LinkButton to={to("before", before)}>Back</LinkButton> : null}
      {after ? <LinkButton to={to("after", after)}>Further</LinkButton> : null}
    </nav>
  );
}
