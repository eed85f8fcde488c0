import type { Answer } from '../answers/answer.ts';
import { intervalMeanReply } from './compose/intervalMean.ts';
import { intervalRatioReply } from './compose/intervalRatio.ts';
import { intervalVolReply } from './compose/intervalVol.ts';
import { type Reply, reply } from './reply.ts';

/** The reply to an answer, whatever its verb. */
export const answerReply = (answer: Answer): Reply => {
  switch (answer.kind) {
    case 'interval mean':
      return intervalMeanReply(answer);
    case 'interval vol':
      return intervalVolReply(answer);
    case 'interval ratio':
      return intervalRatioReply(answer);
  }
};

/** The working of an answer, posted beneath it: the formula with this sample's numbers in it, step by step. */
export const workingReply = (answer: Answer): Reply =>
  reply('working', `The working of ${answer.id}: ${answer.question}.`, {
    passages: [
      {
        head: null,
        lines: answer.working.map(({ step, text }, index) => `${index + 1}. ${step}: ${text}`),
      },
      ...(answer.warnings.length > 2
        ? [{ head: 'All cautions', lines: answer.warnings.map(({ text }) => text) }]
        : []),
      ...(answer.notes.length > 0 ? [{ head: 'Notes', lines: answer.notes.map(({ text }) => text) }] : []),
      { head: 'Sources', lines: answer.sources },
    ],
  });
