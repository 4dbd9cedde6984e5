import { Chip } from "#app/components/ui/chip.tsx";
import { formatWithUncertainty } from "#app/domain/format-uncertainty.ts";
import type { RotationFit, RotationSolution } from "#app/gemmology/rotation/rotation-fit.ts";

const symbols: Readonly<Record<string, string>> = { n: "n", omega: "nω", epsilon: "nε", alpha: "nα", beta: "nβ", gamma: "nγ" };

/** What a run amounts to: its crystals, what would decide between them, and which readings do not fit. */
export function RotationFindings({ fit: { solutions, decided, decideBy, outliers, closure } }: { fit: RotationFit }) {
  return (
    <div className="grid gap-2 text-sm" aria-live="polite">
      <ul className="grid gap-1.5">
        {solutions.map((solution, at) => (
          <li key={at} className="flex flex-wrap items-baseline gap-x-3 gap-y-0.5">
            <strong className="font-semibold">{characterWords(solution)}</strong>
            <span className="font-mono">{indicesText(solution)}</span>
            {solution.birefringence ? <span className="font-mono text-ink-2">δ {formatWithUncertainty(solution.birefringence.value, solution.birefringence.u, { mostDecimals: 4 })}</span> : null}
            {solution.twoVDeg ? <span className="font-mono text-ink-2">2V {Math.round(solution.twoVDeg.value)}° ± {Math.round(solution.twoVDeg.u)}°</span> : null}
            {!decided && at === 0 ? <Chip tone="blue">not decided</Chip> : null}
          </li>
        ))}
      </ul>
      <p className="text-ink-2">{decideBy}</p>
      {[...outliers, ...closure].map(({ facet, angleDeg, edge, message }) => (
        <p key={`${facet}-${angleDeg}-${edge}-${message}`} className="text-straw">
          {message}
        </p>
      ))}
    </div>
  );
}

function characterWords({ character, sign }: RotationSolution): string {
  const words = { isotropic: "Singly refractive", uniaxial: "Uniaxial", biaxial: "Biaxial", undetermined: "One edge alone" }[character];
  return sign ? `${words} ${sign === "+" ? "positive" : "negative"}` : words;
}

function indicesText({ indices, u }: RotationSolution): string {
  return Object.entries(indices).map(([name, value]) => `${symbols[name] ?? name} ${formatWithUncertainty(value, u[name] ?? null, { mostDecimals: 4 })}`).join("  ");
}
