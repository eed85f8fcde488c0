import type { RandomStreams } from '../../terms/random.ts';
import type { ResampleDraw } from './draws.ts';

/** Resamples of a bootstrap unless said otherwise: (B + 1)·p is whole for every level with one decimal in percent. */
export const defaultReplicates = 9_999;

/** One array of picked indices for each sample that is drawn on its own; paired samples share one. */
export type Picks = readonly [Uint32Array, ...Uint32Array[]];

/** A figure of the picked values. NaN or an infinite value means that it does not exist for these picks. */
export type ResampledStatistic = (picks: Picks) => number;

export type Resampling = {
  /** One draw for each sample that is resampled independently of the others. */
  readonly draws: readonly [ResampleDraw, ...ResampleDraw[]];
  readonly statistic: ResampledStatistic;
  readonly streams: RandomStreams;
  readonly replicates: number;
};

/** A statistic that does not exist in so many resamples on end will not exist in any. */
const mostRedraws = 1_000;

/**
 * The statistic of every resample, ascending.
 * Replicate b uses stream b alone, so the result does not depend on who computes which; a resample whose statistic does
 * not exist is drawn again from the same stream.
 */
export const sortedReplicates = ({ draws, statistic, streams, replicates }: Resampling): Float64Array => {
  const [first, ...others] = draws;
  const picks: Picks = [new Uint32Array(first.count), ...others.map(({ count }) => new Uint32Array(count))];
  const values = new Float64Array(replicates);
  for (let replicate = 0; replicate < replicates; replicate += 1) {
    const random = streams.stream(replicate);
    let value = Number.NaN;
    for (let redraws = 0; !Number.isFinite(value); redraws += 1) {
      if (redraws > mostRedraws)
        throw new Error('sortedReplicates: the statistic does not exist in any resample');
      first.fill(random, picks[0]);
      for (let sample = 1; sample < draws.length; sample += 1)
        draws[sample]?.fill(random, picks[sample] as Uint32Array);
      value = statistic(picks);
    }
    values[replicate] = value;
  }
  return values.sort();
};
