import type { ComponentProps } from "react";
import { Link } from "react-router";
import { Icon, type IconName } from "./icon.tsx";
import { Key } from "./key.tsx";

export type ButtonLook = "primary" | "quiet" | "danger" | "quietDanger" | "plain";
export type ButtonSize = "small" | "normal" | "bench";

const base =
  "no-print inline-flex items-center justify-center gap-2 rounded-md border text-center font-semibold no-underline select-none cursor-pointer transition-colors " +
  "disabled:cursor-not-allowed disabled:opacity-60 aria-disabled:cursor-not-allowed aria-disabled:opacity-60";
const looks: Readonly<Record<ButtonLook, string>> = {
  primary: "border-transparent bg-tint text-on-tint hover:bg-tint-2",
  quiet: "border-rule-2 bg-sheet text-tint hover:border-edge hover:bg-tint-bg",
  danger: "border-transparent bg-red text-on-red hover:bg-red-2",
  quietDanger: "border-red bg-sheet text-red hover:bg-red-bg",
  plain: "border-transparent text-tint underline hover:decoration-2",
};
const sizes: Readonly<Record<ButtonSize, string>> = {
  small: "min-h-7 px-2.5 py-0.5 text-sm pointer-coarse:min-h-11",
  normal: "min-h-9 px-4 py-1.5 pointer-coarse:min-h-11",
  bench: "min-h-11 px-4 py-2",
};
/** The classes of a button, for the few elements that must look like one: a summary, a plain anchor. */
export function buttonLook({ look = "primary", size = "normal" }: { look?: ButtonLook; size?: ButtonSize } = {}): string {
  return `${base} ${looks[look]} ${look === "plain" ? "min-h-7 px-1" : sizes[size]}`;
}

type ButtonProps = ComponentProps<"button"> & {
  look?: ButtonLook;
  /** "bench" gives 44 px, for gloves and darkness. */
  size?: ButtonSize;
  icon?: IconName;
  /** The key that does the same, shown beside the words. */
  hotkey?: string;
  /** Shown while the form is on its way; a second press is then ignored. */
  busyLabel?: string | null | false;
};

export function Button({ look, size, icon, hotkey, busyLabel, children, className = "", onClick, ...props }: ButtonProps) {
  return (
    <button
      type="submit"
      {...props}
      {...(busyLabel ? { "aria-disabled": true, "aria-busy": true } : {})}
      onClick={busyLabel ? (event) => event.preventDefault() : onClick}
      className={`${buttonLook({ look, size })} ${className}`}
    >
      {icon ? <Icon name={icon} /> : null}
      {busyLabel || children}
      {hotkey ? <Key>{hotkey}</Key> : null}
    </button>
  );
}

type LinkButtonProps = ComponentProps<typeof Link> & { look?: ButtonLook; size?: ButtonSize; icon?: IconName; hotkey?: string };

/** A link that looks like a button: it goes somewhere and changes nothing. */
export function LinkButton({ look = "quiet", size, icon, hotkey, children, className = "", ...props }: LinkButtonProps) {
  return (
    <Link {...props} className={`${buttonLook({ look, size })} ${className}`}>
      {icon ? <Icon name={icon} /> : null}
      {children}
      {hotkey ? <Key>{hotkey}</Key> : null}
    </Link>
  );
}
