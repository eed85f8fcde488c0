import type { CoveredInterval } from '../../src/stats/coverage/cell.ts';
import { sampleStandardDeviation } from '../../src/stats/moments/deviation.ts';
import { arithmeticMean } from '../../src/stats/moments/mean.ts';
import { historicalTail } from '../../src/stats/tails/historicalTail.ts';
import { normalTail } from '../../src/stats/tails/normalTail.ts';
import { studentTail } from '../../src/stats/tails/studentTail.ts';
import type { TailFigures, TailInput, TailModelName } from '../../src/stats/tails/tailFigures.ts';
import { type Level, levelFromFraction } from '../../src/terms/level.ts';
import { type Result, valueOrNull } from '../../src/terms/result.ts';
import type { Ends, Procedure, Sample } from './simulate.ts';
import { trueTail } from './tailTruth.ts';

export const tailLevels = ['0.95', '0.975', '0.99'] as const;

const readLevel = (text: string): Level => {
  const level = levelFromFraction(text);
  if (level === null) throw new RangeError(`coverage: ${text} is not a level`);
  return level;
};

type Model = (input: TailInput) => Result<TailFigures<TailModelName, unknown>>;

/** The fewest resamples whose outer ranks reach 95%, for figures that no bootstrap touches. */
const fewest = 39;

const tailProcedure = (
  name: CoveredInterval,
  model: Model,
  figure: 'var' | 'es',
  text: string,
  replicatesOf: (sample: Sample) => number,
): Procedure => {
  const tailLevel = readLevel(text);
  return {
    name,
    ends: (sample): Ends | null => {
      const { returns, level: confidence, streams } = sample;
      const replicates = replicatesOf(sample);
      const figures = valueOrNull(model({ returns, tailLevel, confidence, streams, replicates }));
      return figures === null ? null : figure === 'var' ? figures.varInterval : figures.esInterval;
    },
    truth: (process) => trueTail(figure, process, tailLevel),
  };
};

/** VaR and ES of a model at every tail level; `esReplicates` are the resamples for its ES. */
export const tailProcedures = (
  model: TailModelName,
  of: Model,
  esReplicates: (sample: Sample) => number,
): readonly Procedure[] =>
  tailLevels.flatMap((text) => [
    tailProcedure(`tail.${model}.var.${text}`, of, 'var', text, () => fewest),
    tailProcedure(`tail.${model}.es.${text}`, of, 'es', text, esReplicates),
  ]);

/**
 * Both normal intervals end a fixed number of sample deviations from the mean, fixed by the count of returns alone, so
 * one sample shows the numbers for all: exactly for VaR, and for ES from more resamples than the model makes by itself.
 */
const normalProcedure = (name: CoveredInterval, figure: 'var' | 'es', text: string): Procedure => {
  const inDeviations = new Map<number, Ends>();
  const measured = tailProcedure(name, normalTail, figure, text, () => 9_999);
  const deviationsOf = (sample: Sample, mean: number, deviation: number): Ends | null => {
    const ends = measured.ends(sample);
    if (ends === null || ends.lower === null || ends.upper === null) return null;
    return { lower: (ends.lower + mean) / deviation, upper: (ends.upper + mean) / deviation };
  };
  return {
    ...measured,
    ends: (sample) => {
      const mean = arithmeticMean(sample.returns);
      const deviation = sampleStandardDeviation(sample.returns);
      const known = inDeviations.get(sample.returns.length) ?? deviationsOf(sample, mean, deviation);
      if (known === null || known.lower === null || known.upper === null) return null;
      inDeviations.set(sample.returns.length, known);
      return { lower: deviation * known.lower - mean, upper: deviation * known.upper - mean };
    },
  };
};

export const historicalProcedures = tailProcedures(
  'historical',
  historicalTail,
  ({ replicates }) => replicates,
);
export const studentProcedures = tailProcedures(
  'student',
  (input) => studentTail(input),
  () => fewest,
);
export const normalProcedures = tailLevels.flatMap((text) => [
  normalProcedure(`tail.normal.var.${text}`, 'var', text),
  normalProcedure(`tail.normal.es.${text}`, 'es', text),
]);

/** nu of the two independent processes: infinity for the normal one. */
export const nuProcedure: Procedure = {
  name: 'tail.student.nu',
  ends: ({ returns, level: confidence, streams }) => {
    const figures = valueOrNull(studentTail({ returns, tailLevel: readLevel('0.99'), confidence, streams }));
    return figures === null ? null : figures.parameters.nuInterval;
  },
  truth: (process) => (process === 'normal' ? Number.POSITIVE_INFINITY : 4),
};
