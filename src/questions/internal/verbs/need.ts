import { levelText } from '../../../terms/level.ts';
import { limits } from '../../limits.ts';
import type { NeedQuestion } from '../../question.ts';
import { attained, faulty } from '../faults/fault.ts';
import { allOf, firstOf } from '../pieces/piece.ts';
import { settleSize } from './settle.ts';
import { checkedSize } from './sizeRange.ts';
import { createTaking, takeLevel, takeSample } from './taking.ts';
import { faultAtPiece, ofEachTicker, type VerbReader } from './verbReader.ts';

export const need: VerbReader = {
  verb: 'need',
  takes: new Set(['ticker', 'size', 'annual', 'window', 'level', 'power', 'log', 'wish']),
  tickers: { least: 1, most: limits.tickersPerQuestion },
  settle: settleSize,
  read: (line) => {
    const { pieces, context } = line;
    const size = checkedSize(line);
    if (!size.ok) return size;
    const [placed] = allOf(pieces, 'size');
    if (placed !== undefined && size.value.fraction <= 0) {
      const text = line.words[placed.first]?.text.replace(/^-/, '') ?? '';
      const says = 'is not a distance from the mean. Give a size above 0.';
      return faulty(faultAtPiece(line, placed, { code: 'sizeOutside', says, instead: [text, '5bp'] }));
    }
    const taking = createTaking();
    const { window, level, power } = context.defaults.need;
    const question: Omit<NeedQuestion, 'ticker'> = {
      verb: 'need',
      size: size.value,
      ...takeSample(taking, pieces, window),
      level: takeLevel(taking, pieces, level),
      power: taking.orDefault(firstOf(pieces, 'power')?.level ?? null, power, `power ${levelText(power)}`),
    };
    return attained(ofEachTicker(line, taking.assumed, (ticker) => ({ ...question, ticker })));
  },
};
