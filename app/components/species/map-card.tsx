import { useEffect, useId, useState, type MouseEvent } from "react";
import { Link, useNavigate } from "react-router";
import { useIsHydrated } from "#app/components/layout/use-is-hydrated.ts";
import { refractometerView, viewAround, wholeView, writeMapView, zoomView, type MapView } from "#app/components/charts/species-map/map-view.ts";
import { SpeciesMap, type MapReading, type Standing } from "#app/components/charts/species-map/species-map.tsx";
import { buttonLook } from "#app/components/ui/button.tsx";
import { Card } from "#app/components/ui/card.tsx";
import { formatInterval } from "#app/domain/format-interval.ts";
import type { SpeciesBox } from "#app/features/species/species-boxes.ts";
import { offsetWords } from "./offset-words.ts";

type MapCardProps = {
  boxes: readonly SpeciesBox[];
  standingOf: (id: string) => Standing;
  reading: MapReading;
  startView: MapView;
  base: string;
  /** What the address holds besides the view, so that zooming without script keeps it. */
  kept: Readonly<Record<string, string>>;
};

/** The map with what moves it; each way to move is a link, so that it works before script and without. */
export function MapCard({ boxes, standingOf, reading, startView, base, kept }: MapCardProps) {
  const [view, setView] = useState(startView);
  const [activeId, setActiveId] = useState<string | null>(null);
  const isLive = useIsHydrated();
  const navigate = useNavigate();
  const helpId = useId();
  const addressOf = (of: MapView) => `?${new URLSearchParams({ ...kept, ...writeMapView(of) })}`;
  const address = addressOf(view);

  // The address follows what is drawn, without asking the server again: nothing on the page depends on it.
  useEffect(() => {
    if (view === startView) return;
    const later = setTimeout(() => window.history.replaceState(window.history.state, "", address), 250);
    return () => clearTimeout(later);
  }, [view, startView, address]);

  const move = (to: MapView) => ({
    to: addressOf(to),
    replace: true,
    preventScrollReset: true,
    className: `${buttonLook({ look: "quiet", size: "small" })}`,
    onClick: (event: MouseEvent) => {
      event.preventDefault();
      setView(to);
    },
  });
  const active = boxes.find(({ id }) => id === activeId);
  const hasReading = reading.index !== null || reading.sg !== null;
  return (
    <Card
      title="Index and density"
      note={`${boxes.length} species with both`}
      aside={
        <div className="no-print flex flex-wrap gap-1.5">
          <Link {...move(zoomView(view, 1 / 1.6))}>Nearer</Link>
          <Link {...move(zoomView(view, 1.6))}>Farther</Link>
          {hasReading ? <Link {...move(viewAround({ index: reading.index?.value ?? null, sg: reading.sg?.value ?? null }))}>Around the reading</Link> : null}
          <Link {...move(refractometerView)}>Refractometer’s range</Link>
          <Link {...move(wholeView)}>Whole</Link>
        </div>
      }
    >
      <div className="px-2 sm:px-3">
        <SpeciesMap {...{ boxes, standingOf, reading, view, isLive, activeId }} onView={setView} onActive={setActiveId} onOpen={(id) => void navigate(`${base}/${id}`)} describedBy={helpId} />
      </div>
      <p aria-live="polite" className="min-h-14 border-t border-rule px-4.5 py-2">
        {active ? (
          <>
            <Link to={`${base}/${active.id}`} className="font-serif text-base text-ink decoration-rule-2 hover:text-tint">
              {active.name}
            </Link>{" "}
            <span className="text-ink-2">
              index <span className="font-mono">{formatInterval(active.index, 3)}</span>, density <span className="font-mono">{formatInterval(active.sg, 2)}</span>
              {standingOf(active.id) === "contradicted" ? ", ruled out by the readings" : standingOf(active.id) === "candidate" ? ", a candidate" : ""}
            </span>
            {hasReading ? <span className="block text-sm text-ink-3">{offsetWords(active, reading).sentence}</span> : null}
          </>
        ) : (
          <span className="text-ink-3">{isLive ? "Point at a box, or go from box to box with the arrow keys." : "The table below says the same in words."}</span>
        )}
      </p>
      <p id={helpId} hidden={!isLive} className="no-print border-t border-rule px-4.5 py-2 text-xs text-ink-2">
        Arrow keys go to the next species, with Shift they move the map. Plus, minus and zero: nearer, farther, whole. Enter opens the species, Escape lets it go. Dragging moves the map; the wheel with Ctrl zooms.
      </p>
    </Card>
  );
}
