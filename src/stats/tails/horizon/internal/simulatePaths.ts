import type { RandomStreams } from '../../../../terms/random.ts';
import type { PathLoss } from './compounding.ts';
import type { PathSource } from './pathSource.ts';

/** Paths that share one stream: block b uses stream b, so blocks may be made anywhere and in any order. */
export const pathsPerStream = 1_000;

/** The losses of so many paths (a whole number of blocks), in the order of their streams. */
export const simulateLosses = (
  paths: PathSource,
  lossOf: PathLoss,
  horizonDays: number,
  pathCount: number,
  streams: RandomStreams,
): Float64Array => {
  const losses = new Float64Array(pathCount);
  const path = new Float64Array(horizonDays);
  for (let first = 0; first < pathCount; first += pathsPerStream) {
    const random = streams.stream(first / pathsPerStream);
    for (let offset = 0; offset < pathsPerStream; offset += 1) {
      paths(random, path);
      losses[first + offset] = lossOf(path);
    }
  }
  return losses;
};
