import {
  countWithBeyond,
  expectedBeyond,
  halfTailFraction,
  levelFraction,
  levelText,
} from '../../../../terms/level.ts';
import { endRanks } from '../../../bootstrap/ranks.ts';
import { orderStatistic } from '../../../numerics/quantile.ts';
import { boundingRanks, countThatBoundsAbove } from '../../internal/rankInterval.ts';
import type { Interval, TailFigureName, TailInput, TailNote } from '../../tailFigures.ts';
import type { FilterSource } from './filterSource.ts';
import { leftOutNotes, visitResampledStates } from './resampledStates.ts';
import { stateFigures } from './stateFigures.ts';

/** Residuals expected beyond the level below which resamples of the tail say too little of its mean. */
const leastExpectedBeyond = 10;

export type ResampledFigures = {
  readonly varInterval: Interval | null;
  readonly esInterval: Interval | null;
  readonly notes: readonly TailNote[];
};

const note = (
  figure: TailFigureName,
  code: TailNote['code'],
  text: string,
  needs: number | null = null,
): TailNote => ({ figure, code, text, needs });

const withoutAny = (notes: readonly TailNote[]): ResampledFigures => ({
  varInterval: null,
  esInterval: null,
  notes,
});

/** No resample holds a residual larger than the largest one, so where no rank bounds the quantile none of them does. */
const openAbove = (count: number, { tailLevel, confidence }: TailInput): TailNote | null => {
  const beyond = halfTailFraction(confidence);
  if (boundingRanks(count, levelFraction(tailLevel), beyond).upper !== null) return null;
  const needs = countThatBoundsAbove(tailLevel, beyond);
  const text = `${count} residuals cannot bound a ${levelText(tailLevel)} figure from above; ${needs} would.`;
  return note('varInterval', 'upperEndUnbounded', text, needs);
};

const tooFewBeyond = (count: number, { tailLevel }: TailInput): TailNote | null => {
  const expected = expectedBeyond(count, tailLevel);
  if (expected >= leastExpectedBeyond) return null;
  const needs = countWithBeyond(tailLevel, leastExpectedBeyond);
  const text =
    `${count} residuals leave ${expected} beyond ${levelText(tailLevel)} on average, too few for an interval of the mean ` +
    `beyond it; ${needs} returns would be enough.`;
  return note('esInterval', 'tooFewBeyond', text, needs);
};

/** Percentile intervals of the figures over rebuilt paths, and why an end or an interval is missing. */
export const resampledFigures = (source: FilterSource, input: TailInput): ResampledFigures => {
  const replicates = input.replicates ?? source.replicates;
  const ranks = endRanks(input.confidence, 'both', replicates);
  if (!ranks.ok) return withoutAny([note('varInterval', 'levelBeyondResamples', ranks.problem.message)]);
  const vars = new Float64Array(replicates);
  const shortfalls = new Float64Array(replicates);
  const scratch = new Float64Array(input.returns.length);
  const resampled = visitResampledStates(source, input.streams, replicates, (state, replicate) => {
    const figures = stateFigures(state, input.tailLevel, scratch);
    vars[replicate] = figures.var;
    shortfalls[replicate] = figures.es;
  });
  const leftOut = leftOutNotes('varInterval', resampled, replicates);
  if (!resampled.complete) return withoutAny(leftOut);
  const count = input.returns.length;
  const open = openAbove(count, input);
  const fewBeyond = tooFewBeyond(count, input);
  const { lower, upper } = ranks.value;
  vars.sort();
  shortfalls.sort();
  return {
    varInterval: {
      lower: orderStatistic(vars, lower),
      upper: open === null ? orderStatistic(vars, upper) : null,
    },
    esInterval:
      fewBeyond === null
        ? { lower: orderStatistic(shortfalls, lower), upper: orderStatistic(shortfalls, upper) }
        : null,
    notes: [...leftOut, ...(open === null ? [] : [open]), ...(fewBeyond === null ? [] : [fewBeyond])],
  };
};
