import type { ShouldRevalidateFunctionArgs } from "react-router";

let isKnownDown = false;

/** What the last request showed; a browser's own word is not enough, for a strong room has Wi-Fi and no line. */
export function noteLine(state: "up" | "down"): void {
  isKnownDown = state === "down";
}

/** A request that never got an answer; fetch tells of it by a TypeError alone. */
export function isWithoutLine(error: unknown): boolean {
  return error instanceof TypeError || !navigator.onLine;
}

/**
 * For the layouts around a page: they stay as they are while there is no line, and while one page only changes its search,
 * so that a test is chosen at the bench by one small request, or by none.
 */
export function keepsLayout({ currentUrl, nextUrl, formMethod, defaultShouldRevalidate }: ShouldRevalidateFunctionArgs): boolean {
  if (isKnownDown || !navigator.onLine) return false;
  const isSamePage = currentUrl.pathname === nextUrl.pathname && currentUrl.searchParams.get("q") === nextUrl.searchParams.get("q");
  if (isSamePage && (formMethod === undefined || formMethod === "GET")) return false;
  return defaultShouldRevalidate;
}
