/**
 * Atoms of each element in one formula unit.
 *
 * @param formula plain text with subscripts as digits, brackets and water behind a dot: "CaB2Si2O8", "CuSiO3·H2O"
 * @returns null where the formula is not of one composition: alternatives in brackets, an unknown amount, words
 *
 * @example atomsOf("Be3Al2(SiO3)6") // Be 3, Al 2, Si 6, O 18
 */
export function atomsOf(formula: string): ReadonlyMap<string, number> | null {
  const atoms = new Map<string, number>();
  for (const part of formula.split("·")) {
    const [, count, unit] = /^(\d*)(.*)$/.exec(part)!;
    if (!addUnit(unit!, count === "" ? 1 : Number(count), atoms)) return null;
  }
  return atoms;
}

function addUnit(unit: string, times: number, atoms: Map<string, number>): boolean {
  const pieces = /^(?:\(([^()]*)\)|([A-Z][a-z]?))(\d*)/;
  let rest = unit;
  while (rest !== "") {
    const found = pieces.exec(rest);
    if (!found) return false;
    const [whole, inner, element, count] = found;
    const of = times * (count === "" ? 1 : Number(count));
    if (inner !== undefined) {
      if (!addUnit(inner, of, atoms)) return false;
    } else atoms.set(element!, (atoms.get(element!) ?? 0) + of);
    rest = rest.slice(whole.length);
  }
  return true;
}
