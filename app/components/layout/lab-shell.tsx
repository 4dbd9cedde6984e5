import { Form, Link, NavLink } from "react-router";
import { roleNames, type Role } from "#app/domain/roles.ts";
import { Key } from "#app/components/ui/key.tsx";
import { Mark } from "./mark.tsx";
import { RoomSwitch } from "./room-switch.tsx";
import { SkipLink } from "./skip-link.tsx";

export type NavItem = { label: string; to: string };

type LabShellProps = {
  laboratory: { slug: string; name: string };
  person: { name: string; email: string };
  roles: readonly Role[];
  nav: readonly NavItem[];
  room: "light" | "dim" | "system";
  search: string;
  notice: React.ReactNode;
  children: React.ReactNode;
};

/** The frame of a laboratory's pages: the ramp, the places, the search box, who is here. */
export function LabShell({ laboratory, person, roles, nav, room, search, notice, children }: LabShellProps) {
  return (
    <div className="min-h-screen">
      <SkipLink />
      <div className="ramp no-print h-1" />
      <header className="no-print relative z-10 border-b border-rule bg-sheet">
        <div className="mx-auto flex max-w-[90rem] flex-wrap items-center gap-x-6 gap-y-2 px-4 sm:px-7">
          <Link to={`/lab/${laboratory.slug}/stones`} className="flex items-center gap-2.5 py-3 font-serif text-[19px] font-medium text-ink no-underline">
            <Mark />
            Isogyre
          </Link>
          <nav aria-label="Places" className="order-last -mx-1 flex w-full gap-1 overflow-x-auto lg:order-none lg:w-auto">
            {nav.map(({ label, to }) => (
              <NavLink
                key={to}
                to={to}
                className={({ isActive }) => `border-b-2 px-2.5 py-3 font-medium whitespace-nowrap no-underline ${isActive ? "border-tint font-semibold text-ink" : "border-transparent text-ink-2 hover:text-ink"}`}
              >
                {label}
              </NavLink>
            ))}
          </nav>
          <Form role="search" action={`/lab/${laboratory.slug}/stones`} className="ml-auto flex w-full items-center sm:w-64">
            <label htmlFor="find" className="sr-only">
              Find a stone, client or code
            </label>
            <input id="find" type="search" name="q" defaultValue={search} placeholder="Find a stone or client" maxLength={100} className="min-h-8 w-full rounded-md border border-rule-2 bg-paper px-3 py-1 placeholder:text-ink-3" />
            <span className="-ml-8 hidden lg:block">
              <Key>/</Key>
            </span>
          </Form>
          <details className="relative">
            <summary className="grid size-9 list-none place-items-center rounded-full bg-tint text-[12px] font-semibold text-on-tint" aria-label={`${person.name}: account and room`}>
              {initials(person.name)}
            </summary>
            <div className="absolute right-0 mt-2 grid w-72 gap-3 rounded-[10px] border border-rule-2 bg-sheet p-4 shadow-lg">
              <div>
                <p className="font-semibold">{person.name}</p>
                <p className="text-[13px] break-words text-ink-3">{person.email}</p>
                <p className="mt-1 text-[13px] text-ink-2">
                  {laboratory.name}: {roles.map((role) => roleNames[role]).join(", ")}
                </p>
              </div>
              <RoomSwitch room={room} />
              <ul className="grid gap-1.5">
                <li>
                  <Link to="/account" className="text-tint">
                    Your account
                  </Link>
                </li>
                <li>
                  <Link to="/laboratories" className="text-tint">
                    Another laboratory
                  </Link>
                </li>
              </ul>
              <form method="post" action="/sign-out">
                <button className="cursor-pointer text-tint underline">Sign out</button>
              </form>
            </div>
          </details>
        </div>
      </header>
      {notice}
      <main id="main" className="mx-auto max-w-[90rem] px-4 pb-12 sm:px-7">
        {children}
      </main>
    </div>
  );
}

function initials(name: string): string {
  const words = name.split(/\s+/).filter(Boolean);
  return `${words[0]?.[0] ?? "?"}${words.length > 1 ? (words.at(-1)?.[0] ?? "") : ""}`.toUpperCase();
}
