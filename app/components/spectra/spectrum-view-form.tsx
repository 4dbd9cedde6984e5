import { Form, useLocation } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { spectrumViewText, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

const options = [
  { value: "red-grating", label: "Red left, grating" },
  { value: "violet-grating", label: "Violet left, grating" },
  { value: "red-prism", label: "Red left, prism" },
  { value: "violet-prism", label: "Violet left, prism" },
];

/** How this browser draws what a hand spectroscope shows: kept by the server in a cookie, as the room is. Works without script. */
export function SpectrumViewForm({ view }: { view: SpectrumView }) {
  const { pathname, search } = useLocation();
  return (
    <Form method="post" action="/spectrum-view" preventScrollReset className="no-print flex flex-wrap items-end gap-2">
      <input type="hidden" name="next" value={`${pathname}${search}`} />
      <SelectField id="spectrum-view" name="spectrum" label="The drawn spectrum of the bench" defaultValue={spectrumViewText(view)} options={options} />
      <Button look="quiet">Keep</Button>
    </Form>
  );
}
