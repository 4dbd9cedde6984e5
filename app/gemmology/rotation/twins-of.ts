import { crystalsOf, harmonicsOf, type Start } from "./section-harmonics.ts";

/**
 * The crystals that show a facet exactly the same edges as this one does, though their middle index is another: usually
 * one.
 *
 * The edges over a rotation are the outline of the index surface, seen along the facet's normal. That outline is the polar
 * of the ray surface's section with the facet, and the section follows from the permittivity's values across each
 * direction in the facet: two tensors have the same.
 */
export function twinsOf(crystal: Start): Start[] {
  const beta = betaOf(crystal);
  return crystalsOf(harmonicsOf(crystal, 2)).filter((twin) => Math.abs(betaOf(twin) - beta) > 1e-5);
}

const betaOf = ({ indices }: Start) => [...indices].sort((a, b) => a - b)[1]!;
