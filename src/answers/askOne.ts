import type { ReadQuestion } from '../questions/question.ts';
import type { PriceSeries } from '../terms/prices.ts';
import { type Result, succeed } from '../terms/result.ts';
import type { Warning } from './answer.ts';
import { type Asked, spanOf } from './envelope.ts';
import { identify } from './identity.ts';
import type { AnswerPolicy } from './policy.ts';
import { type SampleAsked, sampleReturns } from './sample.ts';

/** What the feed says of these prices must be read before any figure made from them. */
export const feedWarnings = ({ ticker, flags }: PriceSeries): readonly Warning[] =>
  flags.map(({ code, text }) => ({ code, text: `${ticker}: ${text}` }));

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
    feedWarnings: feedWarnings(series),
    identity: identify(read.canonical, [sample.value]),
    policy,
  });
};
