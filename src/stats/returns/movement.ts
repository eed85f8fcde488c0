/** Spread of returns below which a price counts as standing still, relative to the largest return or to 1. */
const stillSpread = 1e-12;

/**
 * Does the price stand still in the window, so that no measure of spread has a meaning?
 * Convention: still when max − min of the returns ≤ 1e-12·max(1, max |r|).
 * Domain: finite returns, at least 1; with none there is nothing that moves, and the answer is true.
 * Units: returns as decimal fractions in; a truth value out.
 * Edges: a price that grows by exactly the same fraction every day stands still in this sense; a single return does too.
 * Source: own rule; rounding of closes near 1e-16 must not be mistaken for movement.
 * Example: doesNotMove([0, 0, 0]) is true.
 */
export const doesNotMove = (returns: ArrayLike<number>): boolean => {
  let least = Infinity;
  let most = -Infinity;
  for (let index = 0; index < returns.length; index += 1) {
    const value = returns[index] as number;
    if (value < least) least = value;
    if (value > most) most = value;
  }
  const largest = Math.max(1, Math.abs(least), Math.abs(most));
  return returns.length === 0 || most - least <= stillSpread * largest;
};
