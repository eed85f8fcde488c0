import { limits } from '../../limits.ts';
import type { BacktestQuestion } from '../../question.ts';
import { attained } from '../faults/fault.ts';
import { firstOf } from '../pieces/piece.ts';
import { settleLevels } from './settle.ts';
import { takeTailLevel } from './tailLevel.ts';
import { createTaking, takeSample } from './taking.ts';
import { ofEachTicker, type VerbReader } from './verbReader.ts';

export const backtest: VerbReader = {
  verb: 'backtest',
  takes: new Set(['ticker', 'window', 'level', 'estimation', 'model', 'log', 'wish']),
  tickers: { least: 1, most: limits.tickersPerQuestion },
  settle: settleLevels,
  read: (line) => {
    const { pieces, context } = line;
    const { window, level, estimationReturns } = context.defaults.backtest;
    const taking = createTaking();
    const sample = takeSample(taking, pieces, window);
    const tailLevel = takeTailLevel(taking, line, level);
    if (!tailLevel.ok) return tailLevel;
    const asked = firstOf(pieces, 'estimation')?.returns ?? null;
    const question: Omit<BacktestQuestion, 'ticker'> = {
      verb: 'backtest',
      ...sample,
      tailLevel: tailLevel.value,
      estimationReturns: taking.orDefault(asked, estimationReturns, `on window ${estimationReturns}d`),
      model: firstOf(pieces, 'model')?.model ?? null,
    };
    return attained(ofEachTicker(line, taking.assumed, (ticker) => ({ ...question, ticker })));
  },
};
