export type Room = "light" | "dim" | "system";

/** The look that this browser chose; "system" follows the device until somebody chooses. */
export function roomOf(request: Request): Room {
  const match = /(?:^|;\s*)room=(light|dim)(?:;|$)/.exec(request.headers.get("cookie") ?? "");
  return (match?.[1] as Room | undefined) ?? "system";
}

/** A taste, not a secret: readable by script so that the switch can act at once. */
export function roomCookieHeader(room: Room): string {
  return room === "system" ? "room=; Path=/; Max-Age=0; SameSite=Lax" : `room=${room}; Path=/; Max-Age=31536000; SameSite=Lax`;
}
