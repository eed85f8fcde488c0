import { tailFraction } from '../../../terms/level.ts';
import { type Result, succeed } from '../../../terms/result.ts';
import { chiSquareUpperQuantile } from '../../distributions/chiSquare.ts';
import type { ProfileEnd } from '../internal/profileEnd.ts';
import { notFoundNote } from '../studentNu.ts';
import type { Interval, TailFigures, TailInput, TailNote } from '../tailFigures.ts';
import { quantileBeyond, shortfallBeyond } from './internal/gpdTail.ts';
import { lowerEndByRank } from './internal/lowerByRank.ts';
import { maximisePeaks, type PeaksMaximum } from './internal/peaksMaximum.ts';
import { type PeaksEnds, quantileEnds, shapeEnds, shortfallEnds } from './internal/peaksProfiles.ts';

/** Threshold and scale as losses in decimal fractions; shape is xi. */
export type PeaksTailParameters = {
  readonly threshold: number;
  /** Losses strictly larger than the threshold. */
  readonly exceedances: number;
  readonly shape: number;
  readonly shapeInterval: Interval;
  readonly scale: number;
};

export type PeaksTailFigures = TailFigures<'peaks', PeaksTailParameters>;

type Shortfall = {
  readonly es: number | null;
  readonly esInterval: Interval | null;
  readonly notes: readonly TailNote[];
};

const note = (figure: TailNote['figure'], code: TailNote['code'], text: string): TailNote => ({
  figure,
  code,
  text,
  needs: null,
});

const lossAt = ({ peaks, gpd }: PeaksMaximum, distance: number): number =>
  peaks.threshold + gpd.unit * distance;

const endAt = (maximum: PeaksMaximum, end: ProfileEnd): number | null =>
  end.kind === 'end' ? lossAt(maximum, end.figure) : null;

const shapeAt = (end: ProfileEnd): number | null => (end.kind === 'end' ? end.figure : null);

/** xi = 1, where the mean of the tail stops to exist, lies inside the interval of xi or cannot be ruled out. */
const reachesOne = ({ upper }: PeaksEnds): boolean => upper.kind !== 'end' || upper.figure >= 1;

const varInterval = (maximum: PeaksMaximum, reach: number, tail: number, ends: PeaksEnds): Interval => {
  const { losses } = maximum.peaks;
  const lower =
    ends.lower.kind === 'bound'
      ? lowerEndByRank(losses, maximum.beyond, tail, reach)
      : endAt(maximum, ends.lower);
  return { lower, upper: endAt(maximum, ends.upper) };
};

const shortfallOf = (
  maximum: PeaksMaximum,
  reach: number,
  tail: number,
  depth: number,
  shape: PeaksEnds,
): Shortfall => {
  const { fit } = maximum.gpd;
  if (fit.shape >= 1) {
    const text =
      'xi is at or above 1: the fitted tail is so heavy that the mean loss beyond VaR does not exist. Read VaR alone.';
    return { es: null, esInterval: null, notes: [note('es', 'meanNotFinite', text)] };
  }
  const bounded = !reachesOne(shape);
  const ends = shortfallEnds(maximum, reach, tail, bounded);
  const open =
    'The interval of xi reaches 1, where ES does not exist: nothing bounds ES from above. Ask for a longer window.';
  return {
    es: maximum.peaks.threshold + fit.scale * shortfallBeyond(fit.shape, depth),
    esInterval: { lower: endAt(maximum, ends.lower), upper: endAt(maximum, ends.upper) },
    notes: [
      ...notFoundNote('esInterval', ends),
      ...(bounded ? [] : [note('esInterval', 'upperEndUnbounded', open)]),
    ],
  };
};

const shapeNotes = (ends: PeaksEnds): readonly TailNote[] => [
  ...notFoundNote('parameters', ends),
  ...(ends.lower.kind === 'bound'
    ? [
        note(
          'parameters',
          'lowerEndUnbounded',
          'No xi above −0.95 is unlikely enough to bound xi from below.',
        ),
      ]
    : []),
  ...(ends.upper.kind === 'bound'
    ? [note('parameters', 'upperEndUnbounded', 'No xi below 5 is unlikely enough to bound xi from above.')]
    : []),
];

/**
 * How large is the loss that one day in so many exceeds, and the mean loss beyond it, judged by the largest losses alone?
 * Convention: threshold u = l(n − k), k = ⌊n/10⌋, losses ascending; of the losses strictly larger than u, ζ their share, the excesses
 * follow a generalised Pareto distribution fitted by maximum likelihood. VaR = u + (β/xi)·[((1−a)/ζ)^(−xi) − 1], at xi = 0 u − β·ln((1−a)/ζ);
 * ES = (VaR + β − xi·u)/(1 − xi). Intervals of VaR, ES and xi by profile likelihood, chi-square(1), of the Pareto likelihood
 * times the binomial one of the count beyond u.
 * Domain: at least 250 finite returns that differ, 25 losses larger than u, a > 1 − ζ.
 * Units: returns as decimal fractions in; losses as positive decimal fractions out; xi has none.
 * Edges: refused where xi ends on −0.5 or 1.5. ES is null at xi ≥ 1 and has no upper end where the interval of xi reaches 1.
 * A lower end of VaR below u is an order statistic, by the binomial likelihood ratio. Returns are taken as independent.
 * Source: McNeil & Frey 2000, Journal of Empirical Finance 7, 271-300; Smith 1987, Annals of Statistics 15, 1174-1207;
 * profile likelihood: Venzon & Moolgavkar 1988, Applied Statistics 37, 87-94.
 * Example: the 109 of 2,167 Danish fire losses above 10 million kroner give VaR 27.3 and ES 58.2 million at 99%.
 */
export const peaksTail = (input: TailInput): Result<PeaksTailFigures> => {
  const fitted = maximisePeaks(input.returns, input.tailLevel);
  if (!fitted.ok) return fitted;
  const maximum = fitted.value;
  const { peaks, gpd, beyond, count } = maximum;
  const tail = tailFraction(input.tailLevel);
  const depth = Math.log(beyond / count / tail);
  const reach = Math.sqrt(chiSquareUpperQuantile(tailFraction(input.confidence), 1));
  const shape = shapeEnds(maximum, reach);
  const quantile = quantileEnds(maximum, reach, tail);
  const shortfall = shortfallOf(maximum, reach, tail, depth, shape);
  return succeed({
    model: 'peaks',
    target: 'unconditional',
    var: peaks.threshold + gpd.fit.scale * quantileBeyond(gpd.fit.shape, depth),
    varInterval: varInterval(maximum, reach, tail, quantile),
    varIntervalMethod: 'profileLikelihood',
    varAttainedLevel: null,
    es: shortfall.es,
    esInterval: shortfall.esInterval,
    esIntervalMethod: shortfall.esInterval === null ? null : 'profileLikelihood',
    parameters: {
      threshold: peaks.threshold,
      exceedances: beyond,
      shape: gpd.fit.shape,
      shapeInterval: { lower: shapeAt(shape.lower), upper: shapeAt(shape.upper) },
      scale: gpd.fit.scale,
    },
    notes: [...shapeNotes(shape), ...notFoundNote('varInterval', quantile), ...shortfall.notes],
  });
};
