import { Icon } from "./icon.tsx";

/** A sentence about what was just done, announced to those who hear the page. */
export function NoticeBar({ notice }: { notice: { text: string; tone: "done" | "caution" } | null }) {
  const isDone = notice?.tone === "done";
  return (
    <div role="status" aria-live="polite" className="no-print">
      {notice ? (
        <div className="mx-auto mt-4 max-w-[100rem] px-4 sm:px-7">
          <p className={`flex gap-2.5 rounded-md border px-3.5 py-2 font-medium ${isDone ? "border-transparent bg-green-bg text-green" : "border-transparent bg-straw-bg text-straw"}`}>
            <span className="pt-0.5">
              <Icon name={isDone ? "check" : "alert"} />
            </span>
            {notice.text}
          </p>
        </div>
      ) : null}
    </div>
  );
}
