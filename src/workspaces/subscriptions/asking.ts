import type { Answers } from '../../answers/answer.ts';
import { sampleReturns } from '../../answers/sample.ts';
import { answersReply } from '../../present/answerReply.ts';
import { canonicalText } from '../../questions/canonicalText.ts';
import type { ReadQuestion, StatisticalQuestion } from '../../questions/question.ts';
import type { Day } from '../../terms/day.ts';
import type { PriceSeries, PriceSnapshot } from '../../terms/prices.ts';
import { askedFromNowhere } from '../../terms/records.ts';
import { type Result, succeed } from '../../terms/result.ts';
import type { ReturnType } from '../../terms/returns.ts';
import type { Subscription } from '../../terms/subscriptions.ts';
import type { Window } from '../../terms/window.ts';
import type { Desk } from '../desk.ts';
import { keepAnswer } from '../records/keeping.ts';
import { type WorkedOut, workOut } from '../workOut.ts';

type AskingDesk = Pick<Desk, 'compute' | 'policy' | 'records' | 'clock'>;

/** So many answers are at hand for the digests of one hour that ask the same. */
const mostRemembered = 1000;

const readAs = (question: StatisticalQuestion, canonical: string): ReadQuestion => ({
  question,
  canonical,
  assumed: [],
  wishes: [],
  position: { start: 0, end: canonical.length },
});

/**
 * Answers the questions of digests and watches on one reading of the feed, and keeps each on record as asked by its
 * subscription. What several of them ask is worked out once.
 */
export const askAndKeep = (desk: AskingDesk, snapshot: PriceSnapshot) => {
  const worked = new Map<string, Promise<Result<WorkedOut>>>();

  const workedOut = (question: StatisticalQuestion, canonical: string): Promise<Result<WorkedOut>> => {
    const known = worked.get(canonical);
    if (known !== undefined) return known;
    const working = workOut(desk, readAs(question, canonical), question, snapshot);
    const [oldest] = worked.keys();
    if (worked.size >= mostRemembered && oldest !== undefined) worked.delete(oldest);
    worked.set(canonical, working);
    return working;
  };

  return async (question: StatisticalQuestion, by: Subscription): Promise<Result<Answers>> => {
    const outcome = await workedOut(question, canonicalText(question));
    if (!outcome.ok) return outcome;
    const { team, channel, owner: person, place, kind, id } = by;
    const from = { ...askedFromNowhere, team: place === 'terminal' ? null : team, channel, person };
    const { answers } = await keepAnswer(desk.records, {
      ...outcome.value,
      question,
      replyTo: answersReply,
      asking: { place, from, words: `${kind} ${id}`.trim(), askedAtMs: desk.clock.nowMs() },
    });
    return succeed(answers);
  };
};

export type DatedReturn = { readonly day: Day; readonly value: number };

/** The returns of the days after a day, oldest first; after null: of the last day alone. */
export const returnsAfter = (
  series: PriceSeries,
  after: Day | null,
  returnType: ReturnType,
): readonly DatedReturn[] => {
  const window: Window = after === null ? { kind: 'returns', count: 1 } : { kind: 'since', day: after + 1 };
  const sample = sampleReturns(series, { window, windowAsked: true, returnType });
  if (!sample.ok) return [];
  const { days, returns } = sample.value;
  return Array.from(returns, (value, index) => ({ day: days[index + 1] as number, value }));
};
