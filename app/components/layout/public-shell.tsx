import type { ReactNode } from "react";
import { Link } from "react-router";
import { Brand } from "./brand.tsx";
import { RoomSwitch } from "./room-switch.tsx";
import { SkipLink } from "./skip-link.tsx";
import { useHeadingFocus } from "./use-heading-focus.ts";

type PublicShellProps = { room: "light" | "dim" | "system"; links?: ReactNode; notice?: ReactNode; isNarrow?: boolean; children: ReactNode };

/** The frame of pages outside a laboratory: signing in, a client's own, paying. */
export function PublicShell({ room, links, notice, isNarrow = false, children }: PublicShellProps) {
  useHeadingFocus();
  return (
    <div className="flex min-h-dvh flex-col">
      <SkipLink />
      <div className="ramp no-print h-1" />
      <header className="no-print border-b border-rule bg-sheet">
        <div className="mx-auto flex max-w-5xl flex-wrap items-center gap-x-6 gap-y-1 px-4 py-1 sm:px-6">
          <Brand to="/" />
          {links ? <div className="ml-auto flex flex-wrap items-center gap-x-4 gap-y-1">{links}</div> : null}
        </div>
      </header>
      {notice}
      <main id="main" tabIndex={-1} className={`mx-auto w-full grow px-4 pb-12 sm:px-6 print:max-w-none print:p-0 ${isNarrow ? "max-w-md" : "max-w-5xl"}`}>
        {children}
      </main>
      <footer className="no-print mx-auto flex w-full max-w-5xl flex-wrap items-center justify-between gap-3 border-t border-rule px-4 py-4 text-sm text-ink-3 sm:px-6">
        <Link to="/v" reloadDocument className="inline-flex min-h-6 items-center text-ink-2 underline">
          Check a report
        </Link>
        <RoomSwitch room={room} />
      </footer>
    </div>
  );
}
