import type { CoveredInterval } from '../../src/stats/coverage/cell.ts';
import { blockDeviationInterval } from '../../src/stats/spread/blockInterval.ts';
import { bonettInterval } from '../../src/stats/spread/bonett.ts';
import { chiSquareInterval } from '../../src/stats/spread/chiSquareInterval.ts';
import { deviationTrust } from '../../src/stats/spread/trust.ts';
import { valueOrNull } from '../../src/terms/result.ts';
import { trueDeviation } from './processes.ts';
import type { Ends, Procedure, Sample } from './simulate.ts';

const ofTheDeviation = (name: CoveredInterval, ends: (sample: Sample) => Ends | null): Procedure => ({
  name,
  ends,
  truth: () => trueDeviation,
});

export const deviationProcedures: readonly Procedure[] = [
  ofTheDeviation('deviation.chiSquare', ({ returns, level }) =>
    valueOrNull(chiSquareInterval(returns, level)),
  ),
  ofTheDeviation('deviation.bonett', ({ returns, level }) => valueOrNull(bonettInterval(returns, level))),
  ofTheDeviation('deviation.block', (sample) => valueOrNull(blockDeviationInterval(sample))),
  ofTheDeviation('deviation.trusted', (sample) => {
    const found = valueOrNull(deviationTrust(sample));
    return found?.[found.trust] ?? null;
  }),
];
