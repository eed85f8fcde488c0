import type { Answers } from '../answers/answer.ts';
import { answersReply, jsonReply } from '../present/answerReply.ts';
import { stalenessInWords } from '../present/compose/feed.ts';
import type { Reply } from '../present/reply.ts';
import type { ReadQuestion, StatisticalQuestion } from '../questions/question.ts';
import type { Freshness } from '../terms/feedReport.ts';
import type { PriceSnapshot } from '../terms/prices.ts';
import { succeed } from '../terms/result.ts';
import { type Asking, readerOf, refused, type Spoken } from './conversation.ts';
import type { Desk } from './desk.ts';
import { pictured } from './pictured.ts';
import { keepAnswer } from './records/keeping.ts';
import { workOut } from './workOut.ts';

const asWished = ({ wishes }: ReadQuestion, answers: Answers): Reply =>
  wishes.includes('json') ? jsonReply(answers) : answersReply(answers);

/** Old prices are said before anything else is warned of. It hangs on the hour of asking, so it is no part of the answer. */
const withStaleness = (given: Reply, freshness: Freshness | null): Reply => {
  const stale = stalenessInWords(freshness);
  return stale === null ? given : { ...given, warnings: [stale, ...given.warnings] };
};

/** Answers a question for figures and keeps the answer on record. */
export const answerStatistical = async (
  desk: Desk,
  read: ReadQuestion,
  question: StatisticalQuestion,
  snapshot: PriceSnapshot,
  asking: Asking,
): Promise<Spoken> => {
  const worked = await workOut(desk, read, question, snapshot, asking.progress);
  if (!worked.ok) return refused(worked);
  const { freshness } = desk.feedStatus();
  const { answers, reply } = await keepAnswer(desk.records, {
    ...worked.value,
    question,
    replyTo: (named) => withStaleness(asWished(read, named), freshness),
    asking: { ...readerOf(asking), words: asking.text, askedAtMs: desk.clock.nowMs() },
  });
  const spoken: Spoken = { reply, outcome: succeed(answers) };
  if (!read.wishes.includes('picture')) return spoken;
  return pictured(spoken, await desk.drawing.draw(worked.value.job, answers));
};
