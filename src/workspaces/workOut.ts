import type { Answers } from '../answers/answer.ts';
import type { AnswerJob } from '../answers/answerQuestion.ts';
import type { ReadQuestion, StatisticalQuestion } from '../questions/question.ts';
import type { PriceSeries, PriceSnapshot } from '../terms/prices.ts';
import { problem } from '../terms/problem.ts';
import { type Result, refuse, succeed } from '../terms/result.ts';
import type { Desk } from './desk.ts';

/** The tickers a question is about, in its own order. */
const subjectOf = (question: StatisticalQuestion): readonly string[] =>
  question.verb === 'compare' && question.between === 'tickers' ? question.tickers : [question.ticker];

const seriesOf = (snapshot: PriceSnapshot, tickers: readonly string[]): Result<readonly PriceSeries[]> => {
  const found: PriceSeries[] = [];
  for (const ticker of tickers) {
    const series = snapshot.series(ticker);
    const reason = snapshot.quarantined.get(ticker);
    if (series === null && reason !== undefined) return refuse(problem('quarantined', reason));
    if (series === null)
      return refuse(
        problem('unknownTicker', `${ticker} is not in the feed. Ask feed for the tickers that are.`),
      );
    found.push(series);
  }
  return succeed(found);
};

/** Answers with the job that they are the outcome of. */
export type WorkedOut = { readonly job: AnswerJob; readonly answers: Answers };

/** Answers a statistical question on one snapshot of the prices. */
export const workOut = async (
  { compute, policy }: Pick<Desk, 'compute' | 'policy'>,
  read: ReadQuestion,
  question: StatisticalQuestion,
  snapshot: PriceSnapshot,
  progress?: (words: string) => void,
): Promise<Result<WorkedOut>> => {
  const series = seriesOf(snapshot, subjectOf(question));
  if (!series.ok) return series;
  const job: AnswerJob = { read, series: series.value, policy };
  const outcome = await compute(job, progress);
  return outcome.ok ? succeed({ job, answers: outcome.value }) : outcome;
};
