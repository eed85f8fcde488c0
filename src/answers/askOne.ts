import type { ReadQuestion } from '../questions/question.ts';
import type { PriceSeries } from '../terms/prices.ts';
import { type Result, succeed } from '../terms/result.ts';
import type { Warning } from './answer.ts';
import { type Asked, spanOf } from './envelope.ts';
import { identify } from './identity.ts';
import type { AnswerPolicy } from './policy.ts';
import { type SampleAsked, sampleReturns } from './sample.ts';

/** What the feed says of the prices used must be read before any figure made from them. The first day has no return of its own. */
export const feedWarnings = (
  { ticker, flags }: PriceSeries,
  { days }: { readonly days: Int32Array },
): readonly Warning[] => {
  const first = days[0] ?? Infinity;
  const last = days[days.length - 1] ?? -Infinity;
  return flags
    .filter(({ day }) => day === null || (day > first && day <= last))
    .map(({ code, text }) => ({ code, text: `${ticker}: ${text}` }));
};

/** Finds the returns of a question about one ticker and who the answer is. */
export const askOne = (
  read: ReadQuestion,
  asked: SampleAsked,
  series: PriceSeries,
  policy: AnswerPolicy,
): Result<Asked> => {
  const sample = sampleReturns(series, asked);
  if (!sample.ok) return sample;
  return succeed({
    read,
    window: asked.window,
    returnType: asked.returnType,
    sample: sample.value,
    span: spanOf(sample.value),
    meaning: series.meaning,
    feedWarnings: feedWarnings(series, sample.value),
    identity: identify(read.canonical, [sample.value]),
    policy,
  });
};
