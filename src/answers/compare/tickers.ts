import type { CompareQuestion, ReadQuestion } from '../../questions/question.ts';
import { adjustedForSeveral, type Comparison, compare } from '../../stats/comparisons/compare.ts';
import { createStreams } from '../../stats/random/xoshiro128.ts';
import type { PriceMeaning, PriceSeries } from '../../terms/prices.ts';
import { type Result, succeed } from '../../terms/result.ts';
import { counted } from '../../wording/words.ts';
import type { CompareAnswer, Warning } from '../answer.ts';
import { feedWarnings } from '../askOne.ts';
import { type Enclosing, enclose } from '../envelope.ts';
import { identify } from '../identity.ts';
import { longSpanDays, type PairedSample, samplePair } from '../pairedSample.ts';
import type { AnswerPolicy } from '../policy.ts';
import { comparisonParts } from './parts.ts';

type Pair = { readonly one: PriceSeries; readonly other: PriceSeries };
type Compared = Pair & {
  readonly sample: PairedSample;
  readonly comparison: Comparison;
  readonly identity: Enclosing['identity'];
};

const pairsOf = (series: readonly PriceSeries[]): readonly Pair[] =>
  series.flatMap((one, index) => series.slice(index + 1).map((other) => ({ one, other })));

const comparePair = (pair: Pair, read: ReadQuestion, question: CompareQuestion): Result<Compared> => {
  const sample = samplePair(pair.one, pair.other, question);
  if (!sample.ok) return sample;
  const { first, second } = sample.value;
  const identity = identify(read.canonical, [first, second]);
  const comparison = compare({
    first: first.returns,
    second: second.returns,
    paired: true,
    level: question.level,
    streams: createStreams(identity.seedBytes),
  });
  return comparison.ok
    ? succeed({ ...pair, sample: sample.value, comparison: comparison.value, identity })
    : comparison;
};

const sharedMeaning = (one: PriceMeaning, other: PriceMeaning): Enclosing['meaning'] => ({
  currency: one.currency === other.currency ? one.currency : null,
  quoteUnit: one.quoteUnit === other.quoteUnit ? one.quoteUnit : null,
  priceAdjustment: one.priceAdjustment === other.priceAdjustment ? one.priceAdjustment : 'unknown',
});

/** What keeps two tickers’ days from being the same days. */
const mismatchWarnings = ({ one, other, sample }: Compared): readonly Warning[] => [
  ...(one.meaning.currency !== other.meaning.currency
    ? [
        {
          code: 'differentCurrencies',
          text: `${one.ticker} is quoted in ${one.meaning.currency ?? 'a currency not stated'}, ${other.ticker} in ${other.meaning.currency ?? 'a currency not stated'}: the exchange rate moves the difference too.`,
        },
      ]
    : []),
  ...(one.meaning.closingTime !== other.meaning.closingTime
    ? [
        {
          code: 'differentClosingTimes',
          text: `${one.ticker} and ${other.ticker} close at different times, so how closely they move together is understated and the interval is too wide.`,
        },
      ]
    : []),
  ...(sample.longSpans > 0
    ? [
        {
          code: 'longSpans',
          text: `${counted(sample.longSpans, 'return')} between common dates ${sample.longSpans === 1 ? 'spans' : 'span'} more than ${longSpanDays} calendar days.`,
        },
      ]
    : []),
];

const enclosingOf = (
  compared: Compared,
  read: ReadQuestion,
  question: CompareQuestion,
  policy: AnswerPolicy,
): Enclosing => {
  const { one, other, sample, identity } = compared;
  const { first } = sample;
  return {
    read,
    window: question.window,
    returnType: question.returnType,
    span: {
      subject: [one.ticker, other.ticker],
      from: first.from,
      to: first.to,
      returnCount: first.returns.length,
      droppedDates: sample.droppedDates,
      longestGapDays: first.longestGapDays,
      cutToHistory: first.cutToHistory,
    },
    meaning: sharedMeaning(one.meaning, other.meaning),
    feedWarnings: [...feedWarnings(one, first), ...feedWarnings(other, sample.second)],
    identity,
    policy,
  };
};

/** Every pair of the tickers on their common dates; p-values adjusted where there are several pairs. */
export const compareTickers = (
  read: ReadQuestion,
  question: CompareQuestion,
  series: readonly PriceSeries[],
  policy: AnswerPolicy,
): Result<readonly CompareAnswer[]> => {
  const compared: Compared[] = [];
  for (const pair of pairsOf(series)) {
    const found = comparePair(pair, read, question);
    if (!found.ok) return found;
    compared.push(found.value);
  }
  const adjusted =
    compared.length > 1 ? adjustedForSeveral(compared.map(({ comparison }) => comparison)) : [];
  return succeed(
    compared.map((each, index) =>
      enclose(
        enclosingOf(each, read, question, policy),
        comparisonParts({
          comparison: each.comparison,
          first: each.sample.first,
          second: each.sample.second,
          order: [each.one.ticker, each.other.ticker],
          level: question.level,
          returnType: question.returnType,
          adjusted: adjusted[index] ?? null,
          warnings: mismatchWarnings(each),
        }),
      ),
    ),
  );
};
