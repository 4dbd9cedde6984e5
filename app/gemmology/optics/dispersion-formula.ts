type Range = Readonly<{
  /** Wavelengths in air for which it was measured, nm. */
  fromNm: number;
  toNm: number;
}>;

/** How an index depends on the wavelength λ; all coefficients are for λ in µm. */
export type DispersionFormula = Range &
  (
    | Readonly<{ kind: "sellmeier"; /** n² = constant + Σ strength·λ²/(λ² − pole) */ constant: number; terms: readonly Readonly<{ strength: number; /** µm², signed. */ pole: number }>[] }>
    | Readonly<{ kind: "cauchy"; /** n = a + b/λ²: visible light only. */ a: number; b: number }>
    | Readonly<{ kind: "powers"; /** n² = constant + Σ strength·λ^power/(λ² − pole) + Σ strength·λ^power */ constant: number; resonances: readonly Readonly<{ strength: number; power: number; pole: number }>[]; powers: readonly Readonly<{ strength: number; power: number }>[] }>
    | Readonly<{ kind: "table"; /** Rising in wavelength, at least four; between them a cubic through the nearest four. */ points: readonly Readonly<{ nm: number; n: number }>[] }>
  );
