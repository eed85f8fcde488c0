import type { Answer, Answers, CompareAnswer } from '../answers/answer.ts';
import { backtestReply } from './compose/backtest.ts';
import { claimReply } from './compose/claim.ts';
import { compareManyReply, compareReply } from './compose/compare.ts';
import { intervalMeanReply } from './compose/intervalMean.ts';
import { intervalRatioReply } from './compose/intervalRatio.ts';
import { intervalVolReply } from './compose/intervalVol.ts';
import { reservations } from './compose/more.ts';
import { needReply } from './compose/need.ts';
import { onRecord } from './compose/parts.ts';
import { shapeReply } from './compose/shape.ts';
import { tailReply } from './compose/tail.ts';
import { tailBeyondReply } from './compose/tailBeyond.ts';
import { type Reply, reply } from './reply.ts';

/** The reply to one answer, whatever its verb. */
export const answerReply = (answer: Answer): Reply => {
  switch (answer.kind) {
    case 'interval mean':
      return intervalMeanReply(answer);
    case 'interval vol':
      return intervalVolReply(answer);
    case 'interval ratio':
      return intervalRatioReply(answer);
    case 'claim':
      return claimReply(answer);
    case 'need':
      return needReply(answer);
    case 'compare':
      return compareReply(answer);
    case 'tail':
      return tailReply(answer);
    case 'tail beyond':
      return tailBeyondReply(answer);
    case 'shape':
      return shapeReply(answer);
    case 'backtest':
      return backtestReply(answer);
  }
};

const isComparison = (answer: Answer): answer is CompareAnswer => answer.kind === 'compare';

/** One reply to one question: several answers are the pairs of a comparison and share it. */
export const answersReply = (answers: Answers): Reply => {
  const [first, ...others] = answers;
  const pairs = others.filter(isComparison);
  return isComparison(first) && pairs.length > 0 ? compareManyReply([first, ...pairs]) : answerReply(first);
};

const workingReply = (answer: Answer): Reply =>
  reply('working', `The working of ${answer.id}: ${answer.question}.`, {
    passages: [
      { head: null, lines: answer.working.map(({ step, text }, index) => `${index + 1}. ${step}: ${text}`) },
      ...reservations(answer),
    ],
    whole: onRecord(answer),
  });

/** The working, posted beneath: the formula with this sample's numbers in it, step by step. */
export const workingReplies = (answers: Answers): readonly Reply[] => answers.map(workingReply);

/** The answer as data in the conversation: the reply's own words, then the figures as JSON. */
export const jsonReply = (answers: Answers): Reply => {
  const given = answersReply(answers);
  const lines = answers.flatMap(({ figures }) => JSON.stringify(figures, null, 2).split('\n'));
  return { ...given, table: null, passages: [{ head: 'Figures as JSON', lines }] };
};
