import { useSearchParams } from "react-router";
import { LinkButton } from "./button.tsx";

/** Goes on from a keyset cursor in the URL. An empty `before` leads to the first page. */
export function Pager({ before, after }: { before?: string | null; after?: string | null }) {
  const [params] = useSearchParams();
  const hasBefore = before !== null && before !== undefined;
  if (!hasBefore && !after) return null;
  const to = (key: "before" | "after", cursor: string) => {
    const next = new URLSearchParams(params);
    next.delete("before");
    next.delete("after");
    if (cursor) next.set(key, cursor);
    return `?${next}`;
  };
  return (
    <nav aria-label="Pages" className="no-print mt-4 flex justify-end gap-2">
      {hasBefore ? (
        <LinkButton to={to("before", before)} icon="left" rel="prev">
          Back
        </LinkButton>
      ) : null}
      {after ? (
        <LinkButton to={to("after", after)} icon="right" rel="next" className="flex-row-reverse">
          Further
        </LinkButton>
      ) : null}
    </nav>
  );
}
