import type { CoveredInterval } from '../../src/stats/coverage/cell.ts';
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

/** The pivot of the normal ES does not depend on the data, so its resamples matter little to the coverage. */
const resamplesOfPivot = 199;

export const historicalProcedures = tailProcedures(
  'historical',
  historicalTail,
  ({ replicates }) => replicates,
);
export const normalProcedures = tailProcedures('normal', normalTail, () => resamplesOfPivot);
export const studentProcedures = tailProcedures(
  'student',
  (input) => studentTail(input),
  () => fewest,
);

/** nu of the two independent processes: infinity for the normal one. */
export const nuProcedure: Procedure = {
  name: 'tail.student.nu',
  ends: ({ returns, level: confidence, streams }) => {
    const figures = valueOrNull(studentTail({ returns, tailLevel: readLevel('0.99'), confidence, streams }));
    return figures === null ? null : figures.parameters.nuInterval;
  },
  truth: (process) => (process === 'normal' ? Number.POSITIVE_INFINITY : 4),
};
