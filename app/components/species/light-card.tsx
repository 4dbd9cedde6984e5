import { Card } from "#app/components/ui/card.tsx";
import { Cell, HeaderCell, Table } from "#app/components/ui/table.tsx";
import type { LightLine } from "#app/features/species/light-inside.ts";

/** What the usual indices mean for light: how it is kept inside, thrown back and slowed. */
export function LightCard({ light }: { light: readonly LightLine[] }) {
  if (light.length === 0) return null;
  return (
    <Card title="Light inside" note="computed from the usual indices, in air">
      <Table caption="Light inside, by index" className="text-sm">
        <thead>
          <tr>
            <HeaderCell isNumber>Index</HeaderCell>
            <HeaderCell isNumber>Critical angle</HeaderCell>
            <HeaderCell isNumber>Reflects</HeaderCell>
            <HeaderCell isNumber>Speed, km/s</HeaderCell>
            <HeaderCell isNumber>λ, nm</HeaderCell>
          </tr>
        </thead>
        <tbody>
          {light.map(({ index, n, criticalDeg, reflectedShare, speedKmS, wavelengthNm }) => (
            <tr key={index}>
              <th scope="row" className="border-t border-rule px-3 py-2 pl-4.5 text-right font-mono font-normal whitespace-nowrap">
                <span className="text-ink-3">{index}</span> {n.toFixed(3)}
              </th>
              <Cell isNumber>{criticalDeg.toFixed(2)}°</Cell>
              <Cell isNumber>{(reflectedShare * 100).toFixed(1)} %</Cell>
              <Cell isNumber>{Math.round(speedKmS).toLocaleString("en").replaceAll(",", "\u202f")}</Cell>
              <Cell isNumber>{wavelengthNm.toFixed(1)}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="border-t border-rule px-4.5 py-3 text-xs text-ink-3">Critical angle from the normal, by Snell’s law. Reflection of one polished face at right angles, by Fresnel’s equations. Speed and wavelength (589.3 nm outside) are those in vacuum divided by the index.</p>
    </Card>
  );
}
