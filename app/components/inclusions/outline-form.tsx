import { Form } from "react-router";
import { Button } from "#app/components/ui/button.tsx";
import { SelectField } from "#app/components/ui/select-field.tsx";
import { cutOutlineNames, type CutOutlineCode } from "#app/domain/cut-outline/cut-outline.ts";

/** Which drawing the inclusions are plotted on. */
export function OutlineForm({ outline }: { outline: CutOutlineCode }) {
  return (
    <Form method="post" preventScrollReset className="flex flex-wrap items-end gap-2">
      <input type="hidden" name="intent" value="outline" />
      <SelectField key={outline} id="outline" name="outline" label="Drawn as" defaultValue={outline} options={Object.entries(cutOutlineNames).map(([value, label]) => ({ value, label }))} />
      <Button look="quiet">Draw it</Button>
    </Form>
  );
}
