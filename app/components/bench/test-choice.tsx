import { useEffect } from "react";
import { Link, useNavigate } from "react-router";
import { useEscapeLeavesField } from "#app/components/layout/use-escape-leaves-field.ts";
import { useShortcut } from "#app/components/layout/use-shortcut.ts";
import { Key } from "#app/components/ui/key.tsx";
import { aboutTest, testGroups, type ObservationKind } from "#app/domain/reading.ts";
import { KeysHelp } from "./keys-help.tsx";
import { typeAtOnce } from "./use-first-field.ts";

type TestChoiceProps = { current: ObservationKind; hrefOf: (kind: ObservationKind) => string };

/** Which test was made, in the order of an examination: a link each, and a key each. */
export function TestChoice({ current, hrefOf }: TestChoiceProps) {
  useEscapeLeavesField();
  useEscapeToTests();
  return (
    <nav aria-label="Test" className="no-print border-b border-rule px-4.5 pb-3.5">
      <TestGroups groups={testGroups.filter(({ isSeldom }) => !isSeldom)} {...{ current, hrefOf }} />
      <div className="mt-1 flex flex-wrap items-start gap-x-6">
        <details open={seldom.some(({ kinds }) => kinds.includes(current))} className="min-w-0">
          <summary className="inline-flex min-h-6 cursor-pointer items-center text-sm text-tint pointer-coarse:min-h-11">Seldom made: over the limit, and last</summary>
          <div className="mt-1.5">
            <TestGroups groups={seldom} {...{ current, hrefOf }} />
          </div>
        </details>
        <KeysHelp />
      </div>
    </nav>
  );
}

const seldom = testGroups.filter(({ isSeldom }) => isSeldom);

function TestGroups({ groups, current, hrefOf }: TestChoiceProps & { groups: typeof testGroups }) {
  return (
    <ul className="flex flex-wrap items-center gap-x-5 gap-y-1.5">
      {groups.map(({ name, kinds }) => (
        <li key={name} className="flex min-w-0 flex-wrap items-center gap-1">
          <span className="mr-1 text-xs text-ink-3">{name}</span>
          <ul className="flex flex-wrap gap-1">
            {kinds.map((kind) => (
              <li key={kind}>
                <TestLink kind={kind} isCurrent={kind === current} to={hrefOf(kind)} />
              </li>
            ))}
          </ul>
        </li>
      ))}
    </ul>
  );
}

function TestLink({ kind, isCurrent, to }: { kind: ObservationKind; isCurrent: boolean; to: string }) {
  const navigate = useNavigate();
  const { name, hotkey } = aboutTest(kind);
  useShortcut(hotkey, () => void navigate(to, { preventScrollReset: true, state: typeAtOnce }));
  const look = isCurrent ? "border-ink bg-ink text-on-ink" : "border-rule-2 bg-paper text-ink-2 hover:border-edge hover:text-ink";
  return (
    <Link
      to={to}
      preventScrollReset
      aria-current={isCurrent ? "true" : undefined}
      aria-keyshortcuts={hotkey}
      className={`flex min-h-7 items-center gap-1.5 rounded-md border px-2 text-sm font-medium no-underline pointer-coarse:min-h-11 ${look}`}
    >
      {name}
      <Key>{hotkey}</Key>
    </Link>
  );
}

/** Escape from nowhere goes back to the choice of tests. */
function useEscapeToTests(): void {
  useEffect(() => {
    const onKeyDown = ({ key, target, defaultPrevented }: KeyboardEvent) => {
      if (key === "Escape" && target === document.body && !defaultPrevented) document.querySelector<HTMLElement>("nav[aria-label=Test] a[aria-current=true]")?.focus();
    };
    document.addEventListener("keydown", onKeyDown);
    return () => document.removeEventListener("keydown", onKeyDown);
  }, []);
}
