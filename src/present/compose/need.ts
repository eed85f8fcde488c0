import type { NeedAnswer } from '../../answers/answer.ts';
import { digits, threeDigits } from '../../wording/digits.ts';
import { levelInWords, percent, typedBasisPoints } from '../../wording/percent.ts';
import { counted } from '../../wording/words.ts';
import type { Reply, Table } from '../reply.ts';
import { framed, windowInWords } from './parts.ts';

const longestToldYears = 100;

/** Years of trading, in words where no history is that long. */
export const yearsInWords = (years: number): string =>
  years > longestToldYears ? 'longer than any history' : `${threeDigits(years)} years`;

const rangeOf = (lower: number, upper: number): string => `${digits(lower, 0)} to ${digits(upper, 0)}`;

const table = ({ figures }: NeedAnswer): Table => ({
  columns: [
    { head: 'Trading days', align: 'left' },
    { head: 'estimate', align: 'right' },
    { head: 'range', align: 'right' },
    { head: 'years', align: 'right' },
  ],
  rows: [
    [
      `To tell it from zero, ${levelInWords(figures.power)} power`,
      digits(figures.detectReturns, 0),
      rangeOf(figures.detectReturnsLower, figures.detectReturnsUpper),
      figures.yearsNeeded > longestToldYears ? 'over 100' : threeDigits(figures.yearsNeeded),
    ],
    [
      'Until the interval is that narrow, ±',
      digits(figures.halfWidthReturns, 0),
      rangeOf(figures.halfWidthReturnsLower, figures.halfWidthReturnsUpper),
      figures.halfWidthYears > longestToldYears ? 'over 100' : threeDigits(figures.halfWidthYears),
    ],
    ['Standard deviation a day', percent(figures.sampleStandardDeviation), '', ''],
  ],
});

export const needReply = (answer: NeedAnswer): Reply => {
  const { figures } = answer;
  const size = typedBasisPoints(figures.detect);
  const level = levelInWords(figures.confidenceLevel);
  const sentence =
    `${answer.subject[0] ?? ''}: to tell a mean of ${size} a day from zero takes about ${counted(figures.detectReturns, 'trading day')} ` +
    `(${yearsInWords(figures.yearsNeeded)}) at ${level} with ${levelInWords(figures.power)} power, going by its volatility ${windowInWords(answer)}.`;
  return framed(answer, sentence, {
    table: table(answer),
    figuresInWords:
      `Range ${rangeOf(figures.detectReturnsLower, figures.detectReturnsUpper)} days. An interval of ± ${size} takes ` +
      `${counted(figures.halfWidthReturns, 'day')}, range ${rangeOf(figures.halfWidthReturnsLower, figures.halfWidthReturnsUpper)}`,
  });
};
