import type { SubmissionResult } from "@conform-to/react";
import { useState } from "react";
import { Link } from "react-router";
import { Card, CardBody } from "#app/components/ui/card.tsx";
import { inclusionName, plotSideNames, plotSides, type Place, type PlotSide } from "#app/domain/inclusion.ts";
import { parseDecimal } from "#app/domain/decimal.ts";
import { clockWords, pictureWords } from "#app/domain/place-words.ts";
import type { CutOutlineCode } from "#app/domain/cut-outline/cut-outline.ts";
import type { PlotPhoto } from "#app/features/inclusions/get-inclusions.server.ts";
import { CutDrawing } from "./cut-drawing.tsx";
import { InclusionForm, type PlaceFields } from "./inclusion-form.tsx";
import type { ListedInclusion } from "./inclusion-list.tsx";
import { OutlineForm } from "./outline-form.tsx";
import { PlacePad } from "./place-pad.tsx";
import { ScaleBarMark } from "./scale-bar-mark.tsx";

type PlottingCardProps = {
  labPath: string;
  outline: CutOutlineCode;
  side: PlotSide;
  photos: readonly PlotPhoto[];
  photo: PlotPhoto | null;
  inclusions: readonly ListedInclusion[];
  canRecord: boolean;
  requestId: string;
  lastResult: SubmissionResult<string[]> | undefined;
};

const empty: PlaceFields = { plotX: "", plotY: "", photo: "", photoX: "", photoY: "" };
const helpId = "placing-help";
const inPercent = (share: number) => String(Math.round(share * 1000) / 10);
const placeOf = (x: string, y: string): Place | null => {
  const [left, top] = [parseDecimal(x), parseDecimal(y)];
  return left !== undefined && top !== undefined && left >= 0 && left <= 100 && top >= 0 && top <= 100 ? { x: left / 100, y: top / 100 } : null;
};

/** The outline and a photograph side by side, to place what was seen on either or both, and the form that keeps it. */
export function PlottingCard({ labPath, outline, side, photos, photo, inclusions, canRecord, requestId, lastResult }: PlottingCardProps) {
  const typed = lastResult?.initialValue as Partial<PlaceFields> | undefined;
  const [places, setPlaces] = useState<PlaceFields>({ ...empty, ...pickPlaces(typed) });
  const photoNumber = (ref: string) => photos.findIndex((one) => one.ref === ref) + 1;
  const toForm = () => document.getElementById("inclusion-type")?.focus();
  const pinsOn = (at: (inclusion: ListedInclusion) => Place | null) =>
    inclusions.flatMap((inclusion) => {
      const place = at(inclusion);
      return place ? [{ number: inclusion.sequence, at: place, name: inclusionName(inclusion), isStruck: inclusion.strike !== null }] : [];
    });
  const query = (changed: { side?: PlotSide; photo?: string }) => `?side=${changed.side ?? side}${(changed.photo ?? photo?.ref) ? `&photo=${changed.photo ?? photo?.ref}` : ""}`;
  return (
    <Card title="Plot" note="numbered as in the list">
      <CardBody className="grid gap-x-8 gap-y-6 lg:grid-cols-[minmax(0,1fr)_20rem]">
        <div className="grid content-start gap-5">
          <div className="grid gap-x-6 gap-y-5 sm:grid-cols-2">
            <section aria-label="Outline" className="grid content-start gap-3">
              <nav aria-label="Side" className="flex flex-wrap gap-1.5">
                {plotSides.map((one) => (
                  <Link key={one} to={query({ side: one })} preventScrollReset aria-current={one === side ? "true" : undefined} className={tabLook(one === side)}>
                    {plotSideNames[one]}
                  </Link>
                ))}
              </nav>
              <div className="mx-auto w-full max-w-72 px-4 py-3">
                <PlacePad
                  label={`Outline, ${plotSideNames[side].toLowerCase()}`}
                  pins={pinsOn(({ onPlot }) => (onPlot?.side === side ? onPlot.at : null))}
                  draft={placeOf(places.plotX, places.plotY)}
                  onPlace={canRecord ? (at) => setPlaces((now) => ({ ...now, plotX: at ? inPercent(at.x) : "", plotY: at ? inPercent(at.y) : "" })) : null}
                  onConfirm={toForm}
                  wordsOf={clockWords}
                  describedBy={helpId}
                >
                  <CutDrawing outline={outline} side={side} />
                </PlacePad>
              </div>
              {canRecord ? <OutlineForm outline={outline} /> : null}
            </section>
            <section aria-label="Photographs" className="grid content-start gap-3">
              {photos.length > 1 ? (
                <nav aria-label="Photograph" className="flex flex-wrap gap-1.5">
                  {photos.map(({ ref }, at) => (
                    <Link key={ref} to={query({ photo: ref })} preventScrollReset aria-current={ref === photo?.ref ? "true" : undefined} className={tabLook(ref === photo?.ref)}>
                      {at + 1}
                    </Link>
                  ))}
                </nav>
              ) : null}
              {photo ? (
                <>
                  <PlacePad
                    label={`Photograph ${photoNumber(photo.ref)}`}
                    pins={pinsOn(({ onPhoto }) => (onPhoto?.photoRef === photo.ref ? onPhoto.at : null))}
                    draft={places.photo === photo.ref ? placeOf(places.photoX, places.photoY) : null}
                    onPlace={canRecord ? (at) => setPlaces((now) => ({ ...now, photo: at ? photo.ref : "", photoX: at ? inPercent(at.x) : "", photoY: at ? inPercent(at.y) : "" })) : null}
                    onConfirm={toForm}
                    wordsOf={pictureWords}
                    describedBy={helpId}
                  >
                    <img src={`${labPath}/photos/${photo.ref}`} alt="" width={photo.widthPx} height={photo.heightPx} className="block h-auto w-full rounded-md" />
                    {photo.pictureWidthMm ? <ScaleBarMark pictureWidthMm={photo.pictureWidthMm} /> : null}
                  </PlacePad>
                  <p className="text-sm text-ink-2">
                    {photo.magnificationX ? <span className="font-mono">{photo.magnificationX}×</span> : "No magnification noted"}
                    {photo.pictureWidthMm ? (
                      <>
                        , <span className="font-mono">{photo.pictureWidthMm} mm</span> across
                      </>
                    ) : null}
                  </p>
                </>
              ) : (
                <p className="text-sm text-ink-2">No photograph of this stone yet.</p>
              )}
            </section>
          </div>
          {canRecord ? (
            <p id={helpId} className="text-xs text-ink-3">
              Tap where it lies, on the outline, on the photograph, or on both. By keys: arrows move by 1 %, with Shift by 5 %; Enter goes on to the form, Escape takes it back.
            </p>
          ) : null}
        </div>
        {canRecord ? (
          <InclusionForm requestId={requestId} side={side} photos={photos.map(({ ref }, at) => ({ ref, label: `Photograph ${at + 1}` }))} places={places} onPlaces={setPlaces} lastResult={lastResult} />
        ) : null}
      </CardBody>
    </Card>
  );
}

function pickPlaces(typed: Partial<PlaceFields> | undefined): Partial<PlaceFields> {
  return Object.fromEntries(Object.keys(empty).flatMap((name) => (typeof typed?.[name as keyof PlaceFields] === "string" ? [[name, typed[name as keyof PlaceFields]]] : [])));
}

const tabLook = (isCurrent: boolean) =>
  `flex min-h-8 min-w-8 items-center justify-center rounded-md border px-2.5 text-sm font-medium no-underline pointer-coarse:min-h-11 pointer-coarse:min-w-11 ${isCurrent ? "border-ink bg-ink text-on-ink" : "border-rule-2 bg-paper text-ink-2 hover:border-edge hover:text-ink"}`;
