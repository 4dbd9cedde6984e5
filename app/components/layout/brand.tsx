import { Link } from "react-router";
import { Mark } from "./mark.tsx";

export function Brand({ to }: { to: string }) {
  return (
    <Link to={to} className="flex items-center gap-2.5 py-2 font-serif text-[1.1875rem] font-semibold text-ink no-underline">
      <Mark />
      Isogyre
    </Link>
  );
}
