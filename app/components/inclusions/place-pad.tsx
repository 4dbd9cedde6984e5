import { useRef, type KeyboardEvent, type PointerEvent, type ReactNode } from "react";
import { useIsHydrated } from "#app/components/layout/use-is-hydrated.ts";
import type { Place } from "#app/domain/inclusion.ts";

export type Pin = Readonly<{ number: number; at: Place; name: string; isStruck: boolean }>;
type PlacePadProps = {
  label: string;
  pins: readonly Pin[];
  /** Where the next one is being placed; null while it is not. */
  draft: Place | null;
  /** Null where nothing can be recorded: then it is a picture alone. */
  onPlace: ((at: Place | null) => void) | null;
  /** Enter was pressed: the place stands, and the form goes on. */
  onConfirm: () => void;
  wordsOf: (at: Place) => string;
  describedBy: string;
  /** The picture or the drawing that is placed on. */
  children: ReactNode;
};

const step = { fine: 0.01, coarse: 0.05 } as const;
const percent = (share: number) => `${(share * 100).toFixed(2)}%`;
const within = (share: number) => Math.min(1, Math.max(0, Math.round(share * 1000) / 1000));

/** A picture with numbered pins, to place the next one on: by a tap, or by arrow keys. The list beneath says the same in words. */
export function PlacePad({ label, pins, draft, onPlace, onConfirm, wordsOf, describedBy, children }: PlacePadProps) {
  const isLive = useIsHydrated() && onPlace !== null;
  const overlay = useRef<SVGSVGElement>(null);

  const onPointerUp = (event: PointerEvent<SVGSVGElement>) => {
    if (event.button !== 0 || !overlay.current) return;
    const box = overlay.current.getBoundingClientRect();
    onPlace?.({ x: within((event.clientX - box.left) / box.width), y: within((event.clientY - box.top) / box.height) });
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const by = event.shiftKey ? step.coarse : step.fine;
    const move = { ArrowLeft: [-by, 0], ArrowRight: [by, 0], ArrowUp: [0, -by], ArrowDown: [0, by] }[event.key];
    const from = draft ?? { x: 0.5, y: 0.5 };
    if (move) onPlace?.(draft ? { x: within(from.x + move[0]!), y: within(from.y + move[1]!) } : from);
    else if (event.key === "Enter") {
      if (!draft) onPlace?.(from);
      onConfirm();
    } else if (event.key === "Escape" && draft) onPlace?.(null);
    else return;
    event.preventDefault();
  };

  const standing = `${label}${pins.length > 0 ? `, ${pins.length} placed` : ""}`;
  return (
    <div className="relative">
      {children}
      <svg
        ref={overlay}
        width="100%"
        height="100%"
        className={`absolute inset-0 overflow-visible outline-none ${isLive ? "cursor-crosshair touch-manipulation focus-visible:outline-2 focus-visible:outline-offset-4 focus-visible:outline-tint" : ""}`}
        aria-label={draft ? `${standing}. Next: ${wordsOf(draft)}` : standing}
        {...(isLive ? { role: "application", "aria-roledescription": "picture to place on", tabIndex: 0, "aria-describedby": describedBy, onPointerUp, onKeyDown } : { role: "img" })}
      >
        {pins.map(({ number, at, isStruck }) => (
          <svg key={number} x={percent(at.x)} y={percent(at.y)} width="1" height="1" overflow="visible" className={isStruck ? "opacity-60" : ""}>
            <circle r="10" className={isStruck ? "fill-sheet stroke-red" : "fill-tint stroke-sheet"} strokeWidth="1.5" />
            <text y="4" textAnchor="middle" className={`font-mono text-[11px] font-semibold ${isStruck ? "fill-red line-through" : "fill-on-tint"}`}>
              {number}
            </text>
          </svg>
        ))}
        {draft ? (
          <svg x={percent(draft.x)} y={percent(draft.y)} width="1" height="1" overflow="visible" className="pointer-events-none">
            <circle r="13" fill="none" className="stroke-sheet" strokeWidth="5" strokeOpacity="0.8" />
            <circle r="13" fill="none" className="stroke-tint" strokeWidth="2.5" />
            <path d="M-20 0h13M7 0h13M0-20v13M0 7v13" className="stroke-tint" strokeWidth="2" />
          </svg>
        ) : null}
      </svg>
      <p aria-live="polite" className="sr-only">
        {draft ? wordsOf(draft) : ""}
      </p>
    </div>
  );
}
