import type { KeptEvent } from '../../../terms/inbox.ts';
import type { Posted } from '../answer.ts';
import type { AskedQuestions } from '../asked.ts';
import { heardIn } from '../heard.ts';
import { mostReplies, replyKey } from '../keys.ts';
import type { Self } from '../lookup.ts';
import type { DurableStore } from './ports.ts';

type EventBody = { readonly event: unknown; readonly team_id: string };

const postedOf = async ({ deliveries }: DurableStore, event: KeptEvent): Promise<readonly Posted[]> => {
  const keys = Array.from({ length: mostReplies }, (_, place) => replyKey(event.key, place));
  const found = await deliveries.find(keys);
  const replies = (found.ok ? found.value : []).flatMap(({ channel, content, outcome }): Posted[] =>
    outcome?.kind === 'said' && content.text !== ''
      ? [{ channel, ts: outcome.ts, reply: { ...content, kind: 'answer', private: false } }]
      : [],
  );
  if (event.editing === null || replies.length > 0) return replies;
  const { content, ...at } = event.editing;
  return [{ ...at, reply: { ...content, kind: 'answer', private: false } }];
};

const wordsOf = (self: Self, event: KeptEvent): string => {
  // written when the event was kept
  const body: EventBody = JSON.parse(event.body);
  return heardIn(body.event, body.team_id, self)?.words ?? '';
};

/** The replies that stand below the latest event that has any: an edit that reads the same gets none. */
const standingOf = async (
  store: DurableStore,
  latestFirst: readonly KeptEvent[],
): Promise<readonly Posted[]> => {
  for (const event of latestFirst) {
    const posted = await postedOf(store, event);
    if (posted.length > 0) return posted;
  }
  return [];
};

/** What this process remembers, and beyond that what the records hold of a message that another has answered. */
export const askedOnRecord = (memory: AskedQuestions, store: DurableStore, self: Self): AskedQuestions => ({
  remember: memory.remember,
  recall: async (messageKey, eventKey) => {
    const remembered = await memory.recall(messageKey, eventKey);
    if (remembered !== null) return remembered;
    const found = await store.inbox.ofMessage(messageKey);
    const latestFirst = (found.ok ? found.value : []).filter(({ key }) => key !== eventKey).reverse();
    const [latest] = latestFirst;
    if (latest === undefined) return null;
    return { words: wordsOf(self, latest), replies: standingOf(store, latestFirst) };
  },
});
