import type { SymmetricTail } from './internal/symmetricTail.ts';

/** A tail below this is not a full double any more, and its logarithm is asked for instead. */
const leastTail = 1e-290;

/**
 * How far does a sample stray from a given distribution, with the tails counted most?
 * Convention: A² = −n − (1/n)·Σ (2i−1)·[ln F(z(i)) + ln(1 − F(z(n+1−i)))], no factor for small samples.
 * Domain: at least 1 standardised value, ascending; the tail of a distribution symmetric about 0.
 * Units: none.
 * Edges: values far out make it large, never infinite as long as the logarithm is finite.
 * Source: Anderson & Darling 1954, Journal of the American Statistical Association 49, 765-769.
 * Example: the single value at the median has A² = 2·ln 2 − 1.
 */
export const andersonDarling = (
  ascending: Float64Array,
  { upperTail, farLogUpperTail }: SymmetricTail,
): number => {
  const count = ascending.length;
  let sum = 0;
  for (let index = 0; index < count; index += 1) {
    const z = ascending[index] as number;
    const size = Math.abs(z);
    const tail = upperTail(size);
    const beyond = tail > leastTail ? Math.log(tail) : farLogUpperTail(size);
    const within = Math.log1p(-tail);
    const fromBelow = z < 0 ? beyond : within;
    const fromAbove = z < 0 ? within : beyond;
    sum += (2 * index + 1) * fromBelow + (2 * (count - index) - 1) * fromAbove;
  }
  return -count - sum / count;
};
