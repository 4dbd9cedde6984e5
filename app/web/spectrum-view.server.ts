import { readSpectrumView, spectrumViewText, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

/** How this browser draws spectra; the usual way until somebody chooses. */
export function spectrumViewOf(request: Request): SpectrumView {
  return readSpectrumView(/(?:^|;\s*)spectrum=([a-z-]{1,20})(?:;|$)/.exec(request.headers.get("cookie") ?? "")?.[1]);
}

/** A taste, as the room is: readable by script, so that the drawing can turn round at once and stay so. */
export function spectrumViewCookieHeader(view: SpectrumView): string {
  return `spectrum=${spectrumViewText(view)}; Path=/; Max-Age=31536000; SameSite=Lax`;
}
