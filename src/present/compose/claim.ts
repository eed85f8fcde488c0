import type { ClaimAnswer } from '../../answers/answer.ts';
import type { ClaimFigures } from '../../answers/claim/figures.ts';
import { digits, roundTo, threeDigits } from '../../wording/digits.ts';
import { decimalsOfBounds, writeBounds } from '../../wording/estimate.ts';
import {
  basisPoints,
  inPercent,
  levelInWords,
  percent,
  percentBounds,
  percentDecimals,
  typedBasisPoints,
} from '../../wording/percent.ts';
import { counted, probabilityValue } from '../../wording/words.ts';
import type { Reply, Table } from '../reply.ts';
import { framed, placeInWords, windowInWords } from './parts.ts';

/** How the figures of a claim are written: a mean in percent, a ratio as a plain number. */
export const writing = (figures: ClaimFigures) => {
  const { of, estimate, lower, upper, claimed } = figures;
  const bounds = { estimate, lower, upper };
  return of === 'mean'
    ? { bounds: percentBounds(bounds, percentDecimals(bounds, [0, claimed])), unit: '%' }
    : { bounds: writeBounds(bounds, decimalsOfBounds(bounds, [0, claimed])), unit: '' };
};

const claimedInWords = ({ of, claimed, claimedPer }: ClaimFigures, periodsPerYear: number): string => {
  if (of === 'ratio')
    return claimedPer === 'day'
      ? `a ratio of ${threeDigits(claimed)} a day`
      : `a ratio of ${threeDigits(claimed * Math.sqrt(periodsPerYear))} a year`;
  return claimedPer === 'day'
    ? `a mean of ${typedBasisPoints(claimed)} a day`
    : `a mean of ${percent(claimed * periodsPerYear)} a year (${basisPoints(claimed)} a day)`;
};

const verdictSentence = (answer: ClaimAnswer): string => {
  const { figures, subject, periodsPerYear } = answer;
  const claim = claimedInWords(figures, periodsPerYear);
  const name = subject[0] ?? '';
  const window = windowInWords(answer);
  if (figures.verdict === 'contradicted')
    return `${name}: ${claim} is contradicted ${window}, for the true one is ${figures.estimate > figures.claimed ? 'higher' : 'lower'}`;
  if (figures.verdict === 'consistent')
    return `${name}: ${claim} is consistent with the data ${window}, which does not prove it`;
  return figures.claimed === 0
    ? `${name}: whether the mean is zero cannot be told ${window}`
    : `${name}: the data cannot tell ${claim} from zero ${window}`;
};

/** With the decimals of the estimate, unless those would change what was claimed. */
export const claimedDigits = ({ of, claimed }: ClaimFigures, decimals: number): string => {
  const value = of === 'mean' ? inPercent(claimed) : claimed;
  const unchanged = Math.abs(roundTo(value, decimals) - value) < 1e-9;
  return unchanged ? digits(value, decimals, { plus: true }) : threeDigits(value, { plus: true });
};

const distance = ({ of, detectableAt80 }: ClaimFigures): string =>
  of === 'mean' ? basisPoints(detectableAt80) : threeDigits(detectableAt80);

const table = ({ figures }: ClaimAnswer): Table => {
  const { bounds, unit } = writing(figures);
  const needed = figures.returnsNeeded;
  return {
    columns: [
      { head: figures.of === 'mean' ? 'Mean, % a day' : 'Mean / deviation, a day', align: 'left' },
      { head: '', align: 'right' },
    ],
    rows: [
      ['Estimate', bounds.estimate],
      [
        `At ${levelInWords(figures.confidenceLevel)}`,
        `${bounds.lower ?? 'no bound'} to ${bounds.upper ?? 'no bound'}`,
      ],
      ['Claimed', claimedDigits(figures, bounds.decimals)],
      ['p of the claim', probabilityValue(figures.p)],
      [`Found with 80% power, off by${unit === '%' ? '' : ' a ratio of'}`, distance(figures)],
      ['Days to tell the claim from zero', needed === null ? 'none, it is zero' : digits(needed, 0)],
    ],
  };
};

export const claimReply = (answer: ClaimAnswer): Reply => {
  const { figures } = answer;
  const { bounds, unit } = writing(figures);
  const what = figures.of === 'mean' ? 'mean' : 'ratio';
  const sentence = `${verdictSentence(answer)}: at ${levelInWords(figures.confidenceLevel)} the true ${what} lies ${placeInWords(bounds, unit)}, and the estimate is ${bounds.estimate}${unit}.`;
  const needed = figures.returnsNeeded;
  const words = [
    `p of the claim ${probabilityValue(figures.p)}`,
    `a distance of ${distance(figures)} would be found with 80% power`,
    ...(needed === null ? [] : [`telling the claim from zero takes ${counted(needed, 'day')}`]),
  ];
  return framed(answer, sentence, { table: table(answer), figuresInWords: words.join('; ') });
};
