import type { CoverageProcess } from '../../src/stats/coverage/cell.ts';
import { normalUpperTail } from '../../src/stats/distributions/normal.ts';
import { studentTUpperTail } from '../../src/stats/distributions/studentT.ts';
import { filteredBeyond } from '../../src/stats/tails/filtered/filteredBeyond.ts';
import { historicalBeyond } from '../../src/stats/tails/historicalBeyond.ts';
import { normalBeyond } from '../../src/stats/tails/normalBeyond.ts';
import { peaksBeyond } from '../../src/stats/tails/peaks/peaksBeyond.ts';
import { studentBeyond } from '../../src/stats/tails/studentBeyond.ts';
import type { BeyondFigures, BeyondInput, TailModelName } from '../../src/stats/tails/tailFigures.ts';
import { type Result, valueOrNull } from '../../src/terms/result.ts';
import { level } from '../stats/levels.ts';
import { garch, type Path, trueMean } from './processes.ts';
import type { Procedure } from './simulate.ts';
import { trueTail } from './tailTruth.ts';

/** The true chance of the loss that is asked after, in the long run: one day in 20, one in 100. */
const chances = { '0.05': '0.95', '0.01': '0.99' } as const;

/** Above this count the filter is a fit of its own for every resample. */
const mostForFilter = 499;

type Beyond = (input: BeyondInput) => Result<BeyondFigures>;

/** The chance that the next day's loss reaches a threshold, given how volatile the history has left the process. */
const nextDayChance = (process: CoverageProcess, path: Path, threshold: number): number => {
  const score = (threshold + trueMean) / path.nextDeviation;
  if (process === 'normal') return normalUpperTail(score);
  const nu = process === 'garchT' ? garch.degreesOfFreedom : 4;
  return studentTUpperTail(score * Math.sqrt(nu / (nu - 2)), nu);
};

const procedureOf = (
  model: TailModelName,
  of: Beyond,
  chance: keyof typeof chances,
  mostReturns: number,
): Procedure => {
  const tailLevel = level(chances[chance]);
  return {
    name: `beyond.${model}.${chance}`,
    ends: (sample) => {
      if (sample.returns.length > mostReturns) return null;
      const threshold = trueTail('var', sample.process, tailLevel);
      const found = valueOrNull(of({ ...sample, threshold, confidence: sample.level }));
      return found?.interval ?? null;
    },
    truth: (process, path) =>
      model === 'filtered'
        ? nextDayChance(process, path, trueTail('var', process, tailLevel))
        : Number(chance),
  };
};

const models: readonly (readonly [TailModelName, Beyond, number])[] = [
  ['historical', historicalBeyond, Infinity],
  ['normal', normalBeyond, Infinity],
  ['student', (input) => studentBeyond(input), Infinity],
  ['peaks', peaksBeyond, Infinity],
  ['filtered', (input) => filteredBeyond(input), mostForFilter],
];

/** A chance of a loss by every model, for the filter below 500 returns only. */
export const beyondProcedures: readonly Procedure[] = models.flatMap(([model, of, mostReturns]) =>
  (['0.05', '0.01'] as const).map((chance) => procedureOf(model, of, chance, mostReturns)),
);
