import type { Level } from '../../../../terms/level.ts';
import type { RandomStreams } from '../../../../terms/random.ts';
import { endRanks } from '../../../bootstrap/ranks.ts';
import { orderStatistic } from '../../../numerics/quantile.ts';
import type { Interval, TailNote } from '../../tailFigures.ts';
import type { PathSource } from './pathSource.ts';
import type { SimulatedFigures } from './simulatedFigures.ts';

export const parameterDraws = 200;
export const pathsPerDraw = 5_000;
/** A draw that cannot be fitted is replaced; when as many failed as were wanted there is no interval. */
const mostTriesPerDraw = 2;
/** Days up to which the draws take a second or two. */
export const mostDaysForInterval = 60;
/** Streams 0 to 2^20 − 1 belong to paths; each draw of parameters has its own beyond them. */
const firstParameterStream = 2 ** 20;

export type DrawnIntervals = {
  readonly var: Interval | null;
  readonly es: Interval | null;
  readonly notes: readonly TailNote[];
};

export type DrawQuestion = {
  readonly redraw: (random: ReturnType<RandomStreams['stream']>) => PathSource | null;
  /** The figures of the first `pathsPerDraw` paths of a source. */
  readonly figuresOf: (paths: PathSource) => SimulatedFigures;
  /** The figures of all paths less those of the first ones, under the fitted parameters. */
  readonly shift: SimulatedFigures;
  readonly horizonDays: number;
  readonly confidence: Level;
  readonly streams: RandomStreams;
};

const without = (code: TailNote['code'], text: string): DrawnIntervals => ({
  var: null,
  es: null,
  notes: [{ figure: 'varInterval', code, text, needs: null }],
});

/**
 * Percentile ends of the figures under drawn parameters. Every draw meets the same random numbers as the fitted
 * parameters did in their first paths, so the chance of the simulation is the same in all of them and `shift` takes it out.
 */
export const drawnIntervals = (question: DrawQuestion): DrawnIntervals => {
  const { redraw, figuresOf, shift, horizonDays, confidence, streams } = question;
  if (horizonDays > mostDaysForInterval) {
    const text = `An interval is drawn for horizons of up to ${mostDaysForInterval} days, and ${horizonDays} were asked.`;
    return without('horizonTooLong', text);
  }
  const ranks = endRanks(confidence, 'both', parameterDraws);
  if (!ranks.ok) return without('levelBeyondResamples', ranks.problem.message);
  const vars = new Float64Array(parameterDraws);
  const shortfalls = new Float64Array(parameterDraws);
  let seen = 0;
  let tries = 0;
  while (seen < parameterDraws && tries < mostTriesPerDraw * parameterDraws) {
    const paths = redraw(streams.stream(firstParameterStream + tries));
    tries += 1;
    if (paths === null) continue;
    const figures = figuresOf(paths);
    vars[seen] = figures.var + shift.var;
    shortfalls[seen] = figures.es + shift.es;
    seen += 1;
  }
  if (seen < parameterDraws)
    return without(
      'resamplesLeftOut',
      `${tries - seen} of ${tries} draws of the parameters could not be fitted.`,
    );
  const ends = (sorted: Float64Array): Interval => ({
    lower: orderStatistic(sorted, ranks.value.lower),
    upper: orderStatistic(sorted, ranks.value.upper),
  });
  return { var: ends(vars.sort()), es: ends(shortfalls.sort()), notes: [] };
};
