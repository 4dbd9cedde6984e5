import { NavLink } from "react-router";

const pages = [
  { path: "", label: "Letterhead and rules" },
  { path: "/team", label: "Team" },
  { path: "/prices", label: "Fees" },
];

/** The three pages of a laboratory's settings. */
export function SettingsNav({ labSlug }: { labSlug: string }) {
  return (
    <nav aria-label="Settings" className="mb-5 flex flex-wrap gap-x-1 border-b border-rule">
      {pages.map(({ path, label }) => (
        <NavLink
          key={path}
          to={`/lab/${labSlug}/settings${path}`}
          end
          className={({ isActive }) => `-mb-px inline-flex min-h-9 items-center border-b-2 px-3 font-medium no-underline ${isActive ? "border-tint font-semibold text-ink" : "border-transparent text-ink-2 hover:text-ink"}`}
        >
          {label}
        </NavLink>
      ))}
    </nav>
  );
}
