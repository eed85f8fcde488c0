import { normalCdf, normalQuantile, normalUpperTail } from '../../stats/distributions/normal.ts';
import { studentTCdf, studentTQuantile, studentTUpperTail } from '../../stats/distributions/studentT.ts';
import { sampleStandardDeviation } from '../../stats/moments/deviation.ts';
import { arithmeticMean } from '../../stats/moments/mean.ts';
import { fitStudent } from '../../stats/tails/studentFit.ts';
import { valueOrNull } from '../../terms/result.ts';

/** A fitted distribution of returns, as a picture asks of it. */
export type Fitted = {
  readonly shareBelow: (value: number) => number;
  /** The share of returns that lose at least as much. */
  readonly shareLosing: (loss: number) => number;
  readonly quantile: (share: number) => number;
};

export type BothFitted = {
  readonly normal: Fitted;
  /** null where no Student distribution can be fitted. */
  readonly student: Fitted | null;
};

const fittedNormal = (returns: Float64Array): Fitted => {
  const mean = arithmeticMean(returns);
  const deviation = sampleStandardDeviation(returns);
  return {
    shareBelow: (value) => normalCdf((value - mean) / deviation),
    shareLosing: (loss) => normalUpperTail((loss + mean) / deviation),
    quantile: (share) => mean + deviation * normalQuantile(share),
  };
};

const fittedStudent = (returns: Float64Array): Fitted | null => {
  const fit = valueOrNull(fitStudent(returns));
  if (fit === null) return null;
  const { location, scale, nu } = fit;
  return {
    shareBelow: (value) => studentTCdf((value - location) / scale, nu),
    shareLosing: (loss) => studentTUpperTail((loss + location) / scale, nu),
    quantile: (share) => location + scale * studentTQuantile(share, nu),
  };
};

/** The bell curve by mean and standard deviation, and the Student distribution by maximum likelihood. */
export const bothFitted = (returns: Float64Array): BothFitted => ({
  normal: fittedNormal(returns),
  student: fittedStudent(returns),
});
