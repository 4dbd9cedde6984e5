import { useNavigate } from "react-router";
import { useShortcut } from "#app/components/layout/use-shortcut.ts";
import { typeAtOnce } from "./use-first-field.ts";

/** c goes on to the conclusion, x strikes the latest reading that may be struck; where there is neither, the keys do nothing. */
export function BenchKeys({ concludeTo, strikeTo }: { concludeTo: string | null; strikeTo: string | null }) {
  const navigate = useNavigate();
  const go = (to: string | null) => {
    if (to) void navigate(to, { state: typeAtOnce });
  };
  useShortcut("c", () => go(concludeTo));
  useShortcut("x", () => go(strikeTo));
  return null;
}
