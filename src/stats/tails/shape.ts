import type { Level } from '../../terms/level.ts';
import { tailFraction } from '../../terms/level.ts';
import type { RandomStreams } from '../../terms/random.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { chiSquareUpperQuantile, chiSquareUpperTail } from '../distributions/chiSquare.ts';
import { normalUpperTail } from '../distributions/normal.ts';
import { studentTUpperTail } from '../distributions/studentT.ts';
import { jarqueBera } from '../moments/jarqueBera.ts';
import { type Shape, shapeOf } from '../moments/shape.ts';
import { type ReturnSummary, summariseReturns } from '../moments/summary.ts';
import { leastCounts } from '../returns/leastCounts.ts';
import { normalShapeOf, normalShapeProbabilities } from './internal/normalShape.ts';
import { studentDistance, studentDistanceProbability } from './internal/studentDistance.ts';
import { inverseNuEnds } from './internal/studentProfiles.ts';
import { maximiseStudent, type StudentFit } from './studentFit.ts';
import { fitNotes, nuIntervalOf } from './studentNu.ts';
import type { Interval, TailNote } from './tailFigures.ts';

/** How many times as often as under the bell curve a return falls below mean − deviations·s. */
export type TailMultiple = { readonly deviations: number; readonly multiple: number };

export type StudentShape = {
  readonly fit: StudentFit;
  readonly nuInterval: Interval;
  readonly andersonDarling: number;
  readonly andersonDarlingP: number;
  readonly likelihoodRatio: number;
  readonly likelihoodRatioP: number;
  readonly tailMultiples: readonly TailMultiple[];
  readonly notes: readonly TailNote[];
};

export type ShapeFigures = Shape & {
  readonly returnCount: number;
  readonly jarqueBera: number;
  readonly jarqueBeraP: number;
  /** Null from 500 returns up, where the chi-square p is good enough. */
  readonly jarqueBeraSimulatedP: number | null;
  readonly andersonDarlingNormal: number;
  readonly andersonDarlingNormalP: number;
  /** The Student part may be refused on its own. */
  readonly student: Result<StudentShape>;
};

export type ShapeInput = {
  readonly returns: Float64Array;
  readonly confidence: Level;
  readonly streams: RandomStreams;
};

const simulateJarqueBeraBelow = 500;
const multiplesAt = [3, 4, 5] as const;

const tailMultiples = (fit: StudentFit, { mean, sampleStandardDeviation }: ReturnSummary): TailMultiple[] =>
  multiplesAt.map((deviations) => {
    const scales = (fit.location - mean + deviations * sampleStandardDeviation) / fit.scale;
    return { deviations, multiple: studentTUpperTail(scales, fit.nu) / normalUpperTail(deviations) };
  });

/** Half of the chi-square(1) tail, because nu = infinity lies on the edge of the model; 1 where nothing is gained. */
const likelihoodRatioProbability = (ratio: number): number =>
  ratio > 0 ? chiSquareUpperTail(ratio, 1) / 2 : 1;

const leftOutNote = (leftOut: number): readonly TailNote[] =>
  leftOut === 0
    ? []
    : [
        {
          figure: 'parameters',
          code: 'resamplesLeftOut',
          text: `${leftOut} simulated samples could not be refitted and do not count in the Anderson-Darling p.`,
          needs: null,
        },
      ];

const studentShape = (
  { returns, confidence, streams }: ShapeInput,
  summary: ReturnSummary,
): Result<StudentShape> => {
  const fitted = maximiseStudent(returns);
  if (!fitted.ok) return fitted;
  const { fit } = fitted.value;
  const reach = Math.sqrt(chiSquareUpperQuantile(tailFraction(confidence), 1));
  const inverseNu = inverseNuEnds(fitted.value, reach);
  const distance = studentDistance(returns, fit);
  const { p, leftOut } = studentDistanceProbability(distance, returns.length, fit.nu, streams);
  const likelihoodRatio = Math.max(0, 2 * (fit.logLikelihood - fit.normalLogLikelihood));
  return succeed({
    fit,
    nuInterval: nuIntervalOf(inverseNu),
    andersonDarling: distance,
    andersonDarlingP: p,
    likelihoodRatio,
    likelihoodRatioP: likelihoodRatioProbability(likelihoodRatio),
    tailMultiples: tailMultiples(fit, summary),
    notes: [...fitNotes(fit, inverseNu), ...leftOutNote(leftOut)],
  });
};

/**
 * How fat are the tails, against the bell curve and against a fitted Student t?
 * Convention: g1 and g2 with divisor n; Jarque & Bera with the chi-square(2) p and, below 500 returns, a simulated one;
 * Anderson & Darling against the normal fitted by mean and s (n − 1) and against the fitted t, both p by parametric
 * bootstrap with refitting, B = 999, p = (1 + #{A* ≥ A})/(B + 1); likelihood ratio of t against normal with
 * p = ½·P(χ²(1) ≥ LR); tail multiples P_t(r < mean − k·s)/Φ(−k) for k = 3, 4, 5.
 * Domain: at least 20 finite returns that differ; the Student part may be refused on its own (see fitStudent).
 * Units: returns as decimal fractions in; p in 0..1; statistics and multiples are plain numbers.
 * Edges: where the normal distribution is the best t the likelihood ratio is 0 with p = 1. p is never 0 by simulation.
 * Source: Jarque & Bera 1987, International Statistical Review 55, 163-172; Anderson & Darling 1954, JASA 49, 765-769;
 * Self & Liang 1987, JASA 82, 605-610, case 5.
 * Example: daily returns of a share index fall five deviations below their mean thousands of times as often.
 */
export const shape = (input: ShapeInput): Result<ShapeFigures> => {
  const { returns, streams } = input;
  const summarised = summariseReturns(returns, leastCounts.studentTail, 'The shape of the tails');
  if (!summarised.ok) return summarised;
  const observed = normalShapeOf(returns);
  const simulated = normalShapeProbabilities(observed, returns.length, streams);
  const { statistic, p } = jarqueBera(returns);
  return succeed({
    ...shapeOf(returns),
    returnCount: returns.length,
    jarqueBera: statistic,
    jarqueBeraP: p,
    jarqueBeraSimulatedP: returns.length < simulateJarqueBeraBelow ? simulated.jarqueBera : null,
    andersonDarlingNormal: observed.andersonDarling,
    andersonDarlingNormalP: simulated.andersonDarling,
    student: studentShape(input, summarised.value),
  });
};
