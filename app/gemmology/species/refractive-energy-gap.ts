import { refractiveEnergyByComposition, refractiveEnergyByPhysics } from "../optics/gladstone-dale.ts";
import { atomsOf } from "./atoms-of.ts";
import { atomicMass, oxideConstants } from "./oxide-constants.ts";
import type { SpeciesRow } from "./species-row.ts";

/**
 * How far index and density of a row are from what its formula makes: 1 − K_P/K_C, from the usual values.
 *
 * @returns null where the formula, the index or the density do not allow it: mixed crystals, aggregates read by a spot,
 * oxides whose constant is not known, iron beyond FeO
 *
 * Source: Gladstone and Dale 1863; Mandarino 1981.
 */
export function refractiveEnergyGap({ formula, ri, sg }: Pick<SpeciesRow, "formula" | "ri" | "sg">): number | null {
  const mean = meanIndex(ri);
  const parts = formula && oxideParts(formula);
  if (!mean || !sg || !parts) return null;
  return 1 - refractiveEnergyByPhysics({ meanIndex: mean, densityGCm3: sg.typ }) / refractiveEnergyByComposition(parts);
}

function meanIndex(ri: SpeciesRow["ri"]): number | null {
  if (ri?.n) return ri.n.typ;
  if (ri?.omega && ri.epsilon) return (2 * ri.omega.typ + ri.epsilon.typ) / 3;
  if (ri?.alpha && ri.beta && ri.gamma) return (ri.alpha.typ + ri.beta.typ + ri.gamma.typ) / 3;
  return null;
}

/** Mass fractions of the oxides; the charges must come out, which leaves sulphides, ferric iron and the like aside. */
function oxideParts(formula: string): Array<{ constant: number; massFraction: number }> | null {
  const atoms = atomsOf(formula);
  if (!atoms?.has("O")) return null;
  const parts: Array<{ constant: number; mass: number }> = [];
  let oxygens = atoms.get("O")!;
  let mass = 0;
  for (const [element, count] of atoms) {
    if (!(element in atomicMass)) return null;
    mass += atomicMass[element]! * count;
    if (element === "O") continue;
    const oxide = oxideConstants.find((each) => each.element === element);
    if (!oxide) return null;
    const ofOxygen = (count * oxide.oxygens) / oxide.atoms;
    // A halogen takes the place of half an oxygen.
    oxygens -= oxide.oxygens === 0 ? -count / 2 : ofOxygen;
    parts.push({ constant: oxide.constant, mass: atomicMass[element]! * count + (oxide.oxygens === 0 ? -count / 2 : ofOxygen) * atomicMass.O! });
  }
  if (Math.abs(oxygens) > 0.01) return null;
  return parts.map((part) => ({ constant: part.constant, massFraction: part.mass / mass }));
}
