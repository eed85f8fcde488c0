import { expectedBeyond, type Level } from '../../terms/level.ts';
import type { Problem } from '../../terms/problem.ts';
import type { RandomStreams } from '../../terms/random.ts';
import type { TailModelName } from '../tails/tailFigures.ts';
import { coverageTest, exactCoverageP, type LikelihoodRatio } from './coverage.ts';
import { exactIndependenceP } from './exactIndependence.ts';
import { conditionalCoverageTest, independenceTest } from './independence.ts';
import type { Standing } from './league.ts';
import { type DrawBeyond, type JudgedDays, shortfallZ2, simulatedShortfallP } from './shortfall.ts';
import { type TrafficLight, trafficLight } from './trafficLight.ts';
import { transitionsOf } from './transitions.ts';

/** A model's forecasts over the days on which it gave any. */
export type ModelDays = JudgedDays & {
  /** Indices into the returns, ascending. */
  readonly days: Int32Array;
};

/** What the days say about one model. Counts are of the days on which it gave a figure; chances lie in 0..1. */
export type ModelVerdict = {
  readonly model: TailModelName;
  readonly ok: true;
  readonly forecasts: ModelDays;
  readonly exceedances: number;
  readonly expected: number;
  /** Indices into the returns. */
  readonly exceedanceDays: readonly number[];
  readonly coverage: LikelihoodRatio;
  readonly binomialP: number;
  readonly independence: LikelihoodRatio;
  /** null: no exceedance, or nothing else; there is nothing to test. */
  readonly independenceExactP: number | null;
  readonly conditional: LikelihoodRatio;
  readonly trafficLight: TrafficLight | null;
  readonly shortfallZ2: number | null;
  readonly shortfallP: number | null;
  /** Over the days on which every model gave a figure; null where there is none. */
  readonly standing: Standing | null;
  /** Days left out because the model gave no figure, and why on the first of them. */
  readonly refusedDays: number;
  readonly firstRefusal: Problem | null;
};

export type JudgedAlone = Omit<ModelVerdict, 'model' | 'ok' | 'standing' | 'refusedDays' | 'firstRefusal'>;

/** Exceedance: the loss is strictly larger than the VaR. */
const hitsOf = ({ losses, valuesAtRisk }: JudgedDays): Uint8Array =>
  Uint8Array.from(losses, (loss, day) => (loss > (valuesAtRisk[day] as number) ? 1 : 0));

/** All that can be said of a model without the others. */
export const judgeModel = (
  forecasts: ModelDays,
  tailLevel: Level,
  drawBeyond: DrawBeyond,
  streams: RandomStreams,
  replicates: number,
): JudgedAlone => {
  const hits = hitsOf(forecasts);
  const exceedanceDays = [...forecasts.days].filter((_, place) => hits[place] === 1);
  const exceedances = exceedanceDays.length;
  const count = hits.length;
  const transitions = transitionsOf(hits);
  const coverage = coverageTest(exceedances, count, tailLevel);
  const independence = independenceTest(transitions);
  const z2 = shortfallZ2(forecasts, tailLevel);
  return {
    forecasts,
    exceedances,
    expected: expectedBeyond(count, tailLevel),
    exceedanceDays,
    coverage,
    binomialP: exactCoverageP(exceedances, count, tailLevel),
    independence,
    independenceExactP: exactIndependenceP(exceedances, count, transitions),
    conditional: conditionalCoverageTest(coverage, independence),
    trafficLight: trafficLight(exceedances, count, tailLevel),
    shortfallZ2: z2,
    shortfallP:
      z2 === null
        ? null
        : simulatedShortfallP(z2, forecasts.expectedShortfalls, tailLevel, drawBeyond, streams, replicates),
  };
};
