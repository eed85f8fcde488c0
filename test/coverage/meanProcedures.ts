import type { CoveredInterval } from '../../src/stats/coverage/cell.ts';
import { meanInterval } from '../../src/stats/mean/interval.ts';
import { neweyWestInterval } from '../../src/stats/mean/neweyWestInterval.ts';
import { predictionInterval } from '../../src/stats/mean/prediction.ts';
import { stationaryBootstrapInterval } from '../../src/stats/mean/stationaryBootstrap.ts';
import { studentisedBootstrapInterval } from '../../src/stats/mean/studentisedBootstrap.ts';
import { trustedMeanInterval } from '../../src/stats/mean/trustedInterval.ts';
import { type Result, valueOrNull } from '../../src/terms/result.ts';
import { trueMean } from './processes.ts';
import type { Ends, Procedure, Sample } from './simulate.ts';

const ofTheMean = (name: CoveredInterval, result: (sample: Sample) => Result<Ends>): Procedure => ({
  name,
  ends: (sample) => valueOrNull(result(sample)),
  truth: () => trueMean,
});

const bothSides = (sample: Sample) => ({ ...sample, side: 'both' }) as const;

const normal: Procedure = {
  name: 'mean.normal',
  ends: ({ returns, level }) => {
    const interval = valueOrNull(meanInterval(returns, level, 'both'));
    return interval && { lower: interval.normalLower, upper: interval.normalUpper };
  },
  truth: () => trueMean,
};

const prediction: Procedure = {
  name: 'mean.prediction',
  ends: ({ returns, level }) => valueOrNull(predictionInterval(returns, level, 'both')),
  truth: (_, path) => path.nextReturn,
};

export const plainMean = ofTheMean('mean.plain', ({ returns, level }) =>
  meanInterval(returns, level, 'both'),
);

export const meanProcedures: readonly Procedure[] = [
  plainMean,
  normal,
  ofTheMean('mean.neweyWest', ({ returns, level }) => neweyWestInterval(returns, level, 'both')),
  ofTheMean('mean.studentised', (sample) => studentisedBootstrapInterval(bothSides(sample))),
  ofTheMean('mean.stationary', (sample) => stationaryBootstrapInterval(bothSides(sample))),
  ofTheMean('mean.trusted', (sample) => trustedMeanInterval(bothSides(sample))),
  prediction,
];
