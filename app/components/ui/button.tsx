import { Link } from "react-router";
import { Key } from "./key.tsx";

export type ButtonLook = "primary" | "quiet" | "danger" | "plain";

const base = "inline-flex min-h-9 items-center justify-center gap-2 rounded-md px-3.5 py-1.5 font-semibold no-underline select-none cursor-pointer disabled:cursor-not-allowed disabled:opacity-60 aria-disabled:opacity-60";
const looks: Record<ButtonLook, string> = {
  primary: "bg-tint text-on-tint hover:opacity-90",
  quiet: "border border-rule-2 bg-sheet text-tint hover:bg-tint-bg",
  danger: "border border-red bg-sheet text-red hover:bg-red-bg",
  plain: "px-1 text-tint underline hover:no-underline",
};

type ButtonProps = React.ComponentProps<"button"> & { look?: ButtonLook; /** The key that does the same, shown beside the words. */ hotkey?: string };

export function Button({ look = "primary", hotkey, children, className = "", ...props }: ButtonProps) {
  return (
    <button type="submit" {...props} className={`${base} ${looks[look]} ${className}`}>
      {children}
      {hotkey ? <Key isInverse={look === "primary"}>{hotkey}</Key> : null}
    </button>
  );
}

type LinkButtonProps = React.ComponentProps<typeof Link> & { look?: ButtonLook };

/** A link that looks like a button: it goes somewhere and changes nothing. */
export function LinkButton({ look = "quiet", className = "", ...props }: LinkButtonProps) {
  return <Link {...props} className={`${base} ${looks[look]} ${className}`} />;
}
