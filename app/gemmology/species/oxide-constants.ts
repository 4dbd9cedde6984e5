/** An oxide (or a halogen that stands for one) of a formula: the element, its atoms and oxygens, and its refractive constant, cm³/g. */
export type OxideConstant = Readonly<{ element: string; atoms: number; oxygens: number; constant: number }>;

/** Standard atomic masses, rounded to two decimals (IUPAC 2021, from memory). */
export const atomicMass: Readonly<Record<string, number>> = {
  H: 1.01, Li: 6.94, Be: 9.01, B: 10.81, C: 12.01, O: 16.0, F: 19.0, Na: 22.99, Mg: 24.31, Al: 26.98, Si: 28.09, P: 30.97, S: 32.06, Cl: 35.45, K: 39.1, Ca: 40.08, Ti: 47.87, Cr: 52.0, Mn: 54.94, Fe: 55.85, Cu: 63.55, Zn: 65.38, Sr: 87.62, Zr: 91.22, Ba: 137.33,
};

/**
 * Refractive constants of oxides at 589 nm, after Mandarino, Canadian Mineralogist 14 (1976) 498 and 19 (1981) 441; from
 * memory. Iron counts as FeO: Fe2O3 and the oxides of heavy metals scatter too much to check a table by.
 */
export const oxideConstants: readonly OxideConstant[] = [
  { element: "H", atoms: 2, oxygens: 1, constant: 0.34 },
  { element: "Li", atoms: 2, oxygens: 1, constant: 0.307 },
  { element: "Be", atoms: 1, oxygens: 1, constant: 0.24 },
  { element: "B", atoms: 2, oxygens: 3, constant: 0.215 },
  { element: "C", atoms: 1, oxygens: 2, constant: 0.214 },
  { element: "Na", atoms: 2, oxygens: 1, constant: 0.19 },
  { element: "Mg", atoms: 1, oxygens: 1, constant: 0.2 },
  { element: "Al", atoms: 2, oxygens: 3, constant: 0.207 },
  { element: "Si", atoms: 1, oxygens: 2, constant: 0.208 },
  { element: "P", atoms: 2, oxygens: 5, constant: 0.183 },
  { element: "S", atoms: 1, oxygens: 3, constant: 0.177 },
  { element: "K", atoms: 2, oxygens: 1, constant: 0.196 },
  { element: "Ca", atoms: 1, oxygens: 1, constant: 0.21 },
  { element: "Mn", atoms: 1, oxygens: 1, constant: 0.191 },
  { element: "Fe", atoms: 1, oxygens: 1, constant: 0.188 },
  { element: "Zn", atoms: 1, oxygens: 1, constant: 0.158 },
  { element: "Sr", atoms: 1, oxygens: 1, constant: 0.145 },
  { element: "Ba", atoms: 1, oxygens: 1, constant: 0.128 },
  { element: "F", atoms: 1, oxygens: 0, constant: 0.043 },
  { element: "Cl", atoms: 1, oxygens: 0, constant: 0.307 },
];
