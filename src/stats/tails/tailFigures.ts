import type { Level } from '../../terms/level.ts';
import type { RandomStreams } from '../../terms/random.ts';

/** The five ways a tail figure is made. */
export type TailModelName = 'historical' | 'normal' | 'student' | 'filtered' | 'peaks';

/**
 * What a figure speaks of: the long-run (stationary) distribution of daily returns, or the distribution of the next
 * day's return given the volatility reached at the end of the window.
 */
export type TailTarget = 'unconditional' | 'nextDay';

/**
 * Both ends of an interval, lower ≤ upper. An end is null where the data cannot bound it (the reason stands in the
 * notes), and Infinity only for a degrees-of-freedom parameter whose normal limit lies inside.
 */
export type Interval = { readonly lower: number | null; readonly upper: number | null };

/** How an interval was made; each name is one procedure of the field. */
export type IntervalMethod =
  | 'orderStatistics'
  | 'noncentralT'
  | 'clopperPearson'
  | 'profileLikelihood'
  | 'percentileBootstrap'
  | 'residualBootstrap'
  | 'parameterDraws';

/** Why a figure is null, one-sided or to be read with care; `needs` is the count of returns that would be enough. */
export type TailNote = {
  readonly figure: TailFigureName;
  readonly code: TailNoteCode;
  readonly text: string;
  readonly needs: number | null;
};

export type TailFigureName =
  | 'var'
  | 'varInterval'
  | 'es'
  | 'esInterval'
  | 'parameters'
  | 'probability'
  | 'interval';

/** The closed list of reasons, each with its meaning. */
export const tailNoteCodes = {
  upperEndUnbounded: 'no rank bounds the figure from above at this count of returns',
  lowerEndUnbounded: 'no rank or parameter value bounds the figure from below',
  levelBeyondResamples: 'a confidence level that the resamples are too few to reach',
  tooFewBeyond: 'too few returns beyond the level for an interval of the mean beyond it',
  meanNotFinite: 'the fitted tail is so heavy that the mean loss beyond the level does not exist',
  varianceMayNotBeFinite: 'degrees of freedom of 2 or less are not ruled out',
  normalLimit: 'the fit is the normal distribution, the limit of infinite degrees of freedom',
  parameterOnBound: 'a parameter lies on the edge of its range and was held there',
  noClustering: 'no volatility clustering was found',
  profileNotConverged: 'an interval search did not reach its stopping rule',
  resamplesLeftOut: 'some resamples could not be refitted and were left out',
  horizonTooLong: 'a horizon over which the draws of an interval would take too long',
  exactInterval: 'the interval is the exact one named in its text',
} as const;

export type TailNoteCode = keyof typeof tailNoteCodes;

/** What every tail model is asked. Returns are decimal fractions in date order; for a short position negate them. */
export type TailInput = {
  readonly returns: Float64Array;
  readonly tailLevel: Level;
  readonly confidence: Level;
  readonly streams: RandomStreams;
  /** Resamples of a bootstrap, where the model's own number is not wanted. */
  readonly replicates?: number;
};

/**
 * One model's tail figures. VaR and ES are losses as positive decimal fractions (a negative figure is a gain), at the
 * tail level; intervals hold at the confidence level. `es` is null where the model's mean beyond the level does not exist.
 */
export type TailFigures<Model extends TailModelName, Parameters> = {
  readonly model: Model;
  readonly target: TailTarget;
  readonly var: number;
  readonly varInterval: Interval | null;
  readonly varIntervalMethod: IntervalMethod | null;
  /** The coverage that a rank interval reaches exactly, at least the confidence level; null for every other method. */
  readonly varAttainedLevel: number | null;
  readonly es: number | null;
  readonly esInterval: Interval | null;
  readonly esIntervalMethod: IntervalMethod | null;
  readonly parameters: Parameters;
  readonly notes: readonly TailNote[];
};

/** What every model is asked about a loss size; `threshold` is a loss as a positive decimal fraction. */
export type BeyondInput = {
  readonly returns: Float64Array;
  readonly threshold: number;
  readonly confidence: Level;
  readonly streams: RandomStreams;
};

/** One model's chance of a daily loss of at least the threshold. */
export type BeyondFigures = {
  readonly model: TailModelName;
  readonly target: TailTarget;
  readonly probability: number;
  readonly interval: Interval | null;
  readonly intervalMethod: IntervalMethod | null;
  /** Expected once in so many sessions, 1/probability; null where the probability is 0. */
  readonly meanReturnSessions: number | null;
  readonly notes: readonly TailNote[];
};
