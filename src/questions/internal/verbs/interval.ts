import { limits } from '../../limits.ts';
import type { IntervalQuestion } from '../../question.ts';
import { attained, faulty } from '../faults/fault.ts';
import { firstOf, has } from '../pieces/piece.ts';
import { robustRatio } from './robustRatio.ts';
import { settleLevels } from './settle.ts';
import { createTaking, takeLevel, takeSample } from './taking.ts';
import { ofEachTicker, type VerbLine, type VerbReader } from './verbReader.ts';

const common = (
  line: VerbLine,
  taking: ReturnType<typeof createTaking>,
): Omit<IntervalQuestion, 'ticker'> => {
  const { pieces, context } = line;
  const { window, level } = context.defaults.interval;
  return {
    verb: 'interval',
    of: firstOf(pieces, 'of')?.of ?? 'mean',
    ...takeSample(taking, pieces, window),
    level: takeLevel(taking, pieces, level),
    side: firstOf(pieces, 'side')?.side ?? 'both',
    robust: has(pieces, 'robust'),
    annual: has(pieces, 'annual'),
  };
};

export const interval: VerbReader = {
  verb: 'interval',
  takes: new Set(['ticker', 'of', 'window', 'level', 'side', 'robust', 'annual', 'log', 'wish']),
  tickers: { least: 1, most: limits.tickersPerQuestion },
  settle: settleLevels,
  read: (line) => {
    const taking = createTaking();
    const question = common(line, taking);
    const refused = robustRatio(line);
    if (refused !== null) return faulty(refused);
    return attained(ofEachTicker(line, taking.assumed, (ticker) => ({ ...question, ticker })));
  },
};
