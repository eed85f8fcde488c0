import type { Answers } from '../answers/answer.ts';
import { answersReply, jsonReply } from '../present/answerReply.ts';
import { stalenessInWords } from '../present/compose/feed.ts';
import { helpReply } from '../present/compose/help.ts';
import type { Reply } from '../present/reply.ts';
import type {
  PinQuestion,
  Question,
  ReadQuestion,
  RecordQuestion,
  StatisticalQuestion,
} from '../questions/question.ts';
import type { ReadOutcome } from '../questions/readMessage.ts';
import type { Freshness } from '../terms/feedReport.ts';
import type { PriceSnapshot } from '../terms/prices.ts';
import { type Result, succeed } from '../terms/result.ts';
import { behindDoor, denied } from './admission.ts';
import { answerFeed } from './answerFeed.ts';
import { type Asking, type Converse, readerOf, refused, type Spoken, said } from './conversation.ts';
import type { Desk } from './desk.ts';
import { isMeantFor, readAsked } from './followUp.ts';
import { pictured } from './pictured.ts';
import { answerPins } from './pins/answerPins.ts';
import { answerPress } from './press.ts';
import { isOfPins, isOfRecords, isOfSubscriptions, isStatistical } from './questionKinds.ts';
import { answerOfRecords } from './records/answerRecords.ts';
import { keepAnswer } from './records/keeping.ts';
import { answerOfSubscriptions } from './subscriptions/answerSubscriptions.ts';
import { workOut } from './workOut.ts';

export type { Asking, Converse, Pressing, Spoken } from './conversation.ts';
export type { Desk } from './desk.ts';

/** What can be answered while there are no prices. */
const needsNoPrices = (outcome: ReadOutcome): boolean =>
  outcome.ok &&
  (['help', 'feed'].includes(outcome.value.question.verb) ||
    isOfRecords(outcome.value.question) ||
    isOfPins(outcome.value.question));

const asWished = ({ wishes }: ReadQuestion, answers: Answers): Reply =>
  wishes.includes('json') ? jsonReply(answers) : answersReply(answers);

/** Old prices are said before anything else is warned of. It hangs on the hour of asking, so it is no part of the answer. */
const withStaleness = (given: Reply, freshness: Freshness | null): Reply => {
  const stale = stalenessInWords(freshness);
  return stale === null ? given : { ...given, warnings: [stale, ...given.warnings] };
};

/** One conversation for every workspace: text in, replies out. */
export const createConverse = (desk: Desk): Converse => {
  const answerStatistical = async (
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

  const answerRecords = async (
    question: RecordQuestion,
    snapshot: Result<PriceSnapshot>,
    asking: Asking,
  ): Promise<Spoken> => {
    const { store, versions } = desk.records;
    const found = await answerOfRecords(
      {
        ...desk,
        compute: (job) => desk.compute(job, asking.progress),
        snapshot,
        store,
        nodeVersion: versions.node,
      },
      question,
      readerOf(asking),
    );
    return found.ok ? said(found.value) : refused(found);
  };

  const answerOne = async (
    read: ReadQuestion,
    question: Exclude<Question, PinQuestion>,
    live: Result<PriceSnapshot>,
    asking: Asking,
  ): Promise<Spoken> => {
    if (isStatistical(question))
      return live.ok ? answerStatistical(read, question, live.value, asking) : refused(live);
    if (isOfRecords(question)) return answerRecords(question, live, asking);
    if (isOfSubscriptions(question)) {
      const asker = readerOf(asking);
      const done = await answerOfSubscriptions(desk, { question, assumed: read.assumed, asker });
      return done.ok ? said(done.value) : refused(done);
    }
    return question.verb === 'help'
      ? said(helpReply(desk.helpPage(question.topic)))
      : answerFeed(desk, read, question.ticker, live);
  };

  const converse: Pick<Converse, 'ask' | 'press'> = {
    ask: async (asking) => {
      const live = desk.snapshot();
      const questions = await readAsked(desk, asking, live.ok ? live.value : null);
      // Without prices no ticker is known, so whatever was made of the words, the missing feed is what to say.
      if (!live.ok && !questions.some(needsNoPrices)) return questions.length === 0 ? [] : [refused(live)];
      const spoken: Spoken[] = [];
      for (const outcome of questions) {
        if (!outcome.ok) spoken.push(refused(outcome));
        else {
          const may = desk.permissions.mayAsk(readerOf(asking), outcome.value.question.verb);
          const { question } = outcome.value;
          if (!may.ok) spoken.push(...denied(may));
          else if (isOfPins(question)) spoken.push(...(await answerPins(desk, question, asking)));
          else spoken.push(await answerOne(outcome.value, question, live, asking));
        }
      }
      return spoken;
    },
    press: (pressing) => answerPress(desk, converse.ask, pressing),
  };
  const open = behindDoor(desk.permissions, converse);
  return {
    ...open,
    /** Who may not ask is not told so: nobody addressed the bot. */
    overhear: async (asking) =>
      (await isMeantFor(desk, asking, desk.snapshot()))
        ? (await open.ask(asking)).filter(({ outcome }) => outcome?.ok === true)
        : [],
  };
};
