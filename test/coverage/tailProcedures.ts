import { sampleStandardDeviation } from '../../src/stats/moments/deviation.ts';
import { arithmeticMean } from '../../src/stats/moments/mean.ts';
import { historicalTail } from '../../src/stats/tails/historicalTail.ts';
import { normalTail } from '../../src/stats/tails/normalTail.ts';
import { studentTail } from '../../src/stats/tails/studentTail.ts';
import type { TailFigures, TailInput, TailModelName } from '../../src/stats/tails/tailFigures.ts';
import { type Level, levelFromFraction, levelText } from '../../src/terms/level.ts';
import { type Result, valueOrNull } from '../../src/terms/result.ts';
import { remembered } from './remembered.ts';
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

/** VaR and ES of a model at every tail level; `replicatesOf` are the resamples for its ES. */
export const tailProcedures = (
  model: TailModelName,
  of: Model,
  replicatesOf: (sample: Sample) => number,
): readonly Procedure[] =>
  tailLevels.flatMap((text) => {
    const tailLevel = readLevel(text);
    const figuresOf = remembered((sample) =>
      valueOrNull(of({ ...sample, confidence: sample.level, tailLevel, replicates: replicatesOf(sample) })),
    );
    return (['var', 'es'] as const).map(
      (figure): Procedure => ({
        name: `tail.${model}.${figure}.${text}`,
        ends: (sample) => figuresOf(sample)?.[`${figure}Interval`] ?? null,
        truth: (process) => trueTail(figure, process, tailLevel),
      }),
    );
  });

/**
 * Every normal interval ends a fixed number of sample deviations from the mean, fixed by the count of returns and the level
 * alone, so one sample shows the numbers for all.
 */
const inDeviations = (procedure: Procedure): Procedure => {
  const known = new Map<string, Ends | null>();
  const deviationsOf = (sample: Sample, mean: number, deviation: number): Ends | null => {
    const ends = procedure.ends(sample);
    if (ends === null || ends.lower === null || ends.upper === null) return null;
    return { lower: (ends.lower + mean) / deviation, upper: (ends.upper + mean) / deviation };
  };
  return {
    ...procedure,
    ends: (sample) => {
      const mean = arithmeticMean(sample.returns);
      const deviation = sampleStandardDeviation(sample.returns);
      const key = `${sample.returns.length} ${levelText(sample.level)}`;
      const ends = known.get(key) ?? deviationsOf(sample, mean, deviation);
      known.set(key, ends);
      if (ends === null || ends.lower === null || ends.upper === null) return null;
      return { lower: deviation * ends.lower - mean, upper: deviation * ends.upper - mean };
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
export const normalProcedures = tailProcedures('normal', normalTail, () => fewest).map(inDeviations);

/** nu of the two independent processes: infinity for the normal one. */
export const nuProcedure: Procedure = {
  name: 'tail.student.nu',
  ends: ({ returns, level: confidence, streams }) => {
    const figures = valueOrNull(studentTail({ returns, tailLevel: readLevel('0.99'), confidence, streams }));
    return figures === null ? null : figures.parameters.nuInterval;
  },
  truth: (process) => (process === 'normal' ? Number.POSITIVE_INFINITY : 4),
};
