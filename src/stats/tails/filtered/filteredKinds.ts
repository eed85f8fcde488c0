import { leastCounts } from '../../returns/leastCounts.ts';
import { garchOverlap } from '../../volatility/garch.ts';

/** How volatility is followed: an exponentially weighted mean of squares, or a fitted GARCH(1,1) with Student innovations. */
export type FilterKind = 'ewma' | 'garch';

/**
 * Which filters speak at a count of returns, the deciding one first.
 * Convention: below 500 the exponentially weighted mean, from 500 up GARCH; between 490 and 510 both are shown, so that
 * one more day in the window does not change the figure unseen.
 * Domain: a whole count. Source: ours.
 * Example: filteredKinds(505) is ['garch', 'ewma'].
 */
export const filteredKinds = (count: number): readonly [FilterKind, ...FilterKind[]] => {
  const first: FilterKind = count < leastCounts.garch ? 'ewma' : 'garch';
  if (Math.abs(count - leastCounts.garch) > garchOverlap) return [first];
  return first === 'ewma' ? ['ewma', 'garch'] : ['garch', 'ewma'];
};
