import { z } from 'zod';
import type { Wire } from './wire.ts';

/** The event type under which a post carries its delivery id. Other apps can read it: the id says nothing. */
export const deliveryEventType = 'leadsman_delivery';

export type Self = { readonly userId: string; readonly botId: string };

export type Sought = {
  readonly channel: string;
  readonly threadTs: string | null;
  readonly deliveryId: string;
  readonly sinceMs: number;
};

export type Found =
  | { readonly kind: 'found'; readonly ts: string }
  | { readonly kind: 'absent' }
  | { readonly kind: 'cannot tell'; readonly reason: string };

const pageShape = z.object({
  messages: z.array(
    z.object({
      ts: z.string(),
      user: z.string().optional(),
      bot_id: z.string().optional(),
      metadata: z
        .object({ event_type: z.string(), event_payload: z.record(z.string(), z.unknown()) })
        .optional(),
    }),
  ),
  response_metadata: z.object({ next_cursor: z.string().optional() }).optional(),
});
type Page = z.infer<typeof pageShape>;

const isSought = (message: Page['messages'][number], self: Self, deliveryId: string): boolean =>
  (message.bot_id === self.botId || message.user === self.userId) &&
  message.metadata?.event_type === deliveryEventType &&
  message.metadata.event_payload['id'] === deliveryId;

/** Messages in a thread stand in no channel's history, so the place decides where to look. */
const request = (sought: Sought, cursor: string) => ({
  channel: sought.channel,
  ...(sought.threadTs === null ? {} : { ts: sought.threadTs }),
  oldest: (sought.sinceMs / 1_000).toFixed(6),
  include_all_metadata: true,
  limit: 200,
  ...(cursor === '' ? {} : { cursor }),
});

/** Whether a post with this delivery id stands in the channel or thread; every page is read. */
export const lookUp = async (wire: Wire, self: Self, sought: Sought): Promise<Found> => {
  const method = sought.threadTs === null ? 'conversations.history' : 'conversations.replies';
  let cursor = '';
  do {
    const outcome = await wire.call(method, request(sought, cursor));
    if (outcome.kind !== 'done') return { kind: 'cannot tell', reason: outcome.kind };
    const page = pageShape.safeParse(outcome.body);
    if (!page.success) return { kind: 'cannot tell', reason: 'unreadable page' };
    const found = page.data.messages.find((message) => isSought(message, self, sought.deliveryId));
    if (found !== undefined) return { kind: 'found', ts: found.ts };
    cursor = page.data.response_metadata?.next_cursor ?? '';
  } while (cursor !== '');
  return { kind: 'absent' };
};
