import { Button } from "#app/components/ui/button.tsx";

/** Opens the browser's print window. Without script the browser's own command does it, so the button is not shown. */
export function PrintButton() {
  return (
    <Button type="button" className="[@media(scripting:none)]:hidden" onClick={() => window.print()}>
      Print
    </Button>
  );
}
