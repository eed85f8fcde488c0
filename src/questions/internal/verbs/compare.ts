import { dateParts, dayFromDate, isoFromDay } from '../../../terms/day.ts';
import { limits } from '../../limits.ts';
import { type Attempt, attained, faulty } from '../faults/fault.ts';
import { allOf } from '../pieces/piece.ts';
import { settleLevels } from './settle.ts';
import { createTaking, takeLevel, takeSample } from './taking.ts';
import { faultAtPiece, missing, type ReadLine, type VerbLine, type VerbReader } from './verbReader.ts';

/** One ticker needs a day that parts its history; the first of this year is offered. */
const alone = (line: VerbLine) => {
  const { year } = dateParts(line.context.today);
  const newYear = dayFromDate(year, 1, 1);
  const message = 'One ticker cannot be compared alone. Add a second ticker, or a day: before 2026-05-04.';
  return missing(line, message, newYear === null ? [] : [`before ${isoFromDay(newYear)}`]);
};

const comparePeriods = (line: VerbLine, ticker: string, splitDay: number): ReadLine => {
  const taking = createTaking();
  const sample = takeSample(taking, line.pieces, { kind: 'all' });
  const level = takeLevel(taking, line.pieces, line.context.defaults.compare.level);
  const question = { verb: 'compare', ...sample, level, between: 'periods', ticker, splitDay } as const;
  return { questions: [question], assumed: taking.assumed };
};

const compareTickers = (line: VerbLine): ReadLine => {
  const taking = createTaking();
  const { window, level } = line.context.defaults.compare;
  const sample = takeSample(taking, line.pieces, window);
  const question = {
    verb: 'compare',
    ...sample,
    level: takeLevel(taking, line.pieces, level),
    between: 'tickers',
    tickers: line.tickers,
  } as const;
  return { questions: [question], assumed: taking.assumed };
};

const read = (line: VerbLine): Attempt<ReadLine> => {
  const [split] = allOf(line.pieces, 'splitDay');
  const [ticker, second] = line.tickers;
  if (split === undefined || ticker === undefined)
    return second === undefined ? faulty(alone(line)) : attained(compareTickers(line));
  if (second === undefined) return attained(comparePeriods(line, ticker, split.piece.day));
  const says = 'parts the history of one ticker. Name one ticker, or leave the day out.';
  return faulty(faultAtPiece(line, split, { code: 'notForVerb', says, instead: [''] }));
};

export const compare: VerbReader = {
  verb: 'compare',
  takes: new Set(['ticker', 'splitDay', 'window', 'level', 'log', 'wish']),
  tickers: { least: 1, most: limits.tickersPerQuestion },
  settle: settleLevels,
  read,
};
