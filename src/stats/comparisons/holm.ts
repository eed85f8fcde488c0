/**
 * Which p-values survive when several tests are read at once?
 *
 * Convention: step-down. With the p-values ascending, the i-th of m (from 1) becomes the largest of (m − j + 1)·p(j)
 * over j ≤ i, at most 1. The family-wise chance of a false rejection is held whatever the dependence between the tests.
 * Domain: p-values in [0, 1], any count, zero of them included; null for a test that there was not, which stays null and
 * does not count among the m. A p-value outside is a bug and throws.
 * Units: probabilities in, adjusted probabilities out, in the order of the input.
 * Edges: one p-value is returned as it is; equal p-values get equal adjusted ones.
 * Source: Holm 1979, Scandinavian Journal of Statistics 6, 65-70.
 * Example: holmAdjusted([0.01, 0.04, null, 0.03]) is [0.03, 0.06, null, 0.06].
 */
export const holmAdjusted = (pValues: readonly (number | null)[]): (number | null)[] => {
  const ascending = pValues
    .flatMap((p, index) => (p === null ? [] : [{ p, index }]))
    .sort((a, b) => a.p - b.p);
  const adjusted = pValues.map((): number | null => null);
  let largest = 0;
  ascending.forEach(({ p, index }, rank) => {
    if (!(p >= 0 && p <= 1)) throw new RangeError(`holmAdjusted: a p-value lies in [0, 1], got ${p}`);
    largest = Math.max(largest, Math.min(1, (ascending.length - rank) * p));
    adjusted[index] = largest;
  });
  return adjusted;
};
