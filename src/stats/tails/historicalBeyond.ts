import { halfTailFraction } from '../../terms/level.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { betaQuantile } from '../distributions/beta.ts';
import { refuseUnusable } from '../returns/leastCounts.ts';
import { beyondFigures } from './internal/beyondFigures.ts';
import type { BeyondFigures, BeyondInput, Interval } from './tailFigures.ts';

/** Exact interval of a probability from `hits` in `count`; an end is 0 or 1 where no hit or only hits were seen. */
const clopperPearson = (hits: number, count: number, beyond: number): Interval => ({
  lower: hits === 0 ? 0 : betaQuantile(beyond, hits, count - hits + 1),
  upper: hits === count ? 1 : betaQuantile(1 - beyond, hits + 1, count - hits),
});

/** Two returns are what it takes to see that a price moves. */
const leastCount = 2;

/**
 * On what share of the days was the loss at least so large, and what does that say of its chance?
 * Convention: hits over n, a hit being −r ≥ threshold; interval of Clopper & Pearson, exact and never narrower than stated.
 * Domain: at least 2 finite returns that differ; a finite threshold.
 * Units: returns and threshold as decimal fractions (a loss of 4% is 0.04); probabilities in 0..1.
 * Edges: no hit gives probability 0 with lower end 0 and a mean return time of null. Returns are taken as independent.
 * Source: Clopper & Pearson 1934, Biometrika 26, 404-413.
 * Example: no hit in 100 days at 95%: between 0 and 3.62%.
 */
export const historicalBeyond = ({ returns, threshold, confidence }: BeyondInput): Result<BeyondFigures> => {
  const refusal = refuseUnusable(returns, leastCount, 'A historical chance');
  if (refusal !== null) return refusal;
  let hits = 0;
  for (let index = 0; index < returns.length; index += 1)
    if (-(returns[index] as number) >= threshold) hits += 1;
  const interval = clopperPearson(hits, returns.length, halfTailFraction(confidence));
  return succeed(
    beyondFigures('historical', hits / returns.length, interval, 'clopperPearson', [
      {
        figure: 'interval',
        code: 'exactInterval',
        text: 'Interval of Clopper & Pearson 1934, exact for independent days.',
        needs: null,
      },
    ]),
  );
};
