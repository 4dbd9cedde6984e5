import spriteUrl from "./icons.svg?no-inline";

export type IconName =
  | "check" | "cross" | "alert" | "info" | "search" | "menu" | "down" | "up" | "left" | "right" | "plus"
  | "print" | "download" | "camera" | "stone" | "scales" | "seal" | "clock" | "lamp" | "person" | "leave";

/** One symbol of the sprite; it grows with the text, `sizePx` at the usual 16 px. Hidden from assistive technology unless it carries a meaning of its own: then give `label`. */
export function Icon({ name, label, sizePx = 16 }: { name: IconName; label?: string; sizePx?: number }) {
  return (
    <svg
      width={`${sizePx / 16}rem`}
      height={`${sizePx / 16}rem`}
      className="inline-block shrink-0"
      fill="none"
      stroke="currentColor"
      strokeWidth={1.6}
      strokeLinecap="round"
      strokeLinejoin="round"
      focusable="false"
      {...(label ? { role: "img", "aria-label": label } : { "aria-hidden": true })}
    >
      <use href={`${spriteUrl}#${name}`} />
    </svg>
  );
}
