import type { VolAnswer } from '../../answers/answer.ts';
import type { Bounds, VolFigures } from '../../answers/interval/figures.ts';
import { levelInWords, percentBounds } from '../../wording/percent.ts';
import { possessive } from '../../wording/words.ts';
import type { Reply, Table } from '../reply.ts';
import { dailyAndAnnual, framed, placeInWords, windowInWords } from './parts.ts';

const unsigned = { plus: false };

/** The interval of each method. */
export const boundsOf = (figures: VolFigures): Record<VolFigures['trust'], Bounds> => ({
  chiSquare: { lower: figures.lower, upper: figures.upper },
  bonett: { lower: figures.bonettLower, upper: figures.bonettUpper },
  block: { lower: figures.blockLower, upper: figures.blockUpper },
});

const trustInWords: Record<VolFigures['trust'], string> = {
  chiSquare: '',
  bonett: ' (allowing for fat tails)',
  block: ' (by resampled blocks of days)',
};

const written = (answer: VolAnswer, { lower, upper }: Bounds) => {
  const perYear = Math.sqrt(answer.periodsPerYear);
  const timesYear = (value: number | null) => (value === null ? null : value * perYear);
  const estimate = answer.figures.sampleStandardDeviation;
  const daily = { estimate, lower, upper };
  const annual = { estimate: estimate * perYear, lower: timesYear(lower), upper: timesYear(upper) };
  return {
    daily: percentBounds(daily, undefined, unsigned),
    annual: percentBounds(annual, undefined, unsigned),
  };
};

const row = (answer: VolAnswer, name: string, bounds: Bounds): readonly (readonly string[])[] => {
  if (bounds.lower === null && bounds.upper === null) return [];
  const { daily, annual } = written(answer, bounds);
  return [
    [
      name,
      dailyAndAnnual(daily.estimate, annual.estimate),
      dailyAndAnnual(daily.lower, annual.lower),
      dailyAndAnnual(daily.upper, annual.upper),
    ],
  ];
};

const table = (answer: VolAnswer): Table => {
  const bounds = boundsOf(answer.figures);
  return {
    columns: [
      { head: '% a day (a year)', align: 'left' },
      { head: 'estimate', align: 'right' },
      { head: 'from', align: 'right' },
      { head: 'to', align: 'right' },
    ],
    rows: [
      ...row(answer, 'Chi-square', bounds.chiSquare),
      ...row(answer, 'Bonett, for fat tails', bounds.bonett),
      ...row(answer, 'Resampled blocks', bounds.block),
    ],
  };
};

export const intervalVolReply = (answer: VolAnswer): Reply => {
  const { figures } = answer;
  const { daily, annual } = written(answer, boundsOf(figures)[figures.trust]);
  const sentence =
    `${possessive(answer.subject[0] ?? '')} daily volatility ${windowInWords(answer)} is ${daily.estimate}%, and at ` +
    `${levelInWords(figures.confidenceLevel)} the true standard deviation lies ${placeInWords(daily, '%')}` +
    `${trustInWords[figures.trust]}.`;
  const figuresInWords = `A year of such days: ${annual.estimate}%, ${placeInWords(annual, '%')}`;
  return framed(answer, sentence, { table: table(answer), figuresInWords });
};
