import { criticalAngleDeg } from "#app/gemmology/optics/critical-angle-deg.ts";
import { lightSpeedInsideKmS } from "#app/gemmology/optics/light-speed-inside-km-s.ts";
import { normalReflectance } from "#app/gemmology/optics/normal-reflectance.ts";
import { wavelengthInsideNm } from "#app/gemmology/optics/wavelength-inside-nm.ts";
import type { SpeciesRow } from "#app/gemmology/species/species-row.ts";

/** What one principal index means for light at 589.3 nm; for uniaxial and biaxial stones along the matching vibration. */
export type LightLine = Readonly<{ index: string; n: number; criticalDeg: number; reflectedShare: number; speedKmS: number; wavelengthNm: number }>;

const indexNames = { n: "n", omega: "ω", epsilon: "ε", alpha: "α", gamma: "γ", spot: "spot" } as const;

/** Computed from the usual value of each index; a spot reading only where there is no other. */
export function lightInside({ ri }: Pick<SpeciesRow, "ri">): LightLine[] {
  const known = (Object.keys(indexNames) as (keyof typeof indexNames)[]).filter((name) => ri?.[name]);
  const principal = known.filter((name) => name !== "spot");
  return (principal.length > 0 ? principal : known).map((name) => {
    const n = ri![name]!.typ;
    return { index: indexNames[name], n, criticalDeg: criticalAngleDeg({ nDense: n }), reflectedShare: normalReflectance({ n }), speedKmS: lightSpeedInsideKmS({ n }), wavelengthNm: wavelengthInsideNm({ n }) };
  });
}
