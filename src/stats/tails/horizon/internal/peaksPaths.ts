import type { Random } from '../../../../terms/random.ts';
import { type Result, succeed } from '../../../../terms/result.ts';
import { arithmeticMean } from '../../../moments/mean.ts';
import { exponentialGrowth } from '../../../numerics/exponentialGrowth.ts';
import { nextIndex, nextOpenDouble } from '../../../random/draws.ts';
import { findPeaks, type Peaks } from '../../peaks/internal/peaks.ts';
import { type GpdFit, maximiseGpd } from '../../peaks/peaksFit.ts';
import type { PeaksTailParameters } from '../../peaks/peaksTail.ts';
import type { HorizonModel, PathSource } from './pathSource.ts';

type Tail = Pick<GpdFit, 'shape' | 'scale'>;

const nextExcess = ({ shape, scale }: Tail, random: Random): number =>
  scale * exponentialGrowth(shape, -Math.log(nextOpenDouble(random)));

/** A loss seen at or below the threshold, or one of the fitted tail, with chances of body count to `beyond`. */
const bodyAndTail =
  (body: Float64Array, beyond: number, threshold: number, tail: Tail): PathSource =>
  (random, into) => {
    const count = body.length + beyond;
    for (let day = 0; day < into.length; day += 1) {
      const index = nextIndex(random, count);
      const loss = index < body.length ? (body[index] as number) : threshold + nextExcess(tail, random);
      into[day] = -loss;
    }
  };

/** Draws how many of as many days lie beyond, their excesses and the body, and fits the tail to the excesses. */
const redrawn = (
  { count, threshold, excesses, losses }: Peaks,
  body: Float64Array,
  tail: Tail,
  random: Random,
): PathSource | null => {
  let beyond = 0;
  for (let day = 0; day < count; day += 1) if (nextIndex(random, count) < excesses.length) beyond += 1;
  const drawnBody = Float64Array.from(
    { length: count - beyond },
    () => losses[nextIndex(random, body.length)] as number,
  );
  const drawn = maximiseGpd(Float64Array.from({ length: beyond }, () => nextExcess(tail, random)));
  return drawn.ok ? bodyAndTail(drawnBody, beyond, threshold, drawn.value.fit) : null;
};

/** Days of the empirical body and the fitted tail. */
export const peaksHorizon = (
  returns: Float64Array,
  { shape, scale }: PeaksTailParameters,
): Result<HorizonModel> => {
  const found = findPeaks(returns);
  if (!found.ok) return found;
  const peaks = found.value;
  const tail: Tail = { shape, scale };
  const body = peaks.losses.subarray(0, peaks.count - peaks.excesses.length);
  return succeed({
    paths: bodyAndTail(body, peaks.excesses.length, peaks.threshold, tail),
    drift: arithmeticMean(returns),
    lossHasMean: shape < 1,
    redraw: (random) => redrawn(peaks, body, tail, random),
  });
};
