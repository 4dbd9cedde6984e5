/**
 * Bits that an observation is expected to bring about which hypothesis holds: the mutual information
 *
 *   Σ_k π_k Σ_o p(o|k) log₂ ( p(o|k) / Σ_j π_j p(o|j) )
 *
 * @param weights π, not negative; need not sum to 1
 * @param likelihoods a row a hypothesis, a column an outcome, not negative; each row is normalised
 * @returns never below 0 nor above the entropy of the weights
 * @throws RangeError when there is nothing to weigh
 *
 * Source: Lindley, Ann. Math. Stat. 27 (1956) 986.
 */
export function expectedInformation(weights: readonly number[], likelihoods: readonly (readonly number[])[]): number {
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  if (!(total > 0) || likelihoods.length !== weights.length) throw new RangeError(`weights out of range: ${total}`);
  const rows = likelihoods.map((row) => {
    const sum = row.reduce((all, value) => all + value, 0);
    return sum > 0 ? row.map((value) => value / sum) : row.map(() => 1 / row.length);
  });
  const outcomeCount = rows[0]?.length ?? 0;
  let bits = 0;
  for (let outcome = 0; outcome < outcomeCount; outcome++) {
    let mixture = 0;
    for (let k = 0; k < rows.length; k++) mixture += (weights[k]! / total) * rows[k]![outcome]!;
    for (let k = 0; k < rows.length; k++) {
      const p = rows[k]![outcome]!;
      // What is too unlikely for a number to hold tells nothing.
      if (p > 0 && mixture > 0 && weights[k]! > 0) bits += (weights[k]! / total) * p * Math.log2(p / mixture);
    }
  }
  return Math.max(0, bits);
}
