import type { CompareQuestion, ReadQuestion } from '../../questions/question.ts';
import { compare } from '../../stats/comparisons/compare.ts';
import { createStreams } from '../../stats/random/xoshiro128.ts';
import { isoFromDay } from '../../terms/day.ts';
import type { PriceSeries } from '../../terms/prices.ts';
import { problem } from '../../terms/problem.ts';
import { type Result, refuse, succeed } from '../../terms/result.ts';
import { counted } from '../../wording/words.ts';
import type { CompareAnswer } from '../answer.ts';
import { askOne } from '../askOne.ts';
import { enclose } from '../envelope.ts';
import type { AnswerPolicy } from '../policy.ts';
import { firstIndexFrom, type ReturnSample } from '../sample.ts';
import { comparisonParts } from './parts.ts';

type PeriodsQuestion = CompareQuestion & { readonly between: 'periods' };

const leastInPeriod = 2;

/** The part of a sample whose returns have the places `from` to `to` (exclusive). */
const partOf = (sample: ReturnSample, from: number, to: number): ReturnSample => {
  const days = sample.days.subarray(from, to + 1);
  return {
    ...sample,
    days,
    closes: sample.closes.subarray(from, to + 1),
    returns: sample.returns.subarray(from, to),
    from: days[1] ?? sample.from,
    to: days[days.length - 1] ?? sample.to,
  };
};

const tooFew = (sample: ReturnSample, question: PeriodsQuestion, before: number, after: number) =>
  refuse(
    problem(
      'tooFewReturns',
      `${sample.ticker} has ${counted(before, 'return')} before ${isoFromDay(question.splitDay)} and ${counted(after, 'return')} from then on, within ` +
        `${isoFromDay(sample.from)} to ${isoFromDay(sample.to)}. Choose a day with ${leastInPeriod} returns at least on either side.`,
      { needs: leastInPeriod },
    ),
  );

/** The returns from a day on against those before it. */
export const comparePeriods = (
  read: ReadQuestion,
  question: PeriodsQuestion,
  series: readonly PriceSeries[],
  policy: AnswerPolicy,
): Result<readonly CompareAnswer[]> => {
  const [only] = series;
  if (only === undefined)
    return refuse(problem('noTicker', 'A comparison of two periods needs a ticker. Add one.'));
  const asked = askOne(read, question, only, policy);
  if (!asked.ok) return asked;
  const { sample, identity } = asked.value;
  const count = sample.returns.length;
  const split = Math.max(0, firstIndexFrom(sample.days, question.splitDay) - 1);
  if (split < leastInPeriod || count - split < leastInPeriod)
    return tooFew(sample, question, split, count - split);
  const after = partOf(sample, split, count);
  const before = partOf(sample, 0, split);
  const comparison = compare({
    first: after.returns,
    second: before.returns,
    paired: false,
    level: question.level,
    streams: createStreams(identity.seedBytes),
  });
  if (!comparison.ok) return comparison;
  const day = isoFromDay(question.splitDay);
  return succeed([
    enclose(
      asked.value,
      comparisonParts({
        comparison: comparison.value,
        first: after,
        second: before,
        order: [`from ${day}`, `before ${day}`],
        level: question.level,
        returnType: question.returnType,
        adjusted: null,
        warnings: [],
      }),
    ),
  ]);
};
