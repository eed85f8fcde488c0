const overCloses = (closes: ArrayLike<number>, between: (before: number, after: number) => number) => {
  if (closes.length < 2) throw new RangeError(`returns: expected at least 2 closes, got ${closes.length}`);
  const returns = new Float64Array(closes.length - 1);
  let before = positiveClose(closes, 0);
  for (let index = 1; index < closes.length; index += 1) {
    const after = positiveClose(closes, index);
    returns[index - 1] = between(before, after);
    before = after;
  }
  return returns;
};

const positiveClose = (closes: ArrayLike<number>, index: number): number => {
  const close = closes[index] as number;
  if (!(close > 0 && close < Infinity))
    throw new RangeError(`returns: expected closes above 0 and finite, got ${close} at index ${index}`);
  return close;
};

/**
 * By what fraction did the price change from one close to the next?
 * Convention: simple return P[t]/P[t−1] − 1, taken as (P[t] − P[t−1])/P[t−1], because the difference of two near
 * prices is exact in doubles while the quotient minus one loses up to three digits.
 * Domain: at least 2 closes, each above 0 and finite, oldest first; anything else is a bug of the caller and throws.
 * Units: closes in any one unit; returns as decimal fractions, one fewer than the closes.
 * Edges: equal closes give 0; no return is below −1.
 * Source: definition.
 * Example: simpleReturns([100, 101]) holds 0.01.
 */
export const simpleReturns = (closes: ArrayLike<number>): Float64Array =>
  overCloses(closes, (before, after) => (after - before) / before);

/**
 * By how much did the logarithm of the price change from one close to the next?
 * Convention: ln(P[t]/P[t−1]), taken as log1p of the simple return for the same reason as there.
 * Domain: at least 2 closes, each above 0 and finite, oldest first; anything else is a bug of the caller and throws.
 * Units: closes in any one unit; log returns as decimal fractions, one fewer than the closes.
 * Edges: equal closes give 0. A price that falls by half or more is taken as a quotient, where log1p gains nothing.
 * Source: definition.
 * Example: logReturns([100, 101]) holds 0.00995033….
 */
export const logReturns = (closes: ArrayLike<number>): Float64Array =>
  overCloses(closes, (before, after) =>
    after > before / 2 && after < before * 2
      ? Math.log1p((after - before) / before)
      : Math.log(after / before),
  );
