import { useRef } from "react";
import { useIsHydrated } from "#app/components/layout/use-is-hydrated.ts";
import { useShortcut } from "#app/components/layout/use-shortcut.ts";
import { Button } from "#app/components/ui/button.tsx";
import { aboutTest, observationKinds } from "#app/domain/reading.ts";

const others: ReadonlyArray<readonly [key: string, does: string]> = [
  ["Enter", "goes to the next empty field, and records after the last"],
  ["Space", "after digits, goes to the next field: 1762 1770"],
  ["Ctrl Enter", "records from anywhere in the form"],
  ["Escape", "leaves a field; once more, goes back to the tests"],
  ["c", "concludes"],
  ["x", "strikes the latest reading"],
  ["/", "searches the logbook"],
  ["?", "shows this"],
];

/** The keys that act at the bench, for whoever asks by one. Without script there are none. */
export function KeysHelp() {
  const dialog = useRef<HTMLDialogElement>(null);
  const isHydrated = useIsHydrated();
  const open = () => {
    if (!dialog.current?.open) dialog.current?.showModal();
  };
  useShortcut("?", open);
  if (!isHydrated) return null;
  return (
    <>
      <button type="button" onClick={open} aria-keyshortcuts="?" className="hidden min-h-6 items-center text-xs text-ink-3 underline decoration-rule-2 hover:text-ink md:pointer-fine:inline-flex">
        All keys: ?
      </button>
      <dialog ref={dialog} aria-labelledby="keys-title" className="m-auto max-h-[85vh] w-[min(40rem,92vw)] overflow-y-auto rounded-lg border border-rule-2 bg-sheet p-5 text-ink backdrop:bg-ink/40">
        <h2 id="keys-title" className="mb-3">
          Keys at the bench
        </h2>
        <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-1 text-sm sm:grid-cols-[auto_1fr_auto_1fr]">
          {observationKinds.map((kind) => (
            <div key={kind} className="contents">
              <dt className="font-mono">{aboutTest(kind).hotkey}</dt>
              <dd>{aboutTest(kind).name}</dd>
            </div>
          ))}
        </dl>
        <dl className="mt-4 grid grid-cols-[auto_1fr] gap-x-4 gap-y-1 border-t border-rule pt-3 text-sm">
          {others.map(([key, does]) => (
            <div key={key} className="contents">
              <dt className="font-mono whitespace-nowrap">{key}</dt>
              <dd>{does}</dd>
            </div>
          ))}
        </dl>
        <form method="dialog" className="mt-4">
          <Button look="quiet">Close</Button>
        </form>
      </dialog>
    </>
  );
}
