import type { SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";
import { SegmentedChoice } from "./segmented-choice.tsx";

/** Which end lies left and what spreads the light, kept for this browser by whoever holds the view. */
export function SpectrumViewChoice({ view, onView }: { view: SpectrumView; onView: (view: SpectrumView) => void }) {
  return (
    <div className="flex flex-wrap gap-x-4 gap-y-1.5">
      <SegmentedChoice label="Scale" value={view.spread} options={{ grating: "Grating", prism: "Prism" }} onChoose={(spread) => onView({ ...view, spread })} />
      <SegmentedChoice label="Left end" value={view.leftEnd} options={{ red: "Red left", violet: "Violet left" }} onChoose={(leftEnd) => onView({ ...view, leftEnd })} />
    </div>
  );
}
