import { Link } from "react-router";
import { Mark } from "./mark.tsx";
import { RoomSwitch } from "./room-switch.tsx";
import { SkipLink } from "./skip-link.tsx";

type PublicShellProps = { room: "light" | "dim" | "system"; links?: React.ReactNode; notice?: React.ReactNode; isNarrow?: boolean; children: React.ReactNode };

/** The frame of pages outside a laboratory: signing in, a client's own, paying. */
export function PublicShell({ room, links, notice, isNarrow = false, children }: PublicShellProps) {
  return (
    <div className="flex min-h-screen flex-col">
      <SkipLink />
      <div className="ramp no-print h-1" />
      <header className="no-print border-b border-rule bg-sheet">
        <div className="mx-auto flex max-w-5xl flex-wrap items-center gap-x-6 gap-y-1 px-4 py-2.5 sm:px-6">
          <Link to="/" className="flex items-center gap-2.5 font-serif text-[19px] font-medium text-ink no-underline">
            <Mark />
            Isogyre
          </Link>
          {links ? <div className="ml-auto flex flex-wrap items-center gap-x-4 gap-y-1">{links}</div> : null}
        </div>
      </header>
      {notice}
      <main id="main" className={`mx-auto w-full grow px-4 pb-12 sm:px-6 ${isNarrow ? "max-w-md" : "max-w-5xl"}`}>
        {children}
      </main>
      <footer className="no-print mx-auto flex w-full max-w-5xl flex-wrap items-center justify-between gap-3 px-4 py-4 text-[13px] text-ink-3 sm:px-6">
        <Link to="/v" reloadDocument className="text-ink-2">
          Check a report
        </Link>
        <RoomSwitch room={room} />
      </footer>
    </div>
  );
}
