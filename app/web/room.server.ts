export type Room = "light" | "dim" | "system";

/** The look that this browser chose; "system" follows the device until somebody chooses. */
export function roomOf(request: Request): Room {
  const match = /(?:^|;\s*)room=(light|dim)(?:;|$)/.exec(request.headers.get("cookie") ?? "");
  return (match?.[1] as Room | undefined) ?? "system";
}
