import { Link, useNavigate } from "react-router";
import { useEscapeLeavesField } from "#app/components/layout/use-escape-leaves-field.ts";
import { useShortcut } from "#app/components/layout/use-shortcut.ts";
import { Key } from "#app/components/ui/key.tsx";
import { observationKindNames, observationKinds, type ObservationKind } from "#app/domain/reading.ts";

type TestChoiceProps = { current: ObservationKind; hrefOf: (kind: ObservationKind) => string };

/** Which test was made: a link each, and a number key each. */
export function TestChoice({ current, hrefOf }: TestChoiceProps) {
  useEscapeLeavesField();
  return (
    <nav aria-label="Test" className="no-print border-b border-rule px-4.5 pb-3.5">
      <ul className="flex flex-wrap gap-1.5">
        {observationKinds.map((kind, at) => (
          <li key={kind}>
            <TestLink kind={kind} hotkey={String(at + 1)} isCurrent={kind === current} to={hrefOf(kind)} />
          </li>
        ))}
      </ul>
    </nav>
  );
}

function TestLink({ kind, hotkey, isCurrent, to }: { kind: ObservationKind; hotkey: string; isCurrent: boolean; to: string }) {
  const navigate = useNavigate();
  useShortcut(hotkey, () => void navigate(to, { preventScrollReset: true }));
  const look = isCurrent ? "border-ink bg-ink text-on-ink" : "border-rule-2 bg-paper text-ink-2 hover:border-edge hover:text-ink";
  return (
    <Link
      to={to}
      preventScrollReset
      aria-current={isCurrent ? "true" : undefined}
      aria-keyshortcuts={hotkey}
      className={`flex min-h-8 items-center gap-2 rounded-md border px-2.5 text-sm font-medium no-underline pointer-coarse:min-h-11 ${look}`}
    >
      {observationKindNames[kind]}
      <Key>{hotkey}</Key>
    </Link>
  );
}
