import type { MeanAnswer } from '../../answers/answer.ts';
import type { Bounds, MeanFigures } from '../../answers/interval/figures.ts';
import { digits, significant } from '../../wording/digits.ts';
import { levelInWords, percent, percentBounds, percentDecimals } from '../../wording/percent.ts';
import { possessive } from '../../wording/words.ts';
import type { Reply, Table } from '../reply.ts';
import { againstZero, dailyAndAnnual, framed, placeInWords, windowInWords } from './parts.ts';

/** The interval that the verdict rests on. */
export const trustedBounds = (figures: MeanFigures): Bounds =>
  ({
    plain: { lower: figures.lower, upper: figures.upper },
    neweyWest: { lower: figures.neweyWestLower, upper: figures.neweyWestUpper },
    bootstrap: { lower: figures.bootstrapLower, upper: figures.bootstrapUpper },
  })[figures.trust];

const trustInWords = ({ trust, bootstrapMethod }: MeanFigures): string => {
  if (trust === 'plain') return '';
  if (trust === 'neweyWest') return ' (allowing for returns that follow each other)';
  return bootstrapMethod === 'studentised' ? ' (allowing for skew)' : ' (by resampled blocks of days)';
};

/** Daily figures and the same times the days of a year, each with the decimals of its own width. */
const bothScales = (periodsPerYear: number, estimate: number, { lower, upper }: Bounds) => {
  const timesYear = (value: number | null) => (value === null ? null : value * periodsPerYear);
  const daily = { estimate, lower, upper };
  const annual = { estimate: estimate * periodsPerYear, lower: timesYear(lower), upper: timesYear(upper) };
  return { daily: percentBounds(daily), annual: percentBounds(annual) };
};

const tooNarrow = (figures: MeanFigures): string => {
  const plain = (figures.upper ?? figures.mean) - (figures.lower ?? figures.mean);
  const normal = (figures.normalUpper ?? figures.mean) - (figures.normalLower ?? figures.mean);
  return plain > 0 ? `${significant(100 * (1 - normal / plain), 2)}%` : '0%';
};

const intervalRow = (answer: MeanAnswer, name: string, bounds: Bounds): readonly string[] => {
  const { daily, annual } = bothScales(answer.periodsPerYear, answer.figures.mean, bounds);
  return [
    name,
    dailyAndAnnual(daily.estimate, annual.estimate),
    dailyAndAnnual(daily.lower, annual.lower),
    dailyAndAnnual(daily.upper, annual.upper),
  ];
};

const optionalRow = (answer: MeanAnswer, name: string, bounds: Bounds): readonly (readonly string[])[] =>
  bounds.lower === null && bounds.upper === null ? [] : [intervalRow(answer, name, bounds)];

const furtherDayRows = ({ figures }: MeanAnswer): readonly (readonly string[])[] => {
  const { predictionLower: lower, predictionUpper: upper, mean } = figures;
  if (lower === null && upper === null) return [];
  const written = percentBounds({ estimate: mean, lower, upper });
  return [
    [
      'One further day, if average',
      written.estimate,
      dailyAndAnnual(written.lower, null),
      dailyAndAnnual(written.upper, null),
    ],
  ];
};

const deviationRow = ({ figures, periodsPerYear }: MeanAnswer): readonly string[] => {
  const daily = percent(figures.sampleStandardDeviation);
  const annual = percent(figures.sampleStandardDeviation * Math.sqrt(periodsPerYear));
  return ['Standard deviation', `${daily.slice(0, -1)} (${annual.slice(0, -1)})`, '', ''];
};

const table = (answer: MeanAnswer): Table => {
  const { figures } = answer;
  const bootstrapName =
    figures.bootstrapMethod === 'stationary' ? 'Mean, resampled blocks' : 'Mean, bootstrap for skew';
  return {
    columns: [
      { head: '% a day (a year)', align: 'left' },
      { head: 'estimate', align: 'right' },
      { head: 'from', align: 'right' },
      { head: 'to', align: 'right' },
    ],
    rows: [
      intervalRow(answer, 'Mean, Student’s t', figures),
      ...optionalRow(answer, 'Mean, Newey–West', {
        lower: figures.neweyWestLower,
        upper: figures.neweyWestUpper,
      }),
      ...optionalRow(answer, bootstrapName, { lower: figures.bootstrapLower, upper: figures.bootstrapUpper }),
      intervalRow(answer, `Bell curve, ${tooNarrow(figures)} too narrow`, {
        lower: figures.normalLower,
        upper: figures.normalUpper,
      }),
      ...furtherDayRows(answer),
      deviationRow(answer),
    ],
  };
};

const figuresInWords = ({ figures, periodsPerYear }: MeanAnswer, bounds: Bounds): string => {
  const { annual } = bothScales(periodsPerYear, figures.mean, bounds);
  const deviation = percent(figures.sampleStandardDeviation);
  return `A year of such days: ${annual.estimate}%, ${placeInWords(annual, '%')}. Standard deviation ${deviation} a day`;
};

export const intervalMeanReply = (answer: MeanAnswer): Reply => {
  const { figures } = answer;
  const bounds = trustedBounds(figures);
  const { daily, annual } = bothScales(answer.periodsPerYear, figures.mean, bounds);
  const [written, kind] = figures.annualLeads
    ? [annual, `mean return, times ${digits(answer.periodsPerYear, 0)} days a year,`]
    : [daily, 'mean daily return'];
  const sentence =
    `${possessive(answer.subject[0] ?? '')} ${kind} ${windowInWords(answer)} is ${written.estimate}%, ` +
    `and at ${levelInWords(figures.confidenceLevel)} the true mean lies ${placeInWords(written, '%')}${trustInWords(figures)}: ${againstZero(bounds)}.`;
  return framed(answer, sentence, { table: table(answer), figuresInWords: figuresInWords(answer, bounds) });
};

/** The decimals in which the daily mean of this answer is written, for pictures and working. */
export const meanDecimals = (figures: MeanFigures): number =>
  percentDecimals({ estimate: figures.mean, ...trustedBounds(figures) });
