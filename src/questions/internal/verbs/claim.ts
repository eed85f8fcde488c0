import { limits } from '../../limits.ts';
import type { ClaimQuestion, Size } from '../../question.ts';
import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { allOf, firstOf, has } from '../pieces/piece.ts';
import { robustRatio } from './robustRatio.ts';
import { settleLevels, settleSize } from './settle.ts';
import { checkedSize } from './sizeRange.ts';
import { createTaking, takeLevel, takeSample } from './taking.ts';
import { faultAtPiece, missing, ofEachTicker, type VerbLine, type VerbReader } from './verbReader.ts';

const asRatio = (decimal: string): readonly string[] => [`ratio ${decimal}`];

/** With `ratio` the claim is a number without a unit, and a percentage is the level. */
const settle: VerbReader['settle'] = (line, pieces) => {
  if (firstOf(pieces, 'of')?.of !== 'ratio') return settleSize(line, pieces, asRatio);
  const numbers = allOf(pieces, 'number');
  const settled = settleLevels(
    line,
    pieces.filter(({ piece }) => piece.kind !== 'number'),
  );
  return settled.ok ? attained([...settled.value, ...numbers]) : settled;
};

const claimedRatio = (line: VerbLine): Attempt<Size> => {
  const [size] = allOf(line.pieces, 'size');
  if (size !== undefined) {
    const says = 'is a size, and a ratio has no unit. Write the ratio as a number, such as 1.2.';
    return faulty(faultAtPiece(line, size, { code: 'notForVerb', says, instead: [''] }));
  }
  const decimal = firstOf(line.pieces, 'number')?.decimal;
  if (decimal === undefined)
    return faulty(
      missing(line, 'The claimed ratio is missing. Add a number, such as 1.2 a year.', ['1 a year']),
    );
  return attained({ fraction: Number(decimal), per: has(line.pieces, 'annual') ? 'year' : 'day' });
};

const claimedMean = (line: VerbLine): Attempt<Size> => {
  const [of] = allOf(line.pieces, 'of');
  if (of?.piece.of === 'vol') {
    const says = 'cannot be claimed: claims are about a mean or a ratio. The nearest is its interval.';
    return faulty(faultAtPiece(line, of, { code: 'notForVerb', says, instead: [''] }));
  }
  const sizeMissing = 'The claimed mean is missing. Add a size, such as 20bp or 15% a year.';
  return has(line.pieces, 'size') ? checkedSize(line) : faulty(missing(line, sizeMissing, ['0bp']));
};

export const claim: VerbReader = {
  verb: 'claim',
  takes: new Set([
    'ticker',
    'of',
    'size',
    'number',
    'annual',
    'window',
    'level',
    'side',
    'robust',
    'log',
    'wish',
  ]),
  tickers: { least: 1, most: limits.tickersPerQuestion },
  settle,
  read: (line) => {
    const { pieces, context } = line;
    const of = firstOf(pieces, 'of')?.of === 'ratio' ? 'ratio' : 'mean';
    const claimed = of === 'ratio' ? claimedRatio(line) : claimedMean(line);
    if (!claimed.ok) return claimed;
    const refused = robustRatio(line);
    if (refused !== null) return faulty(refused);
    const taking = createTaking();
    const question: Omit<ClaimQuestion, 'ticker'> = {
      verb: 'claim',
      of,
      claimed: claimed.value,
      ...takeSample(taking, pieces, context.defaults.claim.window),
      level: takeLevel(taking, pieces, context.defaults.claim.level),
      side: firstOf(pieces, 'side')?.side ?? 'both',
      robust: has(pieces, 'robust'),
    };
    return attained(ofEachTicker(line, taking.assumed, (ticker) => ({ ...question, ticker })));
  },
};
