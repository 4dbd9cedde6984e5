import { spectrumViewText, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

/** For script: keeps the way of drawing for this browser, as the form of spectrum-view does without. */
export function keepSpectrumView(view: SpectrumView): void {
  document.cookie = `spectrum=${spectrumViewText(view)}; Path=/; Max-Age=31536000; SameSite=Lax`;
}
