import type { CoverageProcess } from '../../src/stats/coverage/cell.ts';
import { quantileMultiplier, shortfallMultiplier } from '../../src/stats/losses/studentMultiplier.ts';
import { filteredKinds } from '../../src/stats/tails/filtered/filteredKinds.ts';
import {
  type FilterSource,
  type FilterState,
  filterSource,
} from '../../src/stats/tails/filtered/internal/filterSource.ts';
import { resampledFigures } from '../../src/stats/tails/filtered/internal/resampledFigures.ts';
import { refuseTooFewForLevel } from '../../src/stats/tails/historicalTail.ts';
import { type Level, tailFraction } from '../../src/terms/level.ts';
import type { Random } from '../../src/terms/random.ts';
import { level } from '../stats/levels.ts';
import { garch, type Path, trueDeviation, trueMean } from './processes.ts';
import { remembered } from './remembered.ts';
import type { Ends, Procedure, Sample } from './simulate.ts';
import { tailLevels } from './tailProcedures.ts';
import { trueTail } from './tailTruth.ts';

type EndsByFigure = ReadonlyMap<string, Ends | null>;

const keyOf = (figure: 'var' | 'es', text: string): string => `${figure}.${text}`;

/** The residuals of a resample are overwritten by the next one. */
const kept = (state: FilterState | null): FilterState | null =>
  state === null ? null : { ...state, residuals: state.residuals.slice() };

/** The refits are the same at every tail level, so they are made once and read as often as levels ask. */
const withRememberedRefits = (source: FilterSource): { source: FilterSource; restart: () => void } => {
  const states: (FilterState | null)[] = [];
  let next = 0;
  const resample = (random: Random): FilterState | null => {
    if (next === states.length) states.push(kept(source.resample(random)));
    next += 1;
    return states[next - 1] ?? null;
  };
  return {
    source: { ...source, resample },
    restart: () => {
      next = 0;
    },
  };
};

/** Both intervals at every level, as filteredTail gives them. */
const allEnds = ({ returns, level: confidence, streams, replicates }: Sample): EndsByFigure => {
  const ends = new Map<string, Ends | null>();
  const found = filterSource(returns, filteredKinds(returns.length)[0]);
  if (!found.ok) return ends;
  const { source, restart } = withRememberedRefits(found.value);
  for (const text of tailLevels) {
    const tailLevel = level(text);
    if (refuseTooFewForLevel(returns.length, tailLevel, 'A filtered tail figure') !== null) continue;
    restart();
    const figures = resampledFigures(source, { returns, tailLevel, confidence, streams, replicates });
    ends.set(keyOf('var', text), figures.varInterval);
    ends.set(keyOf('es', text), figures.esInterval);
  }
  return ends;
};

/** All figures of a sample come from the same refits. */
const endsOf = remembered(allEnds);

/** The figure of an innovation with mean 0 and standard deviation 1. */
const unitFigure = (figure: 'var' | 'es', process: CoverageProcess, tailLevel: Level): number => {
  if (process !== 'garchT') return (trueTail(figure, process, tailLevel) + trueMean) / trueDeviation;
  const nu = garch.degreesOfFreedom;
  const multiplier = figure === 'var' ? quantileMultiplier : shortfallMultiplier;
  return multiplier(tailFraction(tailLevel), nu) * Math.sqrt((nu - 2) / nu);
};

/** The truth is the figure of the very next day, whose deviation the simulation knows. */
const nextDayTruth =
  (figure: 'var' | 'es', tailLevel: Level) =>
  (process: CoverageProcess, path: Path): number =>
    path.nextDeviation * unitFigure(figure, process, tailLevel) - trueMean;

export const filteredProcedures: readonly Procedure[] = tailLevels.flatMap((text) =>
  (['var', 'es'] as const).map(
    (figure): Procedure => ({
      name: `tail.filtered.${figure}.${text}`,
      ends: (sample) => endsOf(sample).get(keyOf(figure, text)) ?? null,
      truth: nextDayTruth(figure, level(text)),
    }),
  ),
);
