import type { SpectrumLine } from "#app/domain/bench-tests/spectrum-lines.ts";
import { drawnSpectrumNm, type SpectrumView } from "#app/gemmology/spectrum/spectrum-scale.ts";

export const spectrumKeyHelp = "With the spectrum in focus: arrows move by 1 nm, with Shift by 10; Enter sets a line; B begins and ends a band; S, M, W, F say how strong, E that it shines; Delete removes.";

/** What a key pressed on the drawn spectrum means; null where it means nothing there. */
export type SpectrumKeyAct =
  | { act: "move"; toNm: number }
  | { act: "set" }
  | { act: "band" }
  | { act: "strength"; strength: NonNullable<SpectrumLine["strength"]> }
  | { act: "shine" }
  | { act: "remove" }
  | { act: "leave" };

const strengthOfKey: Readonly<Record<string, NonNullable<SpectrumLine["strength"]>>> = { s: "strong", m: "medium", w: "weak", f: "faint" };

export function spectrumKeyAct(key: string, hasShift: boolean, cursorNm: number, view: SpectrumView): SpectrumKeyAct | null {
  const step = hasShift ? 10 : 1;
  const right = view.leftEnd === "red" ? -1 : 1;
  const move = (nm: number): SpectrumKeyAct => ({ act: "move", toNm: Math.min(drawnSpectrumNm.to, Math.max(drawnSpectrumNm.from, Math.round(nm))) });
  switch (key) {
    case "ArrowRight":
      return move(cursorNm + right * step);
    case "ArrowLeft":
      return move(cursorNm - right * step);
    case "ArrowUp":
      return move(cursorNm + step);
    case "ArrowDown":
      return move(cursorNm - step);
    case "PageUp":
      return move(cursorNm + 10);
    case "PageDown":
      return move(cursorNm - 10);
    case "Home":
      return move(view.leftEnd === "red" ? drawnSpectrumNm.to : drawnSpectrumNm.from);
    case "End":
      return move(view.leftEnd === "red" ? drawnSpectrumNm.from : drawnSpectrumNm.to);
    case "Enter":
      return { act: "set" };
    case "Delete":
    case "Backspace":
      return { act: "remove" };
    case "Escape":
      return { act: "leave" };
  }
  const letter = key.toLowerCase();
  if (letter === "b") return { act: "band" };
  if (letter === "e") return { act: "shine" };
  const strength = strengthOfKey[letter];
  return strength ? { act: "strength", strength } : null;
}
