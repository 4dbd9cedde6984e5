import { edgeIndices, upperVibrationDeg } from "./edge-indices.ts";
import { inOrder, principalOf, type Crystal } from "./crystal-model.ts";
import { halfTurn } from "./observed.ts";
import { polariserUDeg, type RotationRun } from "./rotation-run.ts";
import { cross, unit, type Orientation, type Vector } from "./vector.ts";

/** A crown facet leans by about this much (common practice). */
const leanDeg = 40;
const degree = Math.PI / 180;

/** Between two crystals that show one facet the same edges: the polariser at which rotation, or else which second facet. */
export function decideBetween(first: Crystal, second: Crystal, run: RotationRun): string {
  const polariser = bestPolariser(first, second, run);
  const facet = bestSecondFacet(first, second);
  const sentences: string[] = [];
  if (polariser.apartDeg > 3 * polariserUDeg) {
    sentences.push(
      `Turn the ${polariser.facet} to ${polariser.angleDeg}° and find the polariser's azimuth at which the upper edge is strongest: ${Math.round(polariser.firstDeg)}° to either side of the normal means ${nameOf(first)}, ${Math.round(polariser.secondDeg)}° means ${nameOf(second)}.`,
    );
  }
  if (facet.apart > 0.0005) sentences.push(`${sentences.length > 0 ? "Or read" : "Read"} a second facet that leans by about ${leanDeg}° towards ${facet.azimuthDeg}° of this run: the value that both runs share is β.`);
  return sentences.join(" ") || "The polariser and a second facet would hardly differ here: look for the interference figure.";
}

/**
 * The rotation at which the two upper edges vibrate most differently. A crystal and its mirror image show the same edges,
 * so that only the angle to the normal counts, to whichever side.
 */
export function bestPolariser(first: Crystal, second: Crystal, { facets }: RotationRun) {
  let best = { facet: facets[0]!.label, angleDeg: 0, firstDeg: 0, secondDeg: 0, apartDeg: -1 };
  const [one, other] = [principalOf(first), principalOf(second)];
  const widest = inOrder(first)[2] - inOrder(first)[0];
  facets.forEach(({ label }, at) => {
    for (let angleDeg = 0; angleDeg < 180; angleDeg += 1) {
      const edges = edgeIndices(one, first.axes[at]!, angleDeg);
      // Where the edges nearly touch nothing vanishes cleanly.
      if (edges.upper - edges.lower < Math.max(0.001, 0.25 * widest)) continue;
      const [firstDeg, secondDeg] = [Math.abs(halfTurn(upperVibrationDeg(one, first.axes[at]!, angleDeg))), Math.abs(halfTurn(upperVibrationDeg(other, second.axes[at]!, angleDeg)))];
      const apartDeg = Math.abs(firstDeg - secondDeg);
      if (apartDeg > best.apartDeg + 0.05) best = { facet: label, angleDeg, firstDeg, secondDeg, apartDeg };
    }
  });
  return best;
}

/** Over leaning facets, the azimuth at which neither crystal's second pair of values holds the other's β. */
function bestSecondFacet(first: Crystal, second: Crystal) {
  const betaOf = (crystal: Crystal) => inOrder(crystal)[1];
  let best = { azimuthDeg: 0, apart: -1 };
  for (let azimuthDeg = 0; azimuthDeg < 360; azimuthDeg += 30) {
    const apart = Math.min(furthest(first, azimuthDeg, betaOf(second)), furthest(second, azimuthDeg, betaOf(first)));
    if (apart > best.apart + 1e-5) best = { azimuthDeg, apart };
  }
  return best;
}

/** How far a β is from the nearer of largest lower and smallest upper edge on a leaning facet. */
function furthest(crystal: Crystal, azimuthDeg: number, beta: number): number {
  const axes = leaning(crystal.axes[0]!, azimuthDeg);
  let [largestLower, smallestUpper] = [0, 9];
  for (let angleDeg = 0; angleDeg < 180; angleDeg += 15) {
    const { upper, lower } = edgeIndices(principalOf(crystal), axes, angleDeg);
    largestLower = Math.max(largestLower, lower);
    smallestUpper = Math.min(smallestUpper, upper);
  }
  return Math.min(Math.abs(beta - largestLower), Math.abs(beta - smallestUpper));
}

function leaning(axes: Orientation, azimuthDeg: number): Orientation {
  const normal = unit([Math.cos(azimuthDeg * degree) * Math.sin(leanDeg * degree), Math.sin(azimuthDeg * degree) * Math.sin(leanDeg * degree), Math.cos(leanDeg * degree)]);
  const x = unit(cross([0, 1, 0], normal));
  const frame = [x, cross(normal, x), normal] as const;
  return axes.map((axis): Vector => [axis[0] * frame[0][0] + axis[1] * frame[0][1] + axis[2] * frame[0][2], axis[0] * frame[1][0] + axis[1] * frame[1][1] + axis[2] * frame[1][2], axis[0] * frame[2][0] + axis[1] * frame[2][1] + axis[2] * frame[2][2]]) as unknown as Orientation;
}

function nameOf(crystal: Crystal): string {
  if (crystal.rank === 2) return `a uniaxial crystal with ω ${crystal.free[0]!.toFixed(4)}`;
  return `a biaxial crystal with β ${inOrder(crystal)[1].toFixed(4)}`;
}
