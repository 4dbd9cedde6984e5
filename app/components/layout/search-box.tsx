import { useRef } from "react";
import { Form } from "react-router";
import { Icon } from "#app/components/ui/icon.tsx";
import { Key } from "#app/components/ui/key.tsx";
import { useShortcut } from "./use-shortcut.ts";

/** Finds within the laboratory; the `/` key goes to it. */
export function SearchBox({ action, value }: { action: string; value: string }) {
  const input = useRef<HTMLInputElement>(null);
  useShortcut("/", () => input.current?.select());
  return (
    <Form role="search" action={action} className="relative w-full">
      <label htmlFor="find" className="sr-only">
        Find a stone, client or code
      </label>
      <span className="pointer-events-none absolute inset-y-0 left-3 flex items-center text-ink-3">
        <Icon name="search" sizePx={14} />
      </span>
      {/* Keyed, so that the box follows the address when it changes. */}
      <input key={value} ref={input} id="find" type="search" name="q" defaultValue={value} placeholder="Find a stone or client" maxLength={100} aria-keyshortcuts="/" className="control w-full bg-paper py-1 pr-9 pl-8.5" />
      <span className="pointer-events-none absolute inset-y-0 right-2.5 flex items-center text-ink-2">
        <Key>/</Key>
      </span>
    </Form>
  );
}
