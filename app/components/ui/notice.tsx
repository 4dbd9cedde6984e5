/** A sentence about what was just done, announced to those who hear the page. */
export function NoticeBar({ notice }: { notice: { text: string; tone: "done" | "caution" } | null }) {
  return (
    <div role="status" aria-live="polite" className="no-print">
      {notice ? (
        <p className={`mx-auto mt-3 max-w-[90rem] px-7`}>
          <span className={`block rounded-md px-3.5 py-2 ${notice.tone === "done" ? "bg-green-bg text-green" : "bg-straw-bg text-straw"}`}>{notice.text}</span>
        </p>
      ) : null}
    </div>
  );
}
