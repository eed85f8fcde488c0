import type { Answers } from '../answers/answer.ts';
import { refusalReply } from '../present/compose/refusal.ts';
import type { Button, Passage, Reply } from '../present/reply.ts';
import type { StatisticalQuestion } from '../questions/question.ts';
import { type AskedFrom, askedFromNowhere } from '../terms/records.ts';
import type { Refusal, Result } from '../terms/result.ts';
import type { Asker } from './permissions.ts';
import type { Picture } from './pictures.ts';

/** A message that was addressed to the bot. `progress` is told, in words, how far a long answer has come. */
export type Asking = {
  readonly text: string;
  readonly place: 'channel' | 'direct' | 'command' | 'terminal';
  /** Who asked and where, in a place that knows. */
  readonly from?: AskedFrom;
  readonly progress?: (words: string) => void;
  /** The question that the text carries on from, where that is known already. */
  readonly after?: StatisticalQuestion;
};

/** A picture beside a reply, and what stands for it where it cannot be shown. */
export type SpokenPicture = Picture & { readonly inText: readonly Passage[] };

/** What the bot says to one question, and the outcome behind it where it was a statistical one. */
export type Spoken = {
  readonly reply: Reply;
  readonly outcome: Result<Answers> | null;
  readonly pictures?: readonly SpokenPicture[];
};

/** A button that somebody presses. */
export type Pressing = Pick<Button, 'action' | 'answerId' | 'question' | 'added'> &
  Pick<Asking, 'place' | 'from'>;

/** One conversation for every workspace: words or presses in, replies out. */
export type Converse = {
  readonly ask: (asking: Asking) => Promise<readonly Spoken[]>;
  readonly press: (pressing: Pressing) => Promise<readonly Spoken[]>;
  /** Words in a thread that do not address the bot: answered where they are a follow-up, else nothing is said. */
  readonly overhear: (asking: Asking) => Promise<readonly Spoken[]>;
};

export const said = (spokenReply: Reply): Spoken => ({ reply: spokenReply, outcome: null });

export const refused = (outcome: Refusal): Spoken => ({
  reply: refusalReply(outcome.problem),
  outcome,
});

export const readerOf = ({ place, from }: Pick<Asking, 'place' | 'from'>): Asker => ({
  place,
  from: from ?? askedFromNowhere,
});
