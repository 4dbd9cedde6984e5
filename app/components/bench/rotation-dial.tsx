import type { KeyboardEvent, PointerEvent } from "react";
import { parseDecimal } from "#app/domain/decimal.ts";

const size = 120;
const middle = size / 2;
const stepDeg = 5;
const keys: Partial<Record<string, number>> = { ArrowRight: stepDeg, ArrowUp: stepDeg, ArrowLeft: -stepDeg, ArrowDown: -stepDeg, PageUp: 15, PageDown: -15 };

/** Where the stone stands on its facet: turned by hand, by arrows, or by typing the angle in the table. */
export function RotationDial({ angle, onTurn }: { angle: string; onTurn: (angle: string) => void }) {
  const angleDeg = parseDecimal(angle.replace("°", "")) ?? 0;
  const turnTo = (degrees: number) => onTurn(String(Math.max(0, Math.min(360, Math.round(degrees / stepDeg) * stepDeg))));
  const onKeyDown = (event: KeyboardEvent) => {
    const by = keys[event.key];
    if (by === undefined) return;
    event.preventDefault();
    turnTo(angleDeg + by);
  };
  const onPointer = (event: PointerEvent<SVGSVGElement>) => {
    if (event.type === "pointermove" && event.buttons === 0) return;
    const box = event.currentTarget.getBoundingClientRect();
    const turn = (Math.atan2(event.clientX - box.left - box.width / 2, box.top + box.height / 2 - event.clientY) * 180) / Math.PI;
    event.currentTarget.setPointerCapture(event.pointerId);
    turnTo((turn + 360) % 360);
  };
  const radians = (angleDeg * Math.PI) / 180;
  const [x, y] = [middle + 42 * Math.sin(radians), middle - 42 * Math.cos(radians)];
  return (
    <div className="grid justify-items-center gap-1">
      <svg
        width={size}
        height={size}
        viewBox={`0 0 ${size} ${size}`}
        role="slider"
        tabIndex={0}
        aria-label="Rotation of the stone"
        aria-valuemin={0}
        aria-valuemax={360}
        aria-valuenow={angleDeg}
        aria-valuetext={`${angleDeg}°`}
        onKeyDown={onKeyDown}
        onPointerDown={onPointer}
        onPointerMove={onPointer}
        className="touch-none"
      >
        <circle cx={middle} cy={middle} r={52} className="fill-paper stroke-rule-2" />
        {Array.from({ length: 24 }, (_, at) => (
          <line key={at} x1={middle} y1={at % 6 === 0 ? 10 : 12} x2={middle} y2={16} transform={`rotate(${at * 15} ${middle} ${middle})`} className="stroke-ink-3" />
        ))}
        <line x1={middle} y1={middle} x2={x} y2={y} className="stroke-tint" strokeWidth="2.5" strokeLinecap="round" />
        <circle cx={x} cy={y} r={6} className="fill-tint" />
      </svg>
      <span className="font-mono text-sm" aria-hidden="true">
        {angleDeg}°
      </span>
    </div>
  );
}
