import { Link } from "react-router";
import { Disclosure } from "#app/components/ui/disclosure.tsx";
import { Icon } from "#app/components/ui/icon.tsx";
import { RoomSwitch } from "./room-switch.tsx";
import { ShortcutSwitch } from "./shortcut-switch.tsx";

type PersonMenuProps = {
  person: { name: string; email: string };
  /** "Marram Quay Gem Testing: Owner, Gemmologist". */
  standing: string;
  room: "light" | "dim" | "system";
};

/** Who is here, in what standing, in which room; the way to the account and out. */
export function PersonMenu({ person, standing, room }: PersonMenuProps) {
  const linkLook = "flex min-h-8 items-center gap-2.5 font-medium text-tint no-underline hover:underline pointer-coarse:min-h-11";
  return (
    <Disclosure
      isMenu
      className="relative"
      label={`${person.name}: account and room`}
      summary={initials(person.name)}
      summaryClassName="grid size-9 place-items-center rounded-full border border-transparent bg-tint text-xs font-semibold text-on-tint select-none pointer-coarse:size-11"
    >
      <div className="absolute right-0 z-20 mt-2 grid w-76 max-w-[calc(100vw-2rem)] gap-3 rounded-lg border border-rule-2 bg-sheet p-4 shadow-menu">
        <div>
          <p className="font-serif text-lg">{person.name}</p>
          <p className="text-sm break-words text-ink-3">{person.email}</p>
          <p className="mt-1 text-sm text-ink-2">{standing}</p>
        </div>
        <div className="grid justify-items-start gap-2 border-t border-rule pt-3">
          <RoomSwitch room={room} />
          <ShortcutSwitch />
        </div>
        <ul className="border-t border-rule pt-2">
          <li>
            <Link to="/account" className={linkLook}>
              <Icon name="person" /> Your account
            </Link>
          </li>
          <li>
            <Link to="/laboratories" className={linkLook}>
              <Icon name="scales" /> Another laboratory
            </Link>
          </li>
          <li>
            <form method="post" action="/sign-out">
              <button className={`${linkLook} cursor-pointer`}>
                <Icon name="leave" /> Sign out
              </button>
            </form>
          </li>
        </ul>
      </div>
    </Disclosure>
  );
}

function initials(name: string): string {
  const words = name.split(/\s+/).filter(Boolean);
  return `${words[0]?.[0] ?? "?"}${words.length > 1 ? (words.at(-1)?.[0] ?? "") : ""}`.toUpperCase();
}
