import { deviationRatio } from '../../src/stats/comparisons/deviationRatio.ts';
import { pairedMeanDifference, welchMeanDifference } from '../../src/stats/comparisons/meanDifference.ts';
import { valueOrNull } from '../../src/terms/result.ts';
import { processes, trueMean } from './processes.ts';
import { remembered } from './remembered.ts';
import type { Procedure, Sample } from './simulate.ts';

/** Of a sample's own streams the bootstraps use the first ten thousand. */
const streamOfTheOther = 2 ** 19;
/** Correlation of the two tickers, as of two shares of one market. */
const correlation = 0.5;

/** A second ticker of the same mean and deviation, half of it made of the first one's returns. */
const otherTicker = remembered(({ process, returns, streams }): Float64Array => {
  const own = processes[process](streams.stream(streamOfTheOther), returns.length).returns;
  const share = Math.sqrt(1 - correlation ** 2);
  return returns.map(
    (value, day) => trueMean + correlation * (value - trueMean) + share * ((own[day] as number) - trueMean),
  );
});

/** The window cut in the middle: the later half against the earlier one. */
const halves = ({ returns }: Sample) => {
  const middle = returns.length >> 1;
  return { first: returns.subarray(middle), second: returns.subarray(0, middle) };
};

const tickers = (sample: Sample) => ({ first: sample.returns, second: otherTicker(sample) });

/** Both of a comparison have the same mean and, in the long run, the same deviation. The count is that of the window. */
export const comparisonProcedures: readonly Procedure[] = [
  {
    name: 'compare.paired.mean',
    ends: (sample) => {
      const { first, second } = tickers(sample);
      return valueOrNull(pairedMeanDifference(first, second, sample.level));
    },
    truth: () => 0,
  },
  {
    name: 'compare.welch.mean',
    ends: (sample) => {
      const { first, second } = halves(sample);
      return valueOrNull(welchMeanDifference(first, second, sample.level));
    },
    truth: () => 0,
  },
  {
    name: 'compare.paired.deviationRatio',
    ends: (sample) => valueOrNull(deviationRatio({ ...sample, ...tickers(sample), paired: true })),
    truth: () => 1,
  },
  {
    name: 'compare.welch.deviationRatio',
    ends: (sample) => valueOrNull(deviationRatio({ ...sample, ...halves(sample), paired: false })),
    truth: () => 1,
  },
];
