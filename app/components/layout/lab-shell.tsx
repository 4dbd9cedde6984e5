import type { ReactNode } from "react";
import { NavLink, useLocation } from "react-router";
import { roleNames, type Role } from "#app/domain/roles.ts";
import { Disclosure } from "#app/components/ui/disclosure.tsx";
import { Icon } from "#app/components/ui/icon.tsx";
import { Brand } from "./brand.tsx";
import { PersonMenu } from "./person-menu.tsx";
import { SearchBox } from "./search-box.tsx";
import { SkipLink } from "./skip-link.tsx";
import { useHeadingFocus } from "./use-heading-focus.ts";

export type NavItem = { label: string; to: string };

type LabShellProps = {
  laboratory: { slug: string; name: string };
  person: { name: string; email: string };
  roles: readonly Role[];
  nav: readonly NavItem[];
  room: "light" | "dim" | "system";
  search: string;
  notice: ReactNode;
  children: ReactNode;
};

/** The frame of a laboratory's pages: the ramp, the places, the search box, who is here. */
export function LabShell({ laboratory, person, roles, nav, room, search, notice, children }: LabShellProps) {
  const { pathname } = useLocation();
  useHeadingFocus();
  const stonesPath = `/lab/${laboratory.slug}/stones`;
  return (
    <div className="min-h-dvh">
      <SkipLink />
      <div className="ramp no-print h-1" />
      <header className="no-print relative z-20 border-b border-rule bg-sheet">
        <div className="mx-auto flex max-w-[100rem] flex-wrap items-center gap-x-3 px-4 sm:px-7 xl:gap-x-5">
          <Brand to={stonesPath} />
          <nav aria-label="Places" className="hidden flex-wrap lg:flex">
            <Places nav={nav} itemLook="border-b-2 px-1.5 py-3.5 xl:px-2.5" currentLook="border-tint" restLook="border-transparent forced-colors:border-[Canvas]" />
          </nav>
          <div className="order-last w-full pb-2.5 sm:order-none sm:ml-auto sm:w-56 sm:py-2 lg:w-auto lg:min-w-24 lg:max-w-68 lg:grow lg:basis-24">
            <SearchBox action={stonesPath} value={search} />
          </div>
          <div className="ml-auto flex items-center gap-2 py-2 sm:ml-0">
            {/* Keyed, so that the list is closed again on the page it led to. */}
            <Disclosure
              key={pathname}
              isMenu
              className="lg:hidden"
              summaryClassName="flex min-h-9 items-center gap-2 rounded-md border border-rule-2 bg-sheet px-3 font-semibold text-tint select-none pointer-coarse:min-h-11"
              summary={
                <>
                  <Icon name="menu" /> Places
                </>
              }
            >
              <nav aria-label="Places" className="absolute inset-x-0 top-full grid border-b border-rule-2 bg-sheet px-4 py-2 shadow-menu sm:grid-cols-2 sm:px-7">
                <Places nav={nav} itemLook="flex min-h-11 items-center border-l-2 px-3" currentLook="border-tint bg-tint-bg" restLook="border-transparent forced-colors:border-[Canvas]" />
              </nav>
            </Disclosure>
            <PersonMenu person={person} room={room} standing={`${laboratory.name}: ${roles.map((role) => roleNames[role]).join(", ")}`} />
          </div>
        </div>
      </header>
      {notice}
      <main id="main" tabIndex={-1} className="mx-auto max-w-[100rem] px-4 pb-12 sm:px-7 print:max-w-none print:p-0">
        {children}
      </main>
    </div>
  );
}

function Places({ nav, itemLook, currentLook, restLook }: { nav: readonly NavItem[]; itemLook: string; currentLook: string; restLook: string }) {
  return nav.map(({ label, to }) => (
    <NavLink
      key={to}
      to={to}
      className={({ isActive }) => `font-medium whitespace-nowrap no-underline transition-colors ${itemLook} ${isActive ? `font-semibold text-ink ${currentLook}` : `text-ink-2 hover:text-tint ${restLook}`}`}
    >
      {label}
    </NavLink>
  ));
}
