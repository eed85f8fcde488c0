import { createHash } from 'node:crypto';
import type { CoverageCell, CoverageProcess, CoveredInterval } from '../../src/stats/coverage/cell.ts';
import { createStreams } from '../../src/stats/random/xoshiro128.ts';
import { type Level, levelFromFraction } from '../../src/terms/level.ts';
import type { RandomStreams } from '../../src/terms/random.ts';
import { type Path, processes } from './processes.ts';

/** Both ends are finite or null; a null end is no bound on that side. */
export type Ends = { readonly lower: number | null; readonly upper: number | null };

/** What an interval is given of a simulated sample: the returns, and streams of its own for resampling. */
export type Sample = {
  readonly returns: Float64Array;
  readonly level: Level;
  readonly streams: RandomStreams;
  /** Resamples that a bootstrap should make: fewer for long samples, to keep the whole table affordable. */
  readonly replicates: number;
};

/** An interval under trial. `ends` is null where it is refused. */
export type Procedure = {
  readonly name: CoveredInterval;
  readonly ends: (sample: Sample) => Ends | null;
  /** The figure that the interval claims to hold. */
  readonly truth: (process: CoverageProcess, path: Path) => number;
};

export type Cell = {
  readonly procedure: Procedure;
  readonly process: CoverageProcess;
  readonly count: number;
  readonly level: string;
  readonly replications: number;
};

/** Streams 0 to 2^20 − 1 make the paths; those of a path's own resamples follow in a block of the same size. */
const block = 2 ** 20;

const seedOf = (text: string): Uint8Array => createHash('sha256').update(text).digest();

/** (B + 1)·0.025 is whole for each; fewer resamples make an interval noisier, not narrower. */
const resamplesAt = (count: number): number => {
  if (count > 500) return 199;
  return count > 100 ? 399 : 999;
};

const holds = ({ lower, upper }: Ends, truth: number): boolean =>
  (lower === null || lower <= truth) && (upper === null || truth <= upper);

const readLevel = (text: string): Level => {
  const level = levelFromFraction(text);
  if (level === null) throw new RangeError(`coverage: ${text} is not a level`);
  return level;
};

/**
 * Counts how often an interval holds the truth. The paths depend on the process, the count and the replicate alone, so
 * intervals of one process meet the same samples, and a cell comes out the same whenever and wherever it is run.
 */
export const simulateCell = (cell: Cell): CoverageCell => {
  const { procedure, process, count, replications } = cell;
  const level = readLevel(cell.level);
  const root = createStreams(seedOf(`coverage ${process} ${count}`));
  let held = 0;
  let refused = 0;
  for (let replicate = 0; replicate < replications; replicate += 1) {
    const path = processes[process](root.stream(replicate), count);
    const streams = { stream: (inner: number) => root.stream((replicate + 1) * block + inner) };
    const ends = procedure.ends({
      returns: path.returns,
      level,
      streams,
      replicates: resamplesAt(count),
    });
    if (ends === null) refused += 1;
    else if (holds(ends, procedure.truth(process, path))) held += 1;
  }
  const given = replications - refused;
  const coverage = given === 0 ? 0 : Number((held / given).toFixed(4));
  return [procedure.name, process, count, cell.level, coverage, replications, refused];
};
