import { helpReply } from '../present/compose/help.ts';
import type { PinQuestion, Question, ReadQuestion, RecordQuestion } from '../questions/question.ts';
import type { ReadOutcome } from '../questions/readMessage.ts';
import type { PriceSnapshot } from '../terms/prices.ts';
import type { Result } from '../terms/result.ts';
import { behindDoor, denied } from './admission.ts';
import { answerFeed } from './answerFeed.ts';
import { answerStatistical } from './answerStatistical.ts';
import { type Asking, type Converse, readerOf, refused, type Spoken, said } from './conversation.ts';
import type { Desk } from './desk.ts';
import { isMeantFor, readAsked } from './followUp.ts';
import { answerPins } from './pins/answerPins.ts';
import { answerPress } from './press.ts';
import { isOfPins, isOfRecords, isOfSubscriptions, isStatistical } from './questionKinds.ts';
import { answerOfRecords } from './records/answerRecords.ts';
import { spokenOfSubscriptions } from './subscriptions/spokenOfSubscriptions.ts';

export type { Asking, Converse, Pressing, Spoken } from './conversation.ts';
export type { Desk } from './desk.ts';

/** What can be answered while there are no prices. */
const needsNoPrices = (outcome: ReadOutcome): boolean =>
  outcome.ok &&
  (['help', 'feed'].includes(outcome.value.question.verb) ||
    isOfRecords(outcome.value.question) ||
    isOfPins(outcome.value.question) ||
    isOfSubscriptions(outcome.value.question));

/** One conversation for every workspace: text in, replies out. */
export const createConverse = (desk: Desk): Converse => {
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
      return live.ok ? answerStatistical(desk, read, question, live.value, asking) : refused(live);
    if (isOfRecords(question)) return answerRecords(question, live, asking);
    if (isOfSubscriptions(question)) return spokenOfSubscriptions(desk, read, question, readerOf(asking));
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
