import type { Story } from "./story.ts";

/** Where the drawn picture of a story lies. */
export function photoFile({ outline, hue, lengthMm }: NonNullable<Story["photo"]>): string {
  return `fixtures/demo-photos/${hue.replaceAll(" ", "-")}-${outline}-${lengthMm}.jpg`;
}
