import type { Level } from '../../terms/level.ts';
import type { RandomStreams } from '../../terms/random.ts';
import type { Side } from '../../terms/side.ts';

/** What a bootstrap interval of the mean is asked. */
export type MeanBootstrapQuestion = {
  /** In time order. */
  readonly returns: ArrayLike<number>;
  readonly level: Level;
  readonly side: Side;
  readonly streams: RandomStreams;
  /** Resamples; 9,999 unless said. */
  readonly replicates?: number;
};
