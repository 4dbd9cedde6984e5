import { useEffect, useId, useRef, useState, type KeyboardEvent } from "react";
import { inputLook } from "#app/components/ui/field-frame.tsx";
import type { SpeciesSearch } from "#app/features/species/search-species-names.ts";
import { nameKindWords, type FoundSpecies, type SpeciesNames } from "#app/features/species/species-names.ts";

type SpeciesSearchProps = {
  label: string;
  name: string;
  defaultValue?: string;
  /** Which names to fetch: `/species-names/VERSION.json`. */
  namesVersion: string;
  onChoose: (found: FoundSpecies) => void;
  className?: string;
};

const mostShown = 8;
const loading = new Map<string, Promise<SpeciesSearch>>();

/** The names and what searches them, fetched once, when somebody begins to look for one. */
function loadSearch(version: string): Promise<SpeciesSearch> {
  const known = loading.get(version);
  if (known) return known;
  const fresh = Promise.all([import("#app/features/species/search-species-names.ts"), fetch(`/species-names/${version}.json`)]).then(async ([{ createSpeciesSearch }, response]) => {
    if (!response.ok) throw new Error(`species names: ${response.status}`);
    return createSpeciesSearch((await response.json()) as SpeciesNames);
  });
  loading.set(version, fresh);
  fresh.catch(() => loading.delete(version));
  return fresh;
}

/** A search box that offers species by any of their names as one types; without script its form asks the server. */
export function SpeciesSearchBox({ label, name, defaultValue = "", namesVersion, onChoose, className = "" }: SpeciesSearchProps) {
  const id = useId();
  const search = useRef<SpeciesSearch>(null);
  const typed = useRef("");
  const [found, setFound] = useState<readonly FoundSpecies[]>([]);
  const [active, setActive] = useState(-1);
  const isOpen = found.length > 0;
  const optionId = (at: number) => `${id}-option-${at}`;

  const look = (words: string) => {
    typed.current = words;
    setFound(search.current && words.trim().length > 1 ? search.current(words, mostShown) : []);
    setActive(-1);
  };
  const prepare = () => {
    if (search.current) return;
    loadSearch(namesVersion).then(
      (ready) => {
        search.current = ready;
        if (typed.current) look(typed.current);
      },
      // Without the names the box still asks the server when its form is sent.
      () => undefined,
    );
  };
  const close = () => {
    setFound([]);
    setActive(-1);
  };
  const choose = (one: FoundSpecies) => {
    close();
    onChoose(one);
  };
  useEffect(() => {
    if (active >= 0) document.getElementById(`${id}-option-${active}`)?.scrollIntoView({ block: "nearest" });
  }, [active, id]);

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.nativeEvent.isComposing || !isOpen) return;
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step) {
      event.preventDefault();
      // One place more than there are options: the box itself.
      setActive(((active + 1 + step + found.length + 1) % (found.length + 1)) - 1);
    } else if (event.key === "Escape") {
      event.preventDefault();
      close();
    } else if (event.key === "Enter" && found[active]) {
      event.preventDefault();
      choose(found[active]);
    }
  };

  return (
    <div className={`relative ${className}`} onBlur={(event) => (event.currentTarget.contains(event.relatedTarget) ? undefined : close())}>
      <label htmlFor={id} className="mb-1 block text-xs font-semibold text-ink-2">
        {label}
      </label>
      <input
        id={id}
        type="search"
        name={name}
        defaultValue={defaultValue}
        maxLength={60}
        autoComplete="off"
        spellCheck={false}
        className={inputLook}
        role="combobox"
        aria-autocomplete="list"
        aria-expanded={isOpen}
        aria-controls={`${id}-list`}
        aria-activedescendant={active >= 0 ? optionId(active) : undefined}
        onFocus={prepare}
        onChange={(event) => look(event.target.value)}
        onKeyDown={onKeyDown}
      />
      <ul id={`${id}-list`} role="listbox" aria-label="Species that the words find" hidden={!isOpen} className="absolute inset-x-0 top-full z-30 mt-1 max-h-80 min-w-72 overflow-y-auto rounded-md border border-rule-2 bg-sheet py-1 shadow-menu">
        {found.map((one, at) => (
          <li
            key={one.speciesId}
            id={optionId(at)}
            role="option"
            aria-selected={at === active}
            // Pressed, not clicked: the box must not lose the focus first.
            onPointerDown={(event) => {
              event.preventDefault();
              choose(one);
            }}
            onPointerMove={() => setActive(at)}
            className={`flex cursor-pointer flex-wrap items-baseline gap-x-2 px-3 py-1.5 pointer-coarse:py-2.5 ${at === active ? "bg-tint-bg" : ""}`}
          >
            <span className="font-serif">{one.speciesName}</span>
            {one.by.kind === "species" ? null : <FoundBy by={one.by} />}
          </li>
        ))}
      </ul>
      <span role="status" className="sr-only">
        {isOpen ? `${found.length} species found` : ""}
      </span>
    </div>
  );
}

/** Which of its names found a species: a misleading one is said to be one. */
export function FoundBy({ by: { name, kind, note } }: { by: FoundSpecies["by"] }) {
  return (
    <span className={`text-xs ${kind === "misleading" ? "text-straw" : "text-ink-3"}`}>
      {kind === "family" ? `${name} family` : `“${name}”, ${nameKindWords[kind]}`}
      {note ? ` (${note})` : ""}
    </span>
  );
}
