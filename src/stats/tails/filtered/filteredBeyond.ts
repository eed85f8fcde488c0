import { type Result, succeed } from '../../../terms/result.ts';
import { endRanks } from '../../bootstrap/ranks.ts';
import { orderStatistic } from '../../numerics/quantile.ts';
import { refuseStill, refuseTooFew } from '../../returns/leastCounts.ts';
import { historicalBeyond } from '../historicalBeyond.ts';
import { beyondFigures } from '../internal/beyondFigures.ts';
import type { BeyondFigures, BeyondInput, Interval, TailNote } from '../tailFigures.ts';
import { filteredKinds } from './filteredKinds.ts';
import type { FilterOptions } from './filteredTail.ts';
import { filterNotes } from './internal/filterDescription.ts';
import { type FilterSource, filterSource } from './internal/filterSource.ts';
import { leftOutNotes, visitResampledStates } from './internal/resampledStates.ts';
import { countAtLeast } from './internal/stateFigures.ts';

const figure = 'A filtered chance';
/** Two returns are what it takes to see that a price moves. */
const leastCount = 2;

type Chance = { readonly interval: Interval | null; readonly notes: readonly TailNote[] };

/** Percentile ends of the chance over rebuilt paths. */
const resampledChance = (source: FilterSource, input: BeyondInput): Chance => {
  const { replicates } = source;
  const ranks = endRanks(input.confidence, 'both', replicates);
  if (!ranks.ok) {
    const { message } = ranks.problem;
    return {
      interval: null,
      notes: [{ figure: 'interval', code: 'levelBeyondResamples', text: message, needs: null }],
    };
  }
  const chances = new Float64Array(replicates);
  const resampled = visitResampledStates(source, input.streams, replicates, (state, replicate) => {
    chances[replicate] = countAtLeast(state, input.threshold) / input.returns.length;
  });
  const notes = leftOutNotes('interval', resampled, replicates);
  if (!resampled.complete) return { interval: null, notes };
  chances.sort();
  const { lower, upper } = ranks.value;
  return {
    interval: { lower: orderStatistic(chances, lower), upper: orderStatistic(chances, upper) },
    notes,
  };
};

const widest = (first: Interval | null, second: Interval | null): Interval | null =>
  first === null || second === null
    ? null
    : {
        lower: Math.min(first.lower ?? 0, second.lower ?? 0),
        upper: Math.max(first.upper ?? 1, second.upper ?? 1),
      };

/**
 * How likely is a loss of at least so much on the next day, given how volatile the market now is?
 * Convention: the share of residuals whose loss, on the next day's deviation and less mu, is at least the threshold.
 * Interval: the wider, at each end, of the percentile ends over rebuilt paths (as filteredTail) and the exact binomial
 * ends of Clopper & Pearson with the volatility taken as known, because resamples of a tail nobody has seen are all empty.
 * Domain: at least 2 finite returns that differ, for GARCH the domain of fitGarch; a finite threshold.
 * Units: returns and threshold as decimal fractions (a loss of 4% is 0.04); probabilities in 0..1.
 * Edges: no such residual gives probability 0 with lower end 0 and a mean return time of null.
 * Source: as filteredTail; Clopper & Pearson 1934, Biometrika 26, 404-413.
 * Example: 5 of 1,000 residuals that would lose 4% tomorrow make it 0.005, once in 200 sessions at today's volatility.
 */
export const filteredBeyond = (input: BeyondInput, options: FilterOptions = {}): Result<BeyondFigures> => {
  const { returns, threshold } = input;
  const refusal = refuseTooFew(returns.length, leastCount, figure) ?? refuseStill(returns, figure);
  if (refusal !== null) return refusal;
  const found = filterSource(returns, options.kind ?? filteredKinds(returns.length)[0], options.near);
  if (!found.ok) return found;
  const source = found.value;
  const { mu, residuals, nextVariance } = source.state;
  const exact = historicalBeyond({
    ...input,
    returns: residuals,
    threshold: (threshold + mu) / Math.sqrt(nextVariance),
  });
  if (!exact.ok) return exact;
  const { probability } = exact.value;
  const resampled = resampledChance(source, input);
  const interval = widest(exact.value.interval, resampled.interval);
  const notes = [...filterNotes(source), ...resampled.notes];
  return succeed({
    ...beyondFigures('filtered', probability, interval, 'residualBootstrap', notes),
    target: 'nextDay',
  });
};
