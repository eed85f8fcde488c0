import { answerIn } from './answer.ts';
import { overheardIn } from './heard.ts';
import { inWords } from './log.ts';
import type { Self } from './lookup.ts';
import type { SpokenReply } from './ports.ts';
import { askerOf, placeOf, type Questioning } from './question.ts';
import type { Feature } from './scopes.ts';

type Listening = Questioning & { readonly self: Self };

/** Nobody waits for an answer, so a fault is told to the operator alone, and none of the words. */
const orSilence = async (
  { log }: Listening,
  make: () => Promise<readonly SpokenReply[]>,
): Promise<readonly SpokenReply[]> => {
  try {
    return await make();
  } catch (error) {
    log.error(`Something said in a thread ran into a fault: ${inWords(error)}`);
    return [];
  }
};

/** Answers a follow-up in a thread that does not mention the bot, where the desk has it listen; else does nothing. */
export const answerOverheard = async (
  listening: Listening,
  features: ReadonlySet<Feature>,
  event: unknown,
  team: string,
): Promise<void> => {
  const { conversation, seen, self } = listening;
  const { overhear } = conversation;
  if (overhear === null || !features.has('followUp')) return;
  const heard = overheardIn(event, team, self);
  if (heard === null || heard.words === '' || !(await seen.firstSeen(heard.eventKey))) return;
  const replies = await orSilence(listening, () => overhear({ text: heard.words, ...askerOf(heard) }));
  if (replies.length > 0) await answerIn(listening, placeOf(heard), async () => replies);
};
