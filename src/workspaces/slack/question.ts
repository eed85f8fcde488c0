import { answerIn, type Posted, type ReplyPlace, type Speaking } from './answer.ts';
import { type Asked, type AskedQuestions, editWindowMs } from './asked.ts';
import { headed } from './content.ts';
import type { Heard } from './heard.ts';
import type { Asking, Conversation, SeenEvents, SpokenReply } from './ports.ts';

const editedNote = 'Reply to the edited question.';
const supersededNote = 'Superseded: the question was edited; the newer reply stands below.';

export type Questioning = Speaking & {
  readonly conversation: Conversation;
  readonly seen: SeenEvents;
  readonly asked: AskedQuestions;
};

const sameWords = (first: string, second: string): boolean =>
  first.replace(/\s+/g, ' ') === second.replace(/\s+/g, ' ');

/** In a channel the reply goes into the thread that asked, or begins it; a direct message is answered beside it. */
export const placeOf = (heard: Heard): ReplyPlace => ({
  eventKey: heard.eventKey,
  team: heard.team,
  channel: heard.channel,
  threadTs: heard.threadTs ?? (heard.direct ? null : heard.ts),
  user: heard.user,
  direct: heard.direct,
  askedInThread: heard.threadTs !== null,
});

/** How long after the question the edit was made, by the platform's own stamps. */
const editAgeMs = (heard: Heard): number =>
  heard.editedTs === null ? 0 : (Number(heard.editedTs) - Number(heard.ts)) * 1_000;

export const askerOf = ({
  direct,
  team,
  channel,
  user,
  ts,
  threadTs,
}: Heard): Pick<Asking, 'place' | 'from'> => ({
  place: direct ? 'direct' : 'channel',
  from: { team, channel, person: user, message: ts, thread: threadTs },
});

const produceFor =
  ({ conversation }: Questioning, heard: Heard, dress: (reply: SpokenReply) => SpokenReply) =>
  async (progress: (words: string) => void): Promise<readonly SpokenReply[]> => {
    const asker = askerOf(heard);
    if (heard.words === '') return (await conversation.examples(asker)).map(dress);
    const replies = await conversation.converse({ text: heard.words, ...asker, progress });
    return replies.map(dress);
  };

const supersede = async ({ voice }: Questioning, before: Asked): Promise<void> => {
  for (const { reply, ...at } of await before.replies) {
    await voice.update(at, headed(reply, supersededNote));
  }
};

const answer = (
  questioning: Questioning,
  heard: Heard,
  dress: (reply: SpokenReply) => SpokenReply,
): Promise<readonly Posted[]> => {
  // in a place that is not answered not even a placeholder may be seen
  const replies = questioning.conversation
    .ready(askerOf(heard))
    .then(() => answerIn(questioning, placeOf(heard), produceFor(questioning, heard, dress)));
  questioning.asked.remember(heard.messageKey, { words: heard.words, replies });
  return replies;
};

const answerEdited = async (questioning: Questioning, heard: Heard): Promise<void> => {
  if (editAgeMs(heard) > editWindowMs) return;
  const before = await questioning.asked.recall(heard.messageKey, heard.eventKey);
  if (before !== null && sameWords(before.words, heard.words)) return;
  await answer(questioning, heard, (reply) => headed(reply, editedNote));
  if (before !== null) await supersede(questioning, before);
};

/** Answers a question once, however often it arrives. */
export const answerQuestion = async (questioning: Questioning, heard: Heard): Promise<void> => {
  if (!(await questioning.seen.firstSeen(heard.eventKey))) return;
  if (heard.editedTs !== null) await answerEdited(questioning, heard);
  else await answer(questioning, heard, (reply) => reply);
};
