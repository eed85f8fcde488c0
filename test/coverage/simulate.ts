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
  readonly process: CoverageProcess;
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

/** Where intervals are tried: how the returns are made, how many of them, and how many times. */
export type Setting = {
  readonly process: CoverageProcess;
  readonly count: number;
  readonly replications: number;
};

export type Cell = Setting & { readonly procedure: Procedure; readonly level: string };

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

/** One interval at one level, with what was counted so far. */
type Tally = {
  readonly procedure: Procedure;
  readonly text: string;
  readonly level: Level;
  held: number;
  refused: number;
};

const count = (tally: Tally, sample: Omit<Sample, 'level'>, path: Path): void => {
  const ends = tally.procedure.ends({ ...sample, level: tally.level });
  if (ends === null) tally.refused += 1;
  else if (holds(ends, tally.procedure.truth(sample.process, path))) tally.held += 1;
};

const cellOf = ({ procedure, text, held, refused }: Tally, setting: Setting): CoverageCell => {
  const given = setting.replications - refused;
  const coverage = given === 0 ? 0 : Number((held / given).toFixed(4));
  return [procedure.name, setting.process, setting.count, text, coverage, setting.replications, refused];
};

/**
 * Counts how often intervals hold the truth, all of them on the same samples. The paths depend on the process, the count and
 * the replicate alone, so a cell comes out the same whenever, wherever and beside whichever others it is run.
 */
export const simulateCells = (
  procedures: readonly Procedure[],
  levels: readonly string[],
  setting: Setting,
): readonly CoverageCell[] => {
  const { process, count: returnCount, replications } = setting;
  const tallies = procedures.flatMap((procedure) =>
    levels.map((text): Tally => ({ procedure, text, level: readLevel(text), held: 0, refused: 0 })),
  );
  const root = createStreams(seedOf(`coverage ${process} ${returnCount}`));
  for (let replicate = 0; replicate < replications; replicate += 1) {
    const path = processes[process](root.stream(replicate), returnCount);
    const streams = { stream: (inner: number) => root.stream((replicate + 1) * block + inner) };
    const sample = { process, returns: path.returns, streams, replicates: resamplesAt(returnCount) };
    for (const tally of tallies) count(tally, sample, path);
  }
  return tallies.map((tally) => cellOf(tally, setting));
};

/** One cell of a table by itself. */
export const simulateCell = ({ procedure, level, ...setting }: Cell): CoverageCell => {
  const [cell] = simulateCells([procedure], [level], setting);
  if (cell === undefined) throw new Error('coverage: a cell without an interval');
  return cell;
};
