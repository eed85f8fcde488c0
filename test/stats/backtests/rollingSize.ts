import { backtest, type ModelRefused } from '../../../src/stats/backtests/backtest.ts';
import type { ModelVerdict } from '../../../src/stats/backtests/judgedModel.ts';
import { sampleStandardDeviation } from '../../../src/stats/moments/deviation.ts';
import { arithmeticMean } from '../../../src/stats/moments/mean.ts';
import type { TailModelName } from '../../../src/stats/tails/tailFigures.ts';
import type { Level } from '../../../src/terms/level.ts';
import { accepted } from '../../laws/outcomes.ts';
import { testStreams } from '../testStreams.ts';
import { simulateGarchReturns } from '../volatility/simulateReturns.ts';

export const sizeModels = ['historical', 'normal', 'student', 'filtered', 'peaks'] as const;

/** Daily returns of about 1%: independent normal, independent t(4), and GARCH with t(5) innovations. */
export const sizeProcesses = {
  normal: { process: { mu: 0, omega: 1e-4, alpha: 0, beta: 0 }, nu: Number.POSITIVE_INFINITY },
  studentT4: { process: { mu: 0, omega: 1e-4, alpha: 0, beta: 0 }, nu: 4 },
  garchT: { process: { mu: 0, omega: 2e-6, alpha: 0.08, beta: 0.9 }, nu: 5 },
} as const;

export type SizeProcess = keyof typeof sizeProcesses;

export type MeasuredSize = {
  readonly model: TailModelName;
  /** Histories in which the model was judged, not refused. */
  readonly histories: number;
  /** Share of days beyond VaR, and the standard error of that share over the histories. */
  readonly rate: number;
  readonly rateError: number;
  /** Share of histories whose coverage ratio rejects at 5%. */
  readonly kupiec: number;
};

const judgedDays = 250;

const judge = (
  name: SizeProcess,
  tailLevel: Level,
  history: number,
): readonly (ModelVerdict | ModelRefused)[] => {
  const { process, nu } = sizeProcesses[name];
  const outcome = backtest({
    returns: simulateGarchReturns(250 + judgedDays, process, nu, history),
    firstDay: 250,
    dayCount: judgedDays,
    estimationReturns: 250,
    tailLevel,
    models: sizeModels,
    streams: testStreams(1),
    replicates: 1,
  });
  if (outcome === null) throw new Error('a walk that nobody ended has ended');
  return accepted(outcome).models;
};

const summarise = (model: TailModelName, verdicts: readonly ModelVerdict[]): MeasuredSize => {
  const shares = verdicts.map(({ exceedances, forecasts }) => exceedances / forecasts.days.length);
  return {
    model,
    histories: verdicts.length,
    rate: arithmeticMean(shares),
    rateError: sampleStandardDeviation(shares) / Math.sqrt(shares.length),
    kupiec: verdicts.filter(({ coverage }) => coverage.p < 0.05).length / verdicts.length,
  };
};

/** What estimating on the 250 days before does to the coverage verdict: histories `from` to `from + count − 1`. */
export const measureSize = (
  name: SizeProcess,
  tailLevel: Level,
  from: number,
  count: number,
): readonly MeasuredSize[] => {
  const judged = Array.from({ length: count }, (_, index) => judge(name, tailLevel, from + index)).flat();
  return sizeModels.map((model) =>
    summarise(
      model,
      judged.flatMap((one) => (one.ok && one.model === model ? [one] : [])),
    ),
  );
};
